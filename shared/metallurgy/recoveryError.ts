/** Relative standard deviations of what enters a recovery, as fractions. */
export interface RelativeErrors {
  readonly feedMass: number;
  readonly head: number;
  readonly residueMass: number;
  readonly residueAssay: number;
  readonly volume: number;
  readonly solutionAssay: number;
}

/** What a careful bench reaches. Common practice, no source; a laboratory that knows its own puts them in. */
export const usualErrors: RelativeErrors = {
  feedMass: 0.001,
  head: 0.02,
  residueMass: 0.002,
  residueAssay: 0.03,
  volume: 0.005,
  solutionAssay: 0.01,
};

const together = (...r: number[]): number => Math.hypot(...r);

/** Standard deviation of a recovery by residue, first order: s = (1 - R) sqrt(r_mr^2 + r_ar^2 + r_m^2 + r_h^2).
 *  @param recovery  %     @param r  relative errors     @returns  % absolute, one s     @source  propagation of error
 *  @example residueError(86.29, usualErrors) // => 0.495 */
export const residueError = (recovery: number, r: RelativeErrors): number =>
  Math.abs(100 - recovery) * together(r.residueMass, r.residueAssay, r.feedMass, r.head);

/** Standard deviation of a recovery by solution, first order: s = R sqrt(r_c^2 + r_V^2 + r_m^2 + r_h^2).
 *  @param recovery  %     @param r  relative errors     @returns  % absolute, one s     @source  propagation of error
 *  @example solutionError(86.13, usualErrors) // => 1.975 */
export const solutionError = (recovery: number, r: RelativeErrors): number =>
  Math.abs(recovery) * together(r.solutionAssay, r.volume, r.feedMass, r.head);

/** Standard deviation of a recovery on the calculated head, first order: s = R (1 - R) sqrt(r_S^2 + r_T^2); the feed mass
 *  cancels and the head does not enter.
 *  @param recovery  %     @param r  relative errors     @returns  % absolute, one s     @source  propagation of error
 *  @example calculatedHeadError(86.26, usualErrors) // => 0.380 */
export const calculatedHeadError = (recovery: number, r: RelativeErrors): number =>
  (Math.abs(recovery * (100 - recovery)) / 100) * together(r.solutionAssay, r.volume, r.residueMass, r.residueAssay);
