import type { Limits } from './judge-value';

/** Width of the tolerance over 2U, `expanded` being U; null with one limit only. NCSLI Z540.3, 3.11. */
export function testUncertaintyRatio({ min, max }: Limits, expanded: number): number | null {
  return min === null || max === null || !(expanded > 0) ? null : (max - min) / (2 * expanded);
}
