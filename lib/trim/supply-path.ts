/** Supply moves that are safe although every step overshoots by up to `overshoot` times its size. Volts. */
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

/** A last move whose overshoot is below this needs no further waypoint; about the noise of a quiet comparator. */
const negligibleOvershootVolts = 0.0007;

/**
 * Waypoints from `fromVolts` to `toVolts` whose overshoot never passes `toVolts`: each lands where its peak just reaches the
 * end, so the rest shrinks by u / (1 + u) a step.
 */
function approach(fromVolts: number, toVolts: number, overshoot: number): number[] {
  const waypoints: number[] = [];
  let at = fromVolts;
  while (overshoot * Math.abs(at - toVolts) > negligibleOvershootVolts) {
    at = (toVolts + overshoot * at) / (1 + overshoot);
    waypoints.push(at);
  }
  return waypoints;
}

/** Commands from `fromVolts` up to `toVolts` whose peaks stay at or below the absolute maximum; the last is the end. */
function climb(fromVolts: number, toVolts: number, limits: SupplyLimits): number[] {
  const u = limits.overshoot;
  const end = Math.min(toVolts, limits.maxVolts);
  const commands: number[] = [];
  let at = fromVolts;
  while (end + u * (end - at) > limits.maxVolts && limits.maxVolts - at > 0.001) {
    at = (limits.maxVolts + u * at) / (1 + u);
    commands.push(Math.min(at, end));
  }
  if (commands.at(-1) !== end) commands.push(end);
  return commands;
}

/** With an unknown start the worst one is assumed: the lowest for a climb, the highest for a fall. */
export function armOnThenHold(
  fromVolts: number | null,
  armVolts: number,
  holdVolts: number,
  limits: SupplyLimits,
): SupplyPath {
  const up = climb(fromVolts ?? limits.minVolts, armVolts, limits);
  return { waypointsVolts: [...up, ...approach(up.at(-1)!, holdVolts, limits.overshoot)], volts: holdVolts };
}

/** Down to `armVolts`, where the output goes off, then up to `holdVolts` without passing it. */
export function armOffThenHold(armVolts: number, holdVolts: number, limits: SupplyLimits): SupplyPath {
  const low = Math.max(limits.minVolts, armVolts);
  const end = Math.min(holdVolts, limits.maxVolts);
  return { waypointsVolts: [low, ...approach(low, end, limits.overshoot)], volts: end };
}

/** From a held point to another one without overshooting it, clamped to the supply's range. */
export function moveWithoutPassing(fromVolts: number, toVolts: number, limits: SupplyLimits): SupplyPath {
  const end = Math.min(limits.maxVolts, Math.max(limits.minVolts, toVolts));
  return { waypointsVolts: approach(fromVolts, end, limits.overshoot), volts: end };
}
