/** A stream of random numbers that is the same for the same seed, on every machine. */
export interface Random {
  /** Uniform in [0, 1). */
  next: () => number;
  /** Standard normal deviate. */
  normal: () => number;
  /** Whole number from `from` to `to`, both possible. */
  whole: (from: number, to: number) => number;
  pick: <Item>(items: readonly Item[]) => Item;
  chance: (share: number) => boolean;
}

/**
 * A seeded generator: sfc32 (Chris Doty-Humphrey, PractRand), which passes the usual batteries of tests. Not for secrets.
 * @param seed  any whole number
 */
export function seededRandom(seed: number): Random {
  let [a, b, c, counter] = [seed | 0, 0x9e3779b9 | 0, 0x243f6a88 | 0, 1];
  const next = () => {
    const sum = (((a + b) | 0) + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = ((c << 21) | (c >>> 11)) + sum;
    c |= 0;
    return (sum >>> 0) / 2 ** 32;
  };
  // The first numbers still show the seed.
  for (let i = 0; i < 20; i++) next();
  const normal = () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()); // Box and Muller 1958
  return {
    next,
    normal,
    whole: (from, to) => from + Math.floor(next() * (to - from + 1)),
    pick: (items) => items[Math.floor(next() * items.length)]!,
    chance: (share) => next() < share,
  };
}
