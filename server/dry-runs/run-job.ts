import type { DryRunResult } from '@/lib/contracts/dry-run';
import type { DryBoardOutcome } from '@/lib/dry-run/outcome';
import { summarisePair, summariseSide } from '@/lib/dry-run/summarise';
import type { Sequence } from '@/lib/sequence/step';
import type { BoardsAnswer, BoardsTask, DryRunJob, DryRunTold } from './job';

/** Few, so that progress moves from the first moment on; many boards a task would save little. */
const boardsATask = 2;
const tellEveryMs = 500;

type Outcomes = (DryBoardOutcome | undefined)[];

/** Every board by the draft and the released revision, then each single change; tells how far it has come, and the result. */
export async function runJob(
  job: DryRunJob,
  runBoards: (task: BoardsTask) => Promise<BoardsAnswer>,
  tell: (told: DryRunTold) => void,
): Promise<void> {
  const startedMs = performance.now();
  const { boards } = job.draft.settings;
  const empty = (): Outcomes => new Array<DryBoardOutcome | undefined>(boards).fill(undefined);
  const draft = empty();
  const released = job.released && empty();
  const changed = job.changes.map(empty);
  let done = 0;
  let toldMs = startedMs;

  const result = (): DryRunResult => ({
    draft: summariseSide(draft),
    released: released && summariseSide(released),
    pair: released && summarisePair(draft, released),
    changesAlone: job.changes.flatMap(({ words, stepIds }, i) => {
      if (!released || changed[i]!.includes(undefined)) return [];
      const { onlyDraft, onlyReleased } = summarisePair(changed[i]!, released);
      return [{ words, stepIds, boards: onlyDraft - onlyReleased }];
    }),
    elapsedMs: performance.now() - startedMs,
  });
  type Side = { sequence: Sequence; into: Outcomes };
  const run = async (sides: Side[], from: number, to: number) => {
    const answers = await runBoards({ trial: job.draft, sequences: sides.map(({ sequence }) => sequence), from, to });
    answers.forEach((outcomes, side) => outcomes.forEach((outcome, i) => (sides[side]!.into[from + i] = outcome)));
    done += sides.length * (to - from);
    if (performance.now() - toldMs < tellEveryMs) return;
    toldMs = performance.now();
    tell({ kind: 'progress', done, result: result() });
  };
  const passes: Side[][] = [
    [
      { sequence: job.draft.sequence, into: draft },
      ...(job.released && released ? [{ sequence: job.released, into: released }] : []),
    ],
    ...job.changes.map(({ sequence }, i) => [{ sequence, into: changed[i]! }]),
  ];
  for (const sides of passes) {
    const tasks: Promise<void>[] = [];
    for (let from = 0; from < boards; from += boardsATask)
      tasks.push(run(sides, from, Math.min(boards, from + boardsATask)));
    await Promise.all(tasks);
  }
  tell({ kind: 'done', done, result: result() });
}
