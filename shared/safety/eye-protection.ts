/**
 * Lowest filter shade for plasma arc cutting with the arc in plain sight; lighter ones are used where the work hides it.
 * 29 CFR 1910.133(a)(5): shade 8 under 300 A, 9 from 300 to 400 A, 10 from 400 to 800 A; at 400 A itself the darker one.
 * @param currentA  arc current, A; the cutting current is the most the arc carries
 * @throws RangeError above the 800 A the table ends at, and for a current that is not above 0
 */
export function minimumShade(currentA: number): 8 | 9 | 10 {
  if (!(currentA > 0 && currentA <= 800)) throw new RangeError("minimumShade needs a current above 0 and up to 800 A");
  if (currentA < 300) return 8;
  return currentA < 400 ? 9 : 10;
}
