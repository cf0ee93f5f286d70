import type { HoldDetail } from './lot-hold';
import type { HoldCauseKind } from './stored-states';
import type { UnitSignature } from './unit-page';

/** Boards of a held lot that passed under what the hold is about. */
export interface SuspectBoards {
  /** Since the rule's run of boards began, or since the last good daily check of each station. */
  since: 'run' | 'good-check';
  /** From when on, by station; null: no good check is on record. */
  stations: { code: string; fromIso: string | null }[];
  boards: { serial: string; stationCode: string; passedIso: string }[];
}

/** One hold of a lot, with its release. */
export interface LotHoldRow {
  id: string;
  cause: HoldCauseKind;
  detail: HoldDetail | null;
  /** Null: by rule. */
  raisedByName: string | null;
  raisedIso: string;
  reason: string;
  /** Null: still on hold. */
  release: {
    reason: string;
    iso: string;
    byName: string;
    /** Null: not signed as now. */
    signature: UnitSignature | null;
  } | null;
}

/** Every hold of a lot, newest first, and what is suspect under the one in force. */
export interface LotHoldsPage {
  code: string;
  boardTypeCode: string;
  suspects: SuspectBoards | null;
  holds: LotHoldRow[];
}
