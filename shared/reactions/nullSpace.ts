import { Matrix, SVD } from "ml-matrix";

/** The null space of a matrix with few rows: how many independent ways a reaction can be written, and the way where there is one.
 *  @param rows  equations, one number a column     @returns  dimension; a unit vector of the null space where the dimension is one
 *  @source  singular value decomposition (package ml-matrix); composition matrix after Smith and Missen 1982
 *  @example nullSpace([[1, -1, 0], [0, 1, -1]]).dimension // => 1 */
export function nullSpace(rows: readonly (readonly number[])[]): { dimension: number; vector: number[] | null } {
  const columns = rows[0]?.length ?? 0;
  // Rows of zeros make it square: the decomposition then gives every right singular vector.
  const square = Matrix.zeros(Math.max(rows.length, columns), columns);
  rows.forEach((row, i) => square.setRow(i, [...row]));
  const svd = new SVD(square, { computeLeftSingularVectors: false });
  const dimension = columns - svd.rank;
  return { dimension, vector: dimension === 1 ? svd.rightSingularVectors.getColumn(columns - 1) : null };
}

/** Smallest whole numbers in the ratio of real ones.
 *  @param vector  real numbers in a ratio of small whole numbers, to 1e-8     @param most  largest factor tried
 *  @returns  whole numbers without a common factor, signs kept
 *  @throws RangeError where no factor makes them whole     @source  arithmetic
 *  @example wholeRatio([0.5, -0.75, 0])[1] // => -3 */
export function wholeRatio(vector: readonly number[], most = 5000): number[] {
  const sizes = vector.map(Math.abs).filter((v) => v > 1e-9);
  const unit = Math.min(...sizes);
  for (let factor = 1; factor <= most; factor += 1) {
    const scaled = vector.map((v) => (v / unit) * factor);
    const whole = scaled.map(Math.round);
    if (scaled.every((v, i) => Math.abs(v - (whole[i] ?? 0)) < 1e-6 * Math.max(1, Math.abs(v))))
      return whole.map((n) => n + 0);
  }
  throw new RangeError(`${vector.join(", ")}: no whole numbers up to ${most} are in this ratio`);
}
