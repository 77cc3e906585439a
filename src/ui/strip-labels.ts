import type { StripQuantiles, StripScale } from "./strip-scale.ts";

export type QuantileName = keyof StripQuantiles;

export interface StripTick {
  name: QuantileName;
  value: number;
  x: number;
}

export interface StripLabel extends StripTick {
  text: string;
  /** Centre of the text, in px: below its tick, or pushed aside by its neighbours and the rims. */
  textX: number;
}

const shownNames: readonly QuantileName[] = ["p10", "p25", "p50", "p75", "p90"];
const gapPx = 8;

/** The ticks of a strip, left to right. p5 and p95 lie beyond the bar and are left to the fading stubs. */
export function stripTicks(quantiles: StripQuantiles, scale: StripScale): StripTick[] {
  return shownNames.flatMap((name) => {
    const value = quantiles[name];
    if (value == null) return [];
    const x = scale.x(value);
    // A bar from p25 to p75 has no place for a tail that stands alone.
    return x >= scale.frame.barLeft - 0.5 && x <= scale.frame.barRight + 0.5 ? [{ name, value, x }] : [];
  });
}

/** Width of a figure in Lato at 13 px, in px: digits and signs advance 0.58 em, points, commas and spaces about 0.21 em. */
export function figureWidth(text: string, bold = false): number {
  let em = 0;
  for (const letter of text) em += /[.,\s'’]/.test(letter) ? 0.225 : /[\d+−±]/.test(letter) ? 0.58 : 0.6;
  return em * 13 * (bold ? 1.02 : 1) + 1;
}

/** Places the figures in one line under their ticks, moved as little as keeps them apart and inside the width. */
export function stripLabels(
  ticks: readonly StripTick[],
  tickText: (value: number) => string,
  width: number,
): StripLabel[] {
  const labels = withoutRepeats(ticks.map((tick) => ({ ...tick, text: tickText(tick.value) })));
  if (lineWidth(labels) <= width) return spread(labels, width);
  // No room for five: the quartiles keep their ticks and give up their figures.
  return spread(
    labels.filter(({ name }) => name !== "p25" && name !== "p75"),
    width,
  );
}

type Text = StripTick & { text: string };

const widthOf = ({ text, name }: Text) => figureWidth(text, name === "p50");
const lineWidth = (labels: readonly Text[]) => labels.reduce((sum, label) => sum + widthOf(label) + gapPx, -gapPx);

/** The same figure at the same place says nothing twice; the median's stays. */
function withoutRepeats(labels: readonly Text[]): Text[] {
  const repeats = (a: Text, b: Text) => a !== b && a.text === b.text && Math.abs(a.x - b.x) < 1;
  return labels.filter((label, i) =>
    labels.every((other, j) => !repeats(label, other) || label.name === "p50" || (other.name !== "p50" && i < j)),
  );
}

/**
 * Least movement in squares, order kept. With the room before each text taken off, "apart" becomes "not falling",
 * which pooling neighbours that fall back gives exactly (isotonic regression); clamping keeps it so.
 */
function spread(labels: readonly Text[], width: number): StripLabel[] {
  let room = 0;
  const rooms = labels.map((label, i) => {
    if (i > 0) room += (widthOf(labels[i - 1]!) + widthOf(label)) / 2 + gapPx;
    return room;
  });
  const pools: { sum: number; count: number }[] = [];
  labels.forEach((label, i) => {
    let pool = { sum: label.x - rooms[i]!, count: 1 };
    while (pools.length > 0 && mean(pools.at(-1)!) > mean(pool)) {
      const before = pools.pop()!;
      pool = { sum: before.sum + pool.sum, count: before.count + pool.count };
    }
    pools.push(pool);
  });
  const starts = pools.flatMap((pool) => Array<number>(pool.count).fill(mean(pool)));
  const least = labels.length > 0 ? widthOf(labels[0]!) / 2 : 0;
  const most = labels.length > 0 ? width - widthOf(labels.at(-1)!) / 2 - room : 0;
  return labels.map((label, i) => ({
    ...label,
    textX: Math.max(least, Math.min(starts[i]!, most)) + rooms[i]!,
  }));
}

const mean = ({ sum, count }: { sum: number; count: number }) => sum / count;
