import { z } from 'zod';
import type { ConcessionSide } from '../decision/concession-sides';
import { rejectReasons, type Measurement, type RejectReason } from '../run/types';
import type { DispositionKind } from './stored-states';

export const rejectWaits = ['all', 'decision', 'second', 'stopped'] as const;
export const rejectSorts = ['ended', 'serial', 'lot', 'reason', 'station'] as const;

/** Rows of a page of the list of rejects. */
export const rejectsPerPage = 50;

/** The query part of the address of the list of rejects; anything unknown falls back to what is shown without it. */
export const rejectFilterSchema = z.object({
  /** A decision, the second signature of a concession, or quality after runs without a verdict. */
  waits: z.enum(rejectWaits).catch('all'),
  type: z.string().min(1).max(40).nullable().catch(null),
  lot: z.string().trim().min(1).max(40).nullable().catch(null),
  reason: z.enum(rejectReasons).nullable().catch(null),
  station: z.string().min(1).max(20).nullable().catch(null),
  sort: z.enum(rejectSorts).catch('ended'),
  order: z.enum(['rising', 'falling']).catch('falling'),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});
export type RejectFilter = z.infer<typeof rejectFilterSchema>;

/** A board that waits for somebody's decision. */
export interface RejectRow {
  unitId: string;
  /** Its newest run, which the decision answers. */
  runId: string;
  serial: string;
  boardTypeCode: string;
  lotCode: string;
  lotHeld: boolean;
  /** Null: it waits after runs without a verdict. */
  rejectReason: RejectReason | null;
  attempt: number;
  stationCode: string;
  endedIso: string;
  /** What lay outside its limits; null where nothing measured did. Units follow from the quantity's name. */
  measured: { quantity: Measurement['quantity']; value: number; min: number | null; max: number | null } | null;
  decidable: DispositionKind[];
  /** A concession that waits for its second signature. */
  concession: { byName: string; sides: ConcessionSide[] } | null;
}

export interface RejectPage {
  rows: RejectRow[];
  /** On all pages. */
  total: number;
  /** The page shown: the last one where the address asks for a later. */
  page: number;
}
