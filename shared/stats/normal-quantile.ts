import { requireThat } from "./require-that.ts";

// Coefficients of AS 241, routine PPND16: for the middle, for the tails, and for the far tails; powers rising.
const MIDDLE = [
  [
    3.3871328727963665, 133.14166789178438, 1971.5909503065513, 13731.69376550946, 45921.95393154987, 67265.7709270087,
    33430.57558358813, 2509.0809287301227,
  ],
  [
    1, 42.31333070160091, 687.1870074920579, 5394.196021424751, 21213.794301586597, 39307.89580009271,
    28729.085735721943, 5226.495278852546,
  ],
] as const;
const TAIL = [
  [
    1.4234371107496835, 4.630337846156546, 5.769497221460691, 3.6478483247632045, 1.2704582524523684,
    0.2417807251774506, 0.022723844989269184, 0.0007745450142783414,
  ],
  [
    1, 2.053191626637759, 1.6763848301838038, 0.6897673349851, 0.14810397642748008, 0.015198666563616457,
    0.0005475938084995345, 1.0507500716444169e-9,
  ],
] as const;
const FAR_TAIL = [
  [
    6.657904643501103, 5.463784911164114, 1.7848265399172913, 0.29656057182850487, 0.026532189526576124,
    0.0012426609473880784, 2.7115555687434876e-5, 2.0103343992922881e-7,
  ],
  [
    1, 0.599832206555888, 0.1369298809227358, 0.014875361290850615, 0.0007868691311456133, 1.8463183175100548e-5,
    1.421511758316446e-7, 2.0442631033899397e-15,
  ],
] as const;

/**
 * Quantile of the standard normal distribution: below which value does the share p of it lie?
 * Rational approximations in three ranges, good to about 16 digits; the approximation in simple-statistics has three.
 *   result = the z for which p = integral from minus infinity to z of exp(-t^2 / 2) / sqrt(2 pi)
 * @param p  unitless, in (0, 1)
 * @returns unitless, in standard deviations from the mean
 * @throws RangeError when p breaks its line above
 * @see Wichura (1988), Algorithm AS 241, Applied Statistics 37(3), 477-484, routine PPND16
 */
export function normalQuantile(p: number): number {
  requireThat(p > 0 && p < 1, "normalQuantile needs p in (0, 1)");
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) return q * ratio(MIDDLE, 0.180625 - q * q);
  const r = Math.sqrt(-Math.log(q < 0 ? p : 1 - p));
  const distance = r <= 5 ? ratio(TAIL, r - 1.6) : ratio(FAR_TAIL, r - 5);
  return q < 0 ? -distance : distance;
}

function ratio([above, below]: readonly [readonly number[], readonly number[]], at: number): number {
  const polynomial = (powers: readonly number[]) => powers.reduceRight((sum, c) => sum * at + c, 0);
  return polynomial(above) / polynomial(below);
}
