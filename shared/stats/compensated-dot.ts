/** 2^27 + 1 splits a double into two halves whose products are exact. */
const SPLITTER = 134217729;

/**
 * Sum of products as if carried in twice the digits: what is left when large products cancel?
 * Keeps the rounding error of every product and every addition and adds them at the end. Needs factors below 1e300, which
 * the splitting would carry to infinity. O(n).
 *   result = start + a[1] b[1] + … + a[n] b[n]
 * @param start  in the unit of a times b
 * @param a      length n >= 0, finite
 * @param b      length n, finite
 * @returns in the unit of a times b
 * @see Ogita, Rump and Oishi (2005), SIAM Journal on Scientific Computing 26(6), 1955-1988, algorithm 5.3 (Dot2)
 */
export function compensatedDot(start: number, a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = start;
  let lost = 0;
  for (let i = 0; i < a.length; i++) {
    const product = a[i]! * b[i]!;
    const next = sum + product;
    const back = next - sum;
    lost += sum - (next - back) + (product - back) + lostInProduct(a[i]!, b[i]!, product);
    sum = next;
  }
  return sum + lost;
}

function lostInProduct(a: number, b: number, product: number): number {
  const aHigh = SPLITTER * a - (SPLITTER * a - a);
  const bHigh = SPLITTER * b - (SPLITTER * b - b);
  const [aLow, bLow] = [a - aHigh, b - bHigh];
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}
