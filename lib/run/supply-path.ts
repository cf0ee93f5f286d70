/**
 * Moves of the supply that no overshoot carries past a bound. A step from v to w peaks at w + u (w - v), where `u` is
 * the overshoot bound of the commissioning, as a fraction of the step.
 */

/** Commands that lead from `fromVolts` to `toVolts`, the last one being `toVolts`, with no peak beyond `boundVolts`. */
export function pathWithin(fromVolts: number, toVolts: number, boundVolts: number, overshoot: number): number[] {
  const path: number[] = [];
  const direction = Math.sign(toVolts - fromVolts);
  let at = fromVolts;
  while (Math.abs(toVolts - at) > leastStepVolts && path.length < mostSteps) {
    const farthest = (boundVolts + overshoot * at) / (1 + overshoot);
    const next = direction > 0 ? Math.min(toVolts, farthest) : Math.max(toVolts, farthest);
    if ((next - at) * direction < leastStepVolts) break;
    path.push(next);
    at = next;
  }
  return path.length === 0 ? [toVolts] : [...path.slice(0, -1), toVolts];
}
const leastStepVolts = 0.001;
const mostSteps = 12;
