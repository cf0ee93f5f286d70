import { z } from 'zod';
import { sequenceSchema, type Sequence } from '../sequence/step';
import type { FileProblem } from '../sequence/sequence-file';
import type { BoardType } from './board-type';
import type { SequenceRevisionState } from './stored-states';
import type { StationKind } from '../sequence/station-kind';

const reason = (what: string) =>
  z
    .string()
    .trim()
    .min(5, { error: `Say ${what}, in at least 5 characters.` })
    .max(500, { error: 'Use at most 500 characters.' });
const password = z.string().min(1, { error: 'Enter your password.' }).max(200);

/** A draft as it was typed. `version` is the one it was made from; an older one is answered with what the other person saved. */
export const saveDraftSchema = z.object({
  revisionId: z.uuid(),
  version: z.number().int().min(1),
  sequence: sequenceSchema,
  warningReasons: z.record(z.string().max(120), z.string().trim().max(300)),
});
export type SaveDraft = z.infer<typeof saveDraftSchema>;

/** Saved, or what stands there now: the editor merges it into its own text and saves again. */
export type SavedDraft =
  | { saved: true; version: number; savedAtIso: string }
  | {
      saved: false;
      version: number;
      savedAtIso: string;
      savedBy: string;
      sequence: Sequence;
      warningReasons: Record<string, string>;
    };

export const submitRevisionSchema = z.object({
  revisionId: z.uuid(),
  version: z.number().int().min(1),
  /** What changed and why; shown to whoever releases it. */
  note: reason('what changed and why'),
});
export const sendBackSchema = z.object({ revisionId: z.uuid(), reason: reason('what to change') });
/** What a release can mean; the words are signed. */
export const releaseMeanings = [
  { key: 'checked', words: 'I compared it with the revision in use and checked every change.' },
  { key: 'checked-and-tried', words: 'I checked every change and saw it tried on a station.' },
] as const;
export const releaseRevisionSchema = z.object({
  revisionId: z.uuid(),
  version: z.number().int().min(1),
  meaning: z.enum(['checked', 'checked-and-tried'], { error: 'Choose what your signature means.' }),
  password,
});
export const withdrawRevisionSchema = z.object({
  revisionId: z.uuid(),
  reason: reason('why it is withdrawn'),
  password,
});
/** Begins a draft with the steps of an earlier revision, or of the one in use where none is given. */
export const beginDraftSchema = z.object({ sequenceId: z.uuid(), fromRevisionId: z.uuid().nullable() });
export const discardDraftSchema = z.object({ revisionId: z.uuid(), reason: reason('why it is discarded') });
export const newSequenceSchema = z.object({
  boardTypeCode: z.string().min(1, { error: 'Choose a board type.' }),
  name: z
    .string()
    .trim()
    .min(3, { error: 'Use at least 3 characters.' })
    .max(60, { error: 'Use at most 60 characters.' }),
});
/** A file as it was chosen. `sequenceId` null: into the sequence of its board type and name, made where there is none. */
export const importSequenceSchema = z.object({
  text: z
    .string()
    .min(1, { error: 'Choose a file.' })
    .max(500_000, { error: 'The file is larger than 500 kB. Choose a sequence.' }),
  sequenceId: z.uuid().nullable(),
});
export type ImportedSequence =
  { made: true; sequenceId: string; number: number } | { made: false; problems: FileProblem[] };
export const moveLotSchema = z.object({ lotId: z.uuid(), toRevisionId: z.uuid(), reason: reason('why the lot moves') });
export const offerDraftSchema = z.object({
  revisionId: z.uuid(),
  stationCode: z.string().min(1, { error: 'Choose a station.' }),
  note: z.string().trim().max(160, { error: 'Use at most 160 characters.' }),
});

/** A revision with its history, as every page of it shows. */
export interface RevisionHead {
  id: string;
  number: number;
  status: SequenceRevisionState;
  version: number;
  note: string;
  madeBy: string;
  madeAtIso: string;
  savedBy: string | null;
  savedAtIso: string;
  basedOnNumber: number | null;
  submittedBy: string | null;
  submittedAtIso: string | null;
  sentBackBy: string | null;
  sentBackAtIso: string | null;
  sentBackReason: string | null;
  releasedBy: string | null;
  releasedAtIso: string | null;
  releaseMeaning: string | null;
  supersededAtIso: string | null;
  withdrawnBy: string | null;
  withdrawnAtIso: string | null;
  withdrawnReason: string | null;
  warningReasons: Record<string, string>;
}

/** Somebody else who has the draft open. */
export interface OtherEditor {
  name: string;
  stepId: string | null;
}

/** A tab that has the draft open says so, with the step that has the focus. */
export const presenceSchema = z.object({
  tabId: z.string().min(1).max(60),
  stepId: z.string().max(40).nullable(),
});
export type Presence = z.infer<typeof presenceSchema>;

/** What the editor opens with. */
export interface DraftPage {
  sequenceId: string;
  sequenceName: string;
  boardType: BoardType;
  head: RevisionHead;
  sequence: Sequence;
  /** The revision in use, with which the draft is compared. Null: none is released yet. */
  released: { head: RevisionHead; sequence: Sequence } | null;
  stations: { code: string; name: string; station: StationKind }[];
  mayEdit: boolean;
  /** Another engineer or quality, who did not change this draft. */
  mayRelease: boolean;
}
