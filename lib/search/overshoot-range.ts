/**
 * The overshoots the search weighs, as fractions of the step. The true one is a nuisance parameter with a posterior of
 * its own for each threshold, since falling and rising steps of a supply need not ring alike (own study, simulation:
 * one shared value gave 16 of 500 gross errors with unlike steps).
 */
export const overshootGrid: readonly number[] = [0.01, 0.02, 0.03, 0.04, 0.05, 0.06, 0.07, 0.08];

/**
 * Commissioned overshoots with which the search is right: the grid must reach past the true value on both sides.
 * Own study, simulation: 9 % gave 31 gross errors in 400 boards, 10 % 15 in 400, 1 % 3 in 400; 2 to 8 % none.
 */
export const learnableOvershootRange = { min: 0.02, max: 0.08 } as const;

/** The bound used where an overshoot must never do harm: the supply's cap and the end check's landings. */
export const overshootBound = 0.085;

/** Whether a station commissioned with this overshoot may search. Outside it the search would be wrong, not slow. */
export function overshootIsLearnable(overshoot: number): boolean {
  return overshoot >= learnableOvershootRange.min && overshoot <= learnableOvershootRange.max;
}

/**
 * Prior weight of each grid value: mostly near what commissioning measured, partly flat, so that a supply that changed
 * since is still learnt.
 */
export function overshootPrior(commissioned: number): number[] {
  const weights = overshootGrid.map((u) => Math.exp(-0.5 * ((u - commissioned) / 0.012) ** 2) + 0.25);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  return weights.map((weight) => weight / total);
}
