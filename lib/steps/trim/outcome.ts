import type { Ending } from '../../decision/decide-verdict';
import type { TrimFinding, TrimOutcome } from '../../trim/types';
import type { StepContext } from '../../run/machine';
import type { LikelyCause, RejectReason } from '../../run/types';

type Failed = Extract<TrimOutcome, { kind: 'failed' }>;

const screw = 'trimmer-end-wiper-open-or-wrong-screw';
const rejections: Record<TrimFinding, { reason: RejectReason; cause: LikelyCause | null }> = {
  /** Never ends a trim; kept so that the table is whole. */
  'wrong-way': { reason: 'trim-no-effect', cause: screw },
  'no-effect': { reason: 'trim-no-effect', cause: screw },
  'end-of-travel': { reason: 'trim-end-of-travel', cause: screw },
  'cannot-reach-limits': { reason: 'trim-cannot-reach', cause: null },
  'too-many-rounds': { reason: 'trim-too-many-rounds', cause: null },
  'will-not-turn': { reason: 'trim-will-not-turn', cause: null },
  'not-steady': { reason: 'point-not-steady', cause: 'noisy-wiper-or-contact' },
};

/** The reject behind a trim that failed, with the trip point it was left at against the limit it missed. */
export function rejectForOutcome(outcome: Failed, { plan }: StepContext): Ending {
  const { min, max } = plan.boardType.limits.tripVolts;
  const value = outcome.lastTripVolts;
  const limit = value === null ? null : value < min ? min : value > max ? max : null;
  return {
    kind: 'reject',
    ...rejections[outcome.finding],
    measured: value === null ? null : { value, unit: 'V', limit },
  };
}
