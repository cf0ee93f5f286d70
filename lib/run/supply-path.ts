/**
 * Moves of the supply that no overshoot carries past a bound. A step from v to w peaks at w + u (w - v), where `u` is
 * the overshoot bound of the commissioning, as a fraction of the step.
 */

/** A peak this far beyond the bound harms nothing: it is about the noise of a quiet comparator. */
const negligibleVolts = 0.0007;
const leastStepVolts = 0.001;
const mostSteps = 12;

/**
 * Commands that lead from `fromVolts` to `toVolts`, the last one being `toVolts`, with no peak beyond `boundVolts`, which
 * lies at or behind the end.
 */
export function pathWithin(fromVolts: number, toVolts: number, boundVolts: number, overshoot: number): number[] {
  const path: number[] = [];
  const direction = Math.sign(toVolts - fromVolts);
  let at = fromVolts;
  while (path.length < mostSteps) {
    const peak = toVolts + overshoot * (toVolts - at);
    if ((peak - boundVolts) * direction <= negligibleVolts) break;
    const next = (boundVolts + overshoot * at) / (1 + overshoot);
    if ((next - at) * direction < leastStepVolts) break;
    path.push(next);
    at = next;
  }
  return [...path, toVolts];
}
