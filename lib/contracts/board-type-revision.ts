import { z } from 'zod';
import { boardTypeSchema, type BoardType } from './board-type';
import type { FileFacts } from './file-upload';
import type { BoardTypeRevisionState } from './stored-states';

const reason = (what: string) =>
  z
    .string()
    .trim()
    .min(5, { error: `Say ${what}, in at least 5 characters.` })
    .max(500, { error: 'Use at most 500 characters.' });
const seen = { revisionId: z.uuid(), version: z.number().int().min(1) };

export const newBoardTypeSchema = z.object({
  code: boardTypeSchema.shape.code,
  name: z
    .string()
    .trim()
    .min(3, { error: 'Use at least 3 characters.' })
    .max(80, { error: 'Use at most 80 characters.' }),
  /** Parts, limits and all else are copied from it. */
  copyOfCode: z.string().min(1, { error: 'Choose a board type to begin from.' }),
});
export type NewBoardTypeForm = z.infer<typeof newBoardTypeSchema>;

export const beginBoardTypeDraftSchema = z.object({ code: z.string() });
/** `version` is the one that the page was made from; a save from an older one is refused. */
export const saveBoardTypeSchema = z.object({ ...seen, specification: boardTypeSchema });
export type SaveBoardType = z.infer<typeof saveBoardTypeSchema>;
export const discardBoardTypeDraftSchema = z.object({ revisionId: z.uuid(), reason: reason('why it is discarded') });
export const askApprovalSchema = z.object({ ...seen, note: reason('what changed and why') });
export const sendBackLimitsSchema = z.object({ ...seen, reason: reason('what to change') });
export const takeBackSchema = z.object({ revisionId: z.uuid() });

/** What an approval can mean; the words stand in the trail. */
export const approvalMeanings = [
  { key: 'specification', words: 'The limits agree with the specification of the product.' },
  { key: 'deviation', words: 'The limits deviate from the specification, for the reason given in the note.' },
] as const;
export const approveLimitsSchema = z.object({
  ...seen,
  meaning: z.enum(['specification', 'deviation'], { error: 'Choose what your signature means.' }),
  password: z.string().min(1, { error: 'Enter your password.' }).max(200),
});

/** One row of the history of a board type, newest first. */
export interface BoardTypeRevisionHead {
  id: string;
  number: number;
  status: BoardTypeRevisionState;
  version: number;
  note: string;
  madeBy: string;
  savedAtIso: string;
  submittedBy: string | null;
  submittedAtIso: string | null;
  sentBackBy: string | null;
  sentBackAtIso: string | null;
  sentBackReason: string | null;
  approvedBy: string | null;
  approvedAtIso: string | null;
  specification: BoardType;
}

/** A released sequence that no longer fits limits that wait, in the words of its rules. */
export interface SequenceMisfit {
  sequenceId: string;
  name: string;
  revision: string;
  sentences: string[];
}

export interface BoardTypePage {
  code: string;
  /** The draft or what waits for approval; else the newest approved, else the newest. */
  shown: BoardTypeRevisionHead;
  inUse: BoardTypeRevisionHead | null;
  history: BoardTypeRevisionHead[];
  /** Of the revision shown; empty unless it is a draft or waits. */
  misfits: SequenceMisfit[];
  /** Files that the revision shown refers to. */
  files: FileFacts[];
  /** Open lots by the number of the revision that they keep. */
  openLots: { code: string; revisionNumber: number }[];
  mayEdit: boolean;
  /** Quality, who neither made nor changed what waits. */
  mayApprove: boolean;
}
