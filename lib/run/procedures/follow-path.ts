import type { OutputState } from '../../search/types';
import type { Answer, Ask, ProcedureTurn } from '../machine';

export interface FollowPath {
  ahead: number[];
  /** Shorter for all but the last, since only a peak matters there. */
  waypointMs: number;
  settleMs: number;
}
export interface PathEnd {
  volts: number;
  output: OutputState;
}

/** Commands one after the other; `volts` holds at least one. Ends with what was read at the last. */
export function beginPath(
  volts: number[],
  timing: { waypointMs: number; settleMs: number },
): {
  machine: FollowPath;
  ask: Ask;
} {
  return next({ ahead: volts, waypointMs: timing.waypointMs, settleMs: timing.settleMs });
}

export function advancePath(machine: FollowPath, answer: Answer): ProcedureTurn<FollowPath, PathEnd> | null {
  if (answer.kind !== 'probed') return null;
  if (machine.ahead.length === 0) return { result: { volts: answer.volts, output: answer.output } };
  return next(machine);
}

function next(machine: FollowPath): { machine: FollowPath; ask: Ask } {
  const [volts = 0, ...ahead] = machine.ahead;
  const dwellMs = ahead.length > 0 ? machine.waypointMs : machine.settleMs;
  return { machine: { ...machine, ahead }, ask: { kind: 'probe', volts, dwellMs, readBefore: false } };
}
