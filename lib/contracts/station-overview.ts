import type { LotStrip, ReadinessItem, Say } from './bench-view';
import type { RejectReason } from '../run/types';

/** Most urgent first: the order of the list of stations. */
export const stationStates = ['calls', 'may-not-test', 'waits-for-bin', 'testing', 'idle'] as const;
export type StationState = (typeof stationStates)[number];

export interface StationRow {
  id: string;
  code: string;
  name: string;
  fixture: string;
  simulated: boolean;
  state: StationState;
  /** Since when it is in this state; null where it is not known. */
  sinceIso: string | null;
  /** Why it may not test; empty while it may. */
  reasons: Say[];
  rejectReason: RejectReason | null;
  serial: string | null;
  operatorNumber: string | null;
  /** The lot that it tested last, with its marks; null before the first. */
  lot: LotStrip | null;
  call: { id: string; sinceIso: string } | null;
  /** The run on it is an engineering run. */
  engineering: boolean;
  /** A draft that the bench may take for a trial. */
  offer: StationOffer | null;
}

/** A draft on offer at a station. */
export interface StationOffer {
  id: string;
  /** 7 is shown as r7. */
  revisionNumber: number;
  sequenceName: string;
  boardTypeCode: string;
  note: string;
  offeredByName: string;
  sinceIso: string;
}

export interface StationsOverview {
  atIso: string;
  stations: StationRow[];
}

/** One station: what must hold before it may test, and what stands on it. */
export interface StationPage extends StationRow {
  readiness: ReadinessItem[];
  instruments: {
    id: string;
    code: string;
    kind: string;
    calibratedOn: string | null;
    dueOn: string | null;
    certificateNumber: string | null;
  }[];
  dailyChecks: {
    id: string;
    atIso: string;
    validHours: number;
    passed: boolean;
    tripVolts: number | null;
    releaseVolts: number | null;
    atBench: boolean;
    referenceCode: string;
    knownTripVolts: number;
    knownReleaseVolts: number;
    toleranceVolts: number;
    byName: string;
  }[];
  commissionings: {
    id: string;
    atIso: string;
    validUntilIso: string;
    overshoot: number;
    settleMs: number;
    waypointMs: number;
    noiseVolts: number;
    referenceCode: string;
    byName: string;
  }[];
  references: { id: string; code: string }[];
}
