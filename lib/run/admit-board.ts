import { say } from '../bench/sayings';
import type { Say } from '../contracts/bench-view';
import type { LotState, SequenceRevisionState } from '../contracts/stored-states';
import type { BoardStanding } from '../decision/board-standing';

/** What is on record of a scanned serial, of the lot in work, and of the sequence that the lot is tested with. */
export interface BoardFacts {
  serial: string;
  /** The lot whose sheet was scanned. */
  lot: { code: string; state: LotState; held: boolean; boardTypeCode: string; serialPattern: string };
  /** Null: no board of this serial is on record. */
  unit: { lotCode: string; standing: BoardStanding } | null;
  /** Where its open run is, if it has one. */
  inTestAt: string | null;
  /** `withdrawnReason` null: not withdrawn. */
  sequence: { number: number; status: SequenceRevisionState; withdrawnReason: string | null };
}

export type BoardAdmission = { allowed: true; retestOrderId: string | null } | { allowed: false; refusal: Say };

const refuse = (refusal: Say): BoardAdmission => ({ allowed: false, refusal });

/**
 * Whether this board may be tested in this lot now. The lot first, then whether it is the lot's board, then the board's own
 * record; each refusal says its reason.
 */
export function admitBoard({ serial, lot, unit, inTestAt, sequence }: BoardFacts): BoardAdmission {
  if (lot.held) return refuse(say('lot-on-hold', { lot: lot.code }));
  if (lot.state === 'paused') return refuse(say('lot-paused', { lot: lot.code }));
  if (lot.state !== 'open') return refuse(say('lot-not-open', { lot: lot.code }));
  const unusable = refuseSequence(sequence, lot.boardTypeCode);
  if (unusable) return refuse(unusable);
  if (!new RegExp(lot.serialPattern).test(serial)) return refuse(say('serial-wrong-form', { serial }));
  if (!unit) return refuse(say('serial-unknown', { serial }));
  if (unit.lotCode !== lot.code) return refuse(say('serial-of-other-lot', { serial, lot: unit.lotCode }));
  return admitStanding(serial, unit.standing, inTestAt);
}

/** Why no board may be begun with the revision that a lot pins; null when it may. A superseded one runs on in its lots. */
export function refuseSequence(
  { number, status, withdrawnReason }: BoardFacts['sequence'],
  boardType: string,
): Say | null {
  if (status === 'withdrawn')
    return say('sequence-withdrawn', { revision: `r${number}`, reason: withdrawnReason ?? '' });
  return status === 'released' || status === 'superseded' ? null : say('sequence-not-released', { boardType });
}

function admitStanding(serial: string, standing: BoardStanding, inTestAt: string | null): BoardAdmission {
  switch (standing.kind) {
    case 'may-be-tested':
      // An engineering run is no part of its record, and yet it lies on that fixture.
      if (inTestAt !== null) return refuse(say('board-in-test', { serial, station: inTestAt }));
      return { allowed: true, retestOrderId: standing.retestOrderId };
    case 'in-test':
      return refuse(say('board-in-test', { serial, station: inTestAt ?? '' }));
    case 'passed':
      return refuse(say('board-passed', { serial, atIso: standing.at }));
    case 'scrapped':
      return refuse(say('board-scrapped', { serial }));
    case 'used-as-is':
      return refuse(say('board-used-as-is', { serial }));
    case 'returned':
      return refuse(say('board-returned', { serial }));
    case 'needs-disposition':
      return refuse(say('board-needs-disposition', { serial }));
    case 'waits-for-quality':
      return refuse(say(`board-${standing.because}`, { serial }));
    case 'attempts-used':
      return refuse(say('attempts-used', { serial, most: standing.most }));
  }
}

/** What is on record of a board scanned in a trial, and of the offer. */
export interface TrialBoardFacts {
  serial: string;
  offer: { boardTypeCode: string; serialPattern: string };
  /** Null: a spare board that belongs to no lot. */
  unit: { isOfType: boolean; standing: BoardStanding } | null;
  inTestAt: string | null;
}

/**
 * Why this board may not make an engineering run; null when it may. What left the line stays as it is. A board that waits for a
 * decision may be tried: it waits all the same.
 */
export function refuseTrialBoard({ serial, offer, unit, inTestAt }: TrialBoardFacts): Say | null {
  if (!new RegExp(offer.serialPattern).test(serial)) return say('serial-wrong-form', { serial });
  if (!unit) return null;
  if (!unit.isOfType) return say('serial-of-other-type', { serial, boardType: offer.boardTypeCode });
  if (inTestAt !== null) return say('board-in-test', { serial, station: inTestAt });
  const { standing } = unit;
  if (!['passed', 'scrapped', 'returned', 'used-as-is'].includes(standing.kind)) return null;
  const admitted = admitStanding(serial, standing, inTestAt);
  return admitted.allowed ? null : admitted.refusal;
}
