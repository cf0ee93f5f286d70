import type { DryBoardOutcome } from '../../../lib/dry-run/outcome';
import { runDryBoard, type Trial } from '../../../stations/dry-run/run-board';
import { runBoardInBytes } from '../../stations/dry-run/bytes-bench';
import { serveJobs } from '../serve-jobs';

export interface DryRunFigureJob {
  /** Which of the trials asked for. */
  of: number;
  trial: Trial;
  bytes: boolean;
  from: number;
  count: number;
}

export interface DryRunFigureAnswer {
  outcomes: DryBoardOutcome[];
  busyMs: number;
}

serveJobs(async ({ trial, bytes, from, count }: DryRunFigureJob): Promise<DryRunFigureAnswer> => {
  const startedMs = performance.now();
  const outcomes: DryBoardOutcome[] = [];
  for (let i = from; i < from + count; i++)
    outcomes.push(bytes ? (await runBoardInBytes(trial, i)).outcome : runDryBoard(trial, i));
  return { outcomes, busyMs: performance.now() - startedMs };
});
