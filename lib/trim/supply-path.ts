import { pathWithin } from '../run/supply-path';

/** Supply moves of a trim, safe although every step overshoots by up to `overshoot` times its size. Volts. */
export interface SupplyLimits {
  minVolts: number;
  maxVolts: number;
  /** Bound on the overshoot, as a fraction of the step. */
  overshoot: number;
}

/** A path ends at `volts`; the waypoints before it dwell shorter. */
export interface SupplyPath {
  waypointsVolts: number[];
  volts: number;
}

const pathOf = (commands: number[]): SupplyPath => ({
  waypointsVolts: commands.slice(0, -1),
  volts: commands.at(-1)!,
});

/**
 * Up to `armVolts`, where the output comes on, without a peak above the absolute maximum, then down to `holdVolts` without
 * passing it. With an unknown start the worst one is assumed, the lowest.
 */
export function armOnThenHold(
  fromVolts: number | null,
  armVolts: number,
  holdVolts: number,
  { minVolts, maxVolts, overshoot }: SupplyLimits,
): SupplyPath {
  const up = pathWithin(fromVolts ?? minVolts, Math.min(maxVolts, armVolts), maxVolts, overshoot);
  const end = Math.min(maxVolts, holdVolts);
  return pathOf([...up, ...pathWithin(up.at(-1)!, end, end, overshoot)]);
}

/** Down to `armVolts`, where the output goes off, then up to `holdVolts` without passing it. */
export function armOffThenHold(armVolts: number, holdVolts: number, limits: SupplyLimits): SupplyPath {
  const low = Math.max(limits.minVolts, armVolts);
  const end = Math.min(holdVolts, limits.maxVolts);
  return pathOf([low, ...pathWithin(low, end, end, limits.overshoot)]);
}

/** From a held point to another one without overshooting it, clamped to the supply's range. */
export function moveWithoutPassing(fromVolts: number, toVolts: number, limits: SupplyLimits): SupplyPath {
  const end = Math.min(limits.maxVolts, Math.max(limits.minVolts, toVolts));
  return pathOf(pathWithin(fromVolts, end, end, limits.overshoot));
}
