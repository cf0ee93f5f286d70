import { z } from 'zod';
import type { NoVerdictReason, RejectReason, Verdict } from '../run/types';
import type { UnitRun } from './unit-page';

export const endOfferSchema = z.object({ offerId: z.uuid() });

/** One engineering run of an offered draft. Volts; null where the run did not measure it. */
export interface OfferRun {
  id: string;
  serial: string;
  /** Among the engineering runs of this board, from 1. */
  attempt: number;
  startedIso: string;
  operatorName: string;
  /** Null: still on the fixture. */
  verdict: Verdict | null;
  rejectReason: RejectReason | null;
  noVerdictReason: NoVerdictReason | null;
  seconds: number | null;
  tripVolts: number | null;
  releaseVolts: number | null;
  hysteresisVolts: number | null;
}

/** A draft offered to a station, with what came of it. */
export interface OfferedDraft {
  id: string;
  stationCode: string;
  stationName: string;
  note: string;
  offeredByName: string;
  offeredIso: string;
  /** Null: open, the bench may take it. */
  endedIso: string | null;
  endedByName: string | null;
  /** Newest first. */
  runs: OfferRun[];
}

/** The record of one engineering run. */
export interface EngineeringRunPage {
  serial: string;
  boardTypeCode: string;
  /** False: a spare board that belongs to no lot. */
  isUnit: boolean;
  sequenceId: string;
  sequenceName: string;
  revisionNumber: number;
  note: string;
  offeredByName: string;
  run: UnitRun;
}
