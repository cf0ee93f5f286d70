import { z } from 'zod';
import type { RejectReason } from '../run/types';
import type { Sequence } from '../sequence/step';
import type { BoardType } from './board-type';
import type { DryRunState } from './stored-states';

/** What a dry run is asked to do. Boards are drawn from the seed, so two drafts meet the same boards. */
export const dryRunSettingsSchema = z.object({
  boards: z.coerce
    .number({ error: 'Enter how many boards.' })
    .int({ error: 'Enter a whole number of boards.' })
    .min(20, { error: 'Use at least 20 boards.' })
    .max(20_000, { error: 'Use at most 20,000 boards.' }),
  seed: z.coerce.number({ error: 'Enter a number.' }).int().min(0).max(2_147_483_647),
  /** Boards with a defect, as a fraction. */
  defectRate: z.coerce.number().min(0).max(0.5, { error: 'Use at most 50 %.' }),
  /** Relative error of a turn by hand, one standard deviation. */
  turnErrorRelative: z.coerce.number().min(0).max(0.3, { error: 'Use at most 30 %.' }),
  /** Its fixed part, degrees, one standard deviation. */
  turnErrorDegrees: z.coerce.number().min(0).max(30, { error: 'Use at most 30 degrees.' }),
  /** Null: the usual station of lib/prediction. */
  stationCode: z.string().nullable(),
});
export type DryRunSettings = z.infer<typeof dryRunSettingsSchema>;
export const usualDryRun: DryRunSettings = {
  boards: 2000,
  seed: 4817,
  defectRate: 0.03,
  turnErrorRelative: 0.04,
  turnErrorDegrees: 3,
  stationCode: null,
};

/** A share of boards with its Wilson 95 % interval. */
export interface Share {
  count: number;
  of: number;
  low: number;
  high: number;
}

/** Counts of a histogram; the value `from + i * width` begins bin i. Volts. */
export interface Bins {
  from: number;
  width: number;
  counts: number[];
}

/** What one revision did with the simulated boards. */
export interface DryRunSide {
  firstPass: Share;
  /** Boards by reason, most first. */
  reasons: { reason: RejectReason; stepId: string | null; boards: number }[];
  /** Boards that ended at each step without a pass. */
  lostAt: Record<string, number>;
  noVerdict: number;
  /** Verified values of the boards that got so far. */
  trip: Bins;
  release: Bins;
  /** Seconds of a board: station alone, with the person. Mean over passed boards. */
  stationSeconds: number;
  boardSeconds: number;
  /** Against the simulated truth: good boards rejected, bad boards passed. */
  falseRejects: Share;
  falseAccepts: Share;
  /** Yield after every 20 boards, for the chart of how it settles. */
  settling: { boards: number; share: number; low: number; high: number }[];
}

/** Both revisions on the same boards. */
export interface DryRunPair {
  /** Passed by the draft only, and by the released revision only. */
  onlyDraft: number;
  onlyReleased: number;
  /** Difference of first-pass yield, draft minus released, with Newcombe's 95 % interval for paired shares. */
  difference: { value: number; low: number; high: number };
}

export interface DryRunResult {
  draft: DryRunSide;
  /** Null: nothing is released yet. */
  released: DryRunSide | null;
  pair: DryRunPair | null;
  /** Each change of the draft run alone on the same boards: what it costs or gains, draft-only minus released-only. */
  changesAlone: { words: string; stepIds: string[]; boards: number }[];
  elapsedMs: number;
}

/** What the page shows while it runs and after. */
export interface DryRunView {
  id: string;
  state: DryRunState;
  settings: DryRunSettings;
  /** r7, and the version of the draft when it was asked. */
  revisionNumber: number;
  draftVersion: number;
  releasedNumber: number | null;
  done: number;
  of: number;
  /** Milliseconds left, null while unknown. */
  leftMs: number | null;
  result: DryRunResult | null;
  problem: string | null;
  kept: boolean;
  askedBy: string;
  askedAtIso: string;
}

/** A dry run shown whole, with what it ran on. */
export interface DryRunPage {
  view: DryRunView;
  revisionId: string;
  sequenceId: string;
  sequenceName: string;
  sequence: Sequence;
  releasedSequence: Sequence | null;
  boardType: BoardType;
}

export const askDryRunSchema = z.object({ revisionId: z.uuid(), settings: dryRunSettingsSchema });
export const dryRunIdSchema = z.object({ id: z.uuid() });
export const keepDryRunSchema = z.object({ id: z.uuid(), kept: z.boolean() });
