import type { RejectReason } from '../run/types';

export interface CertifiedValue {
  quantity: string;
  unit: string;
  value: number;
  expandedUncertainty: number | null;
  coverageFactor: number | null;
  min: number | null;
  max: number | null;
}

export interface CertifiedInstrument {
  role: 'supply' | 'meter' | 'fixture';
  name: string;
  serial: string;
  calibratedAtIso: string | null;
  calibratedUntilIso: string | null;
  certificateNumber: string | null;
}

export interface CertifiedBoard {
  serial: string;
  runId: string;
  testedAtIso: string;
  attempt: number;
  operatorNumber: string;
  stationCode: string;
  fixture: string;
  ambientCelsius: number | null;
  values: CertifiedValue[];
  instruments: CertifiedInstrument[];
  earlier: { attempt: number; reason: RejectReason | null; reworked: string | null }[];
}

/** What a certificate states, frozen when it is issued. A lot's lists its passed boards. */
export interface CertificateContent {
  kind: 'board' | 'lot';
  boardTypeCode: string;
  boardTypeName: string;
  sequenceName: string;
  sequenceNumber: number;
  decisionRule: string;
  lotCode: string;
  boards: CertifiedBoard[];
  /** Of a lot: boards made, passed first time, passed later, rejected, by concession. */
  counts: { boards: number; firstPass: number; laterPass: number; rejected: number; concessions: number } | null;
  signatures: { name: string; meaning: string; atIso: string }[];
}
