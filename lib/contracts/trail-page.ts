import { z } from 'zod';

/** The query part of the trail's address; anything unknown falls back to everything. */
export const trailFilterSchema = z.object({
  /** Kind of thing, such as lot. Empty: any. */
  what: z.string().max(40).catch(''),
  /** Account id. Empty: anyone. */
  who: z.union([z.uuid(), z.literal('')]).catch(''),
  since: z.union([z.iso.date(), z.literal('')]).catch(''),
  containing: z.string().trim().max(80).catch(''),
  /** Entries older than this id. */
  before: z.coerce.number().int().positive().nullable().catch(null),
});
export type TrailFilter = z.infer<typeof trailFilterSchema>;

export interface TrailRow {
  id: number;
  atIso: string;
  /** A person, or null for the program itself. */
  who: string | null;
  chain: string;
  place: number | null;
  action: string;
  entity: string;
  /** What of it a person knows it by: a code, a serial number, a name. */
  thing: string;
  changes: { name: string; from: string | null; to: string | null }[];
  reason: string | null;
  /** Last six digits. */
  seal: string | null;
  /** A head that was kept. */
  checkpoint: boolean;
}

export interface TrailPage {
  rows: TrailRow[];
  total: number;
  /** `before` of the next page; null on the last. */
  older: number | null;
  people: { id: string; name: string }[];
  entities: string[];
  checkpointAtIso: string | null;
}
