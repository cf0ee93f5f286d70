import type { BoardStanding } from '../decision/board-standing';
import type { ConcessionSide } from '../decision/concession-sides';
import type { Adjustment, LikelyCause, Measurement, NoVerdictReason, RejectReason, Verdict } from '../run/types';
import type { LabelLayout } from './board-type';
import type { DispositionKind, LabelState, RunCloser, RunKind } from './stored-states';

/** Readings of one stretch; equally long arrays. Output 1 on, 0 off, -1 not read. */
export interface TraceStretch {
  kind: string;
  atMs: number[];
  volts: number[];
  output: number[];
}

export interface UnitMeasurement extends Omit<Measurement, 'stepIndex'> {
  n: number;
  /** Name of its step, or its number where nobody named it. */
  step: string;
}

export interface UnitRun {
  id: string;
  kind: RunKind;
  attempt: number;
  startedIso: string;
  /** Null: the run is open. */
  endedIso: string | null;
  seconds: number | null;
  verdict: Verdict | null;
  rejectReason: RejectReason | null;
  likelyCause: LikelyCause | null;
  noVerdictReason: NoVerdictReason | null;
  faultCode: string | null;
  faultDetail: string | null;
  failingWhenStopped: boolean;
  supplyOff: { confirmed: boolean; volts: number | null; by: 'meter' | 'supply' | null } | null;
  closedBy: RunCloser | null;
  stationCode: string;
  fixture: string;
  operatorNumber: string | null;
  operatorName: string;
  sequenceRevision: string;
  trimRounds: number | null;
  turnsAdvised: number | null;
  binCode: string | null;
  binScannedIso: string | null;
  limits: { tripVolts: Band; releaseVolts: Band } | null;
  measurements: UnitMeasurement[];
  traces: TraceStretch[];
  adjustments: Adjustment[];
}

export interface Band {
  min: number;
  max: number;
}

export interface UnitLabel {
  id: string;
  runId: string;
  state: LabelState;
  problem: string | null;
  printerName: string | null;
  createdIso: string;
  printedIso: string | null;
}

export interface UnitDisposition {
  id: string;
  runId: string;
  kind: DispositionKind;
  action: string;
  reason: string;
  signedByName: string;
  signedIso: string;
  /** As given, oldest first; a concession has two. Empty: signed before signatures were bound to what they sign. */
  signatures: UnitSignature[];
}

export interface UnitSignature {
  accountId: string;
  name: string;
  signedIso: string;
  meaning: string;
  digest: string;
  /** Whether it still fits what it is kept with. */
  holds: boolean;
  /** Of a concession: for whom its signer stands. */
  sides: ConcessionSide[];
  /** Boards that were decided together, this one among them. */
  serials: string[];
  /** Of the run that was answered; null where it gave no verdict or something else was signed. */
  rejectReason: RejectReason | null;
}

export interface UnitRetestOrder {
  id: string;
  reason: string;
  signedByName: string;
  signedIso: string;
  usedByRunId: string | null;
}

/** Everything on record of one board, newest first. */
export interface UnitPage {
  id: string;
  serial: string;
  position: number;
  lotCode: string;
  lotHeld: boolean;
  boardTypeCode: string;
  boardTypeName: string;
  standing: BoardStanding;
  /** What can be decided about it now. */
  decidable: DispositionKind[];
  runs: UnitRun[];
  labels: UnitLabel[];
  dispositions: UnitDisposition[];
  retestOrders: UnitRetestOrder[];
  /** What the label of the newest pass states; null before a pass. */
  label: { tripVolts: number | null; releaseVolts: number | null; lines?: LabelLayout } | null;
}
