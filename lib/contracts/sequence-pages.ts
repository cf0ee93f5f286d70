import { z } from 'zod';
import type { Sequence } from '../sequence/step';
import type { BoardType } from './board-type';
import type { DryRunView } from './dry-run';
import type { RevisionHead } from './sequence-draft';
import type { LotState } from './stored-states';

/** The query part of the address of the list of sequences; anything unknown falls back. */
export const sequenceFilterSchema = z.object({
  state: z.enum(['all', 'draft', 'waiting', 'unreleased']).catch('all'),
  type: z.string().min(1).max(12).nullable().catch(null).default(null),
  named: z.string().trim().max(60).catch('').default(''),
});
export type SequenceFilter = z.infer<typeof sequenceFilterSchema>;

/** One row of the list of sequences. */
export interface SequenceListRow {
  id: string;
  name: string;
  boardTypeCode: string;
  boardTypeName: string;
  /** Null: none is released. */
  inUse: { number: number; by: string; atIso: string } | null;
  /** Null: nothing is in work. */
  draft: { number: number; state: 'draft' | 'submitted'; by: string; atIso: string; sentBack: boolean } | null;
  /** Lots not closed that pin any revision; of those, the ones with an older one than that in use. */
  openLots: number;
  openLotsOlder: number;
}

/** A revision in the history of its sequence. */
export interface HistoryEntry {
  head: RevisionHead;
  /** The one it is compared with: what it was begun from, else the one before. Null: the first. */
  comparedWith: number | null;
  /** What changed since, a sentence a step. */
  changes: string[];
  lots: { code: string; state: LotState }[];
  keptDryRuns: DryRunView[];
  mayRelease: boolean;
}

export interface SequenceHistory {
  sequenceId: string;
  sequenceName: string;
  boardTypeCode: string;
  /** Newest first. */
  entries: HistoryEntry[];
}

/** The query part of the address of a comparison. */
export const comparisonViewSchema = z.object({
  a: z
    .string()
    .regex(/^r\d{1,6}$/)
    .nullable()
    .catch(null)
    .default(null),
  b: z
    .string()
    .regex(/^r\d{1,6}$/)
    .nullable()
    .catch(null)
    .default(null),
  steps: z.enum(['all', 'changed']).catch('all'),
});
export type ComparisonView = z.infer<typeof comparisonViewSchema>;

/** Two revisions side by side. */
export interface ComparisonPage {
  sequenceId: string;
  sequenceName: string;
  boardType: BoardType;
  /** Every revision, newest first. */
  heads: RevisionHead[];
  a: { head: RevisionHead; sequence: Sequence };
  b: { head: RevisionHead; sequence: Sequence };
  /** What is compared when the address says nothing: the one in use and the newest. */
  usual: { a: number; b: number };
  /** Newest kept dry run of `b`. */
  keptDryRun: DryRunView | null;
  /** Another engineer or quality, who did not write `b`, which waits. */
  mayRelease: boolean;
  /** Wrote a part of `b`, which waits. */
  mayTakeBack: boolean;
}
