import type { DryRunResult } from '@/lib/contracts/dry-run';
import type { DryBoardOutcome } from '@/lib/dry-run/outcome';
import type { Sequence } from '@/lib/sequence/step';
import type { Trial } from '@/stations/dry-run/run-board';

/** What the child process is given. Plain data. */
export interface DryRunJob {
  draft: Trial;
  released: Sequence | null;
  changes: { words: string; stepIds: string[]; sequence: Sequence }[];
  workers: number;
}

/** What it tells, about twice a second and at the end. */
export type DryRunTold =
  | { kind: 'progress'; done: number; result: DryRunResult }
  | { kind: 'done'; done: number; result: DryRunResult }
  | { kind: 'failed'; problem: string };

/** What a worker thread does at once: some boards, each by every sequence, so that all of them come on evenly. */
export interface BoardsTask {
  trial: Trial;
  sequences: Sequence[];
  from: number;
  to: number;
}
/** By sequence, then by board. */
export type BoardsAnswer = DryBoardOutcome[][];
