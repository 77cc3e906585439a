/**
 * A matrix with n rows and p <= n columns as Q R. `reflectors[k]` is the k-th Householder vector (length n, zero above
 * row k, squared length 2, or all zero where there was nothing to reflect), `r[k][j]` the upper triangle.
 */
export type HouseholderQr = { reflectors: Float64Array[]; r: Float64Array[] };

/**
 * QR decomposition by Householder reflections: the stable way from a matrix to least squares, without its square.
 *   Q = H[1] … H[p], H[k] = I - v[k] v[k]', each H[k] clearing column k below the diagonal
 * @param columns  p columns of length n >= p, finite
 * @returns see HouseholderQr; a column that depends on those before it shows as r[k][k] near 0
 * @see Golub and Van Loan (2013), Matrix Computations, 4th ed., algorithm 5.2.1
 */
export function decomposeQr(columns: readonly Float64Array[]): HouseholderQr {
  const work = columns.map((column) => Float64Array.from(column));
  const reflectors = work.map((column, k) => {
    const v = column.map((value, i) => (i < k ? 0 : value));
    const length = norm(v);
    if (length === 0) return v;
    v[k]! += v[k]! < 0 ? -length : length; // away from zero, so nothing cancels
    const scale = Math.SQRT2 / norm(v);
    const reflector = v.map((value) => value * scale);
    for (const later of work.slice(k)) reflect(reflector, later);
    return reflector;
  });
  return { reflectors, r: work.map((_, k) => Float64Array.from(work, (column) => column[k]!)) };
}

/**
 * Solves the least-squares equations in the form that can be corrected: r + X b = f and X' r = g, for the X that `qr`
 * holds. With f = y and g = 0 they give the fit b and its residuals r; with what those leave open, their correction.
 * @see Bjorck (1967), BIT 7(4), 257-278
 */
export function solveAugmented({ reflectors, r }: HouseholderQr, f: ArrayLike<number>, g: ArrayLike<number>) {
  const turned = Float64Array.from(f);
  for (const reflector of reflectors) reflect(reflector, turned);
  const fromG = new Float64Array(r.length); // R' fromG = g
  for (let k = 0; k < r.length; k++) {
    let sum = g[k]!;
    for (let i = 0; i < k; i++) sum -= r[i]![k]! * fromG[i]!;
    fromG[k] = sum / r[k]![k]!;
  }
  const b = turned.slice(0, r.length).map((value, k) => value - fromG[k]!);
  for (let k = r.length - 1; k >= 0; k--) {
    for (let j = k + 1; j < r.length; j++) b[k]! -= r[k]![j]! * b[j]!;
    b[k]! /= r[k]![k]!;
  }
  turned.set(fromG);
  for (const reflector of reflectors.toReversed()) reflect(reflector, turned);
  return { b, residuals: turned };
}

/** Inverse of X'X for the X that `qr` holds: p rows of length p. */
export function invertGram({ r }: HouseholderQr): number[][] {
  const inverse = r.map((_, j) => {
    const column = new Float64Array(r.length);
    for (let k = j; k >= 0; k--) {
      let sum = k === j ? 1 : 0;
      for (let i = k + 1; i <= j; i++) sum -= r[k]![i]! * column[i]!;
      column[k] = sum / r[k]![k]!;
    }
    return column; // column j of the inverse of R
  });
  return r.map((_, i) => r.map((_, j) => inverse.reduce((sum, column) => sum + column[i]! * column[j]!, 0)));
}

function reflect(v: Float64Array, target: Float64Array): void {
  let along = 0;
  for (let i = 0; i < v.length; i++) along += v[i]! * target[i]!;
  for (let i = 0; i < v.length; i++) target[i]! -= along * v[i]!;
}

function norm(v: Float64Array): number {
  return Math.sqrt(v.reduce((sum, value) => sum + value * value, 0));
}
