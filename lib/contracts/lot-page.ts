import type { BoardStanding } from '../decision/board-standing';
import type { RejectReason, Verdict } from '../run/types';
import type { LotSummary } from '../statistics/lot-summary';
import type { SuspectBoards } from './lot-holds-page';
import type { LabelState, LotState, SequenceRevisionState } from './stored-states';

/** A value against the limits it was judged by. Volts. */
export interface PointAgainstLimits {
  value: number;
  min: number | null;
  max: number | null;
}

/** One row of the table of boards. */
export interface LotBoardRow {
  serial: string;
  position: number;
  standing: BoardStanding['kind'];
  /** Of the newest run with a verdict; `no-verdict` when there were only others; null before the first run. */
  verdict: Verdict | null;
  rejectReason: RejectReason | null;
  runs: number;
  /** Points of the newest run that ended; null where it found none. */
  tripVolts: PointAgainstLimits | null;
  releaseVolts: PointAgainstLimits | null;
  stationCode: string | null;
  endedAtIso: string | null;
  label: { state: LabelState; problem: string | null } | null;
}

export interface ComponentBatchRow {
  id: string;
  component: string;
  batch: string;
  fromIso: string;
  byName: string;
  stationCode: string | null;
}

/** The lot went on with another revision of its sequence. */
export interface LotMoveRow {
  id: string;
  fromNumber: number;
  toNumber: number;
  reason: string;
  byName: string;
  atIso: string;
}

/** The revision that a lot pins. */
export interface LotRevision {
  sequenceId: string;
  status: SequenceRevisionState;
  withdrawnReason: string | null;
  /** The newer one in use, which the lot can move to. Null: it has the newest. */
  newer: { id: string; number: number } | null;
  moves: LotMoveRow[];
}

/** Everything that the page of a lot shows; fetched again every few seconds while the lot is in production. */
export interface LotPage {
  id: string;
  code: string;
  state: LotState;
  boardTypeCode: string;
  boardTypeName: string;
  sequenceNumber: number;
  revision: LotRevision;
  createdAtIso: string;
  createdByName: string;
  closedAtIso: string | null;
  /** `byName` null: held by rule. `suspects`: boards that passed under what the hold is about. */
  hold: {
    sinceIso: string;
    byName: string | null;
    reason: string;
    suspects: { boards: number; since: SuspectBoards['since'] };
  } | null;
  stationCodes: string[];
  firstTestIso: string | null;
  lastTestIso: string | null;
  firstSerial: string | null;
  lastSerial: string | null;
  summary: LotSummary;
  /** One page of the boards chosen, in the order asked for. */
  boards: LotBoardRow[];
  /** How many boards are chosen, on all pages. */
  boardsChosen: number;
  components: ComponentBatchRow[];
}
