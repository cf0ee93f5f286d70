import { z } from 'zod';
import type { CertificateValidity } from '../certificate/validity';
import type { Measurement, RejectReason } from '../run/types';
import type { InstrumentKind } from './stored-states';

/** One result as it was judged. Numbers in the unit of the quantity's name. */
export interface CertifiedValue {
  quantity: Measurement['quantity'];
  /** What the sequence calls the step. Empty: the quantity's own word says it. */
  step: string;
  value: number;
  /** U. Null: none is stated. */
  expandedUncertainty: number | null;
  /** k. Null: none is stated. */
  coverageFactor: number | null;
  min: number | null;
  max: number | null;
  passed: boolean | null;
}

/** As it stood at the station, with the calibration that counted on the day of the run. Days are year-month-day. */
export interface CertifiedInstrument {
  role: InstrumentKind;
  code: string;
  /** From its identity. Null: not recorded. */
  serial: string | null;
  calibratedOn: string | null;
  calibratedUntil: string | null;
  certificateNumber: string | null;
}

export interface CertifiedBench {
  stationCode: string;
  fixture: string;
  instruments: CertifiedInstrument[];
}

/** What a board was tested by. */
export interface CertifiedProcedure {
  sequenceRevision: string;
  /** A sentence. */
  decisionRule: string;
}

export interface CertifiedSignature {
  name: string;
  meaning: string;
  atIso: string;
}

export interface CertifiedBoard {
  serial: string;
  runId: string;
  testedAtIso: string;
  attempt: number;
  operatorNumber: string | null;
  /** Places in the content's `benches` and `procedures`. */
  bench: number;
  procedure: number;
  values: CertifiedValue[];
  /** Attempts before, oldest first. `reason` null: no verdict. */
  earlier: { attempt: number; reason: RejectReason | null; reworked: string | null }[];
  /** Null: the board met all limits. */
  concession: { reason: string; signatures: CertifiedSignature[] } | null;
}

/** What a certificate states, frozen when it is issued. A lot's lists its passed boards and those used by concession. */
export interface CertificateContent {
  kind: 'board' | 'lot';
  boardTypeCode: string;
  boardTypeName: string;
  sequenceName: string;
  lotCode: string;
  benches: CertifiedBench[];
  procedures: CertifiedProcedure[];
  boards: CertifiedBoard[];
  /** Of a lot. `apart`: boards that it does not cover. */
  counts: { boards: number; firstPass: number; laterPass: number; concessions: number; apart: number } | null;
}

/** One certificate in a list. */
export interface CertificateRow {
  id: string;
  number: string;
  /** Null: of a whole lot. */
  serial: string | null;
  lotCode: string;
  boardTypeCode: string;
  issuedIso: string;
  issuedByName: string;
  validity: CertificateValidity;
}

/** What whoever holds the paper sees: what is printed on it, and whether it still counts. */
export interface VerifiedCertificate {
  number: string;
  issuedIso: string;
  issuedByName: string;
  /** Last digits of the signature's seal, as printed. */
  seal: string;
  content: CertificateContent;
  validity: CertificateValidity;
}

const password = z.string().min(1, { error: 'Enter your password.' }).max(200);
const reason = z
  .string()
  .trim()
  .min(1, { error: 'Enter the reason.' })
  .max(300, { error: 'Use at most 300 characters.' });

/** Of one board, or of the whole lot. */
export const issueCertificateSchema = z.union([
  z.object({ unitId: z.uuid(), password }),
  z.object({ lotId: z.uuid(), password }),
]);
export type IssueCertificateForm = z.infer<typeof issueCertificateSchema>;

export const revokeCertificateSchema = z.object({ certificateId: z.uuid(), reason, password });
export type RevokeCertificateForm = z.infer<typeof revokeCertificateSchema>;

/** The query part of the address of the list. */
export const certificateFilterSchema = z.object({ find: z.string().trim().min(1).max(60).nullable().catch(null) });
