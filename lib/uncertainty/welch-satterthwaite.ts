/**
 * Effective degrees of freedom of a sum of independent contributions with standard uncertainties `standard` (sensitivity
 * included) and `degrees` of freedom, truncated to a whole number of at least 1; Infinity where every uncertain one has
 * that. JCGM 100:2008, G.4.1 and G.6.4.
 */
export function effectiveDegrees(contributions: readonly { standard: number; degrees: number }[]): number {
  const variance = contributions.reduce((sum, { standard }) => sum + standard ** 2, 0);
  if (!(variance > 0)) return Infinity;
  // Shares first: fourth powers of microvolts would vanish.
  const inverse = contributions.reduce(
    (sum, { standard, degrees }) => sum + (standard ** 2 / variance) ** 2 / degrees,
    0,
  );
  return inverse > 0 ? Math.max(1, Math.floor(1 / inverse + 1e-9)) : Infinity;
}
