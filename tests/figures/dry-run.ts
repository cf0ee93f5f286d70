import { sequences } from '../../db/seed/sequences';
import { boardTypes } from '../../db/seed/board-types';
import { usualDryRun } from '../../lib/contracts/dry-run';
import type { DryBoardOutcome } from '../../lib/dry-run/outcome';
import { usualStation } from '../../lib/prediction/types';
import { newcombeDifference } from '../../lib/statistics/proportions/newcombe-difference';
import type { Trial } from '../../stations/dry-run/run-board';
import type { DryRunFigureJob, DryRunFigureAnswer } from './dry-run/dry-run-worker';
import { predictionRows } from './dry-run/neighbours';
import { serverDelayMs } from './dry-run/server-delay';
import { atLeast, below, type Figure, type FigureRow, type FigureTarget } from './figure';
import { round } from './statistics';
import { runJobs } from './worker-pool';

const seed = 60_007;
const boardsTimed = 2000;
const predicted = 2000;
const seen = 200;
const repeats = 100;
const repeatsInBytes = 10;
const boardsAJob = 25;
const worker = new URL('./dry-run/dry-run-worker.ts', import.meta.url);

/** A share of defects that makes the yield worth predicting; every type and procedure in turn. */
const trialOf = (repeat: number, which: 'prediction' | 'outcome'): Trial => {
  const { boardTypeCode, sequence } = sequences[repeat % sequences.length]!;
  return {
    sequence,
    boardType: boardTypes.find(({ code }) => code === boardTypeCode)!,
    station: usualStation,
    settings: { ...usualDryRun, defectRate: 0.08, seed: seed + 2 * repeat + (which === 'outcome' ? 1 : 0) },
  };
};

interface Tested {
  outcomes: DryBoardOutcome[];
  cpuMs: number;
}

/** Boards of several trials at once, in worker threads. */
async function testBoards(
  wanted: { trial: Trial; boards: number; bytes: boolean }[],
  progress: (done: number, of: number) => void = () => undefined,
): Promise<Tested[]> {
  const tested = wanted.map((): Tested => ({ outcomes: [], cpuMs: 0 }));
  const jobs = wanted.flatMap(({ trial, boards, bytes }, of) =>
    Array.from({ length: Math.ceil(boards / boardsAJob) }, (_, i): DryRunFigureJob => {
      const from = i * boardsAJob;
      return { of, trial, bytes, from, count: Math.min(boardsAJob, boards - from) };
    }),
  );
  let done = 0;
  await runJobs<DryRunFigureJob, DryRunFigureAnswer>(worker, jobs, (job, answer) => {
    tested[job.of]!.outcomes.push(...answer.outcomes);
    tested[job.of]!.cpuMs += answer.busyMs;
    progress(++done, jobs.length);
  });
  return tested;
}

const passed = (outcomes: DryBoardOutcome[]) => ({
  successes: outcomes.filter(({ verdict }) => verdict === 'pass').length,
  trials: outcomes.filter(({ verdict }) => verdict !== 'no-verdict').length,
});

async function speed(share: number): Promise<{ rows: FigureRow[]; targets: FigureTarget[] }> {
  const boards = Math.max(200, Math.ceil(boardsTimed * share));
  const rows: FigureRow[] = [];
  let slowest = 0;
  let leastRatio = Infinity;
  for (const [i, { name }] of sequences.entries()) {
    const startedMs = performance.now();
    const [{ outcomes, cpuMs }] = (await testBoards([{ trial: trialOf(i, 'prediction'), boards, bytes: false }])) as [
      Tested,
    ];
    const seconds = (performance.now() - startedMs) / 1000;
    const simulated = outcomes.reduce((sum, each) => sum + each.seconds, 0);
    const for2000 = (seconds * boardsTimed) / boards;
    slowest = Math.max(slowest, for2000);
    leastRatio = Math.min(leastRatio, simulated / seconds);
    rows.push({
      what: name,
      boards,
      'boards/s/core': round((1000 * boards) / cpuMs, 1),
      'times real time, two cores': round(simulated / seconds, 0),
      's for 2,000 on two cores': round(for2000, 1),
    });
  }
  return {
    rows,
    targets: [
      below('2,000 boards on two cores: slowest sequence, s', round(slowest, 1), 60),
      atLeast('times real time on two cores, least', round(leastRatio, 0), 1000),
    ],
  };
}

/** How often the interval of the difference between a prediction and an independent outcome holds 0. */
async function held(
  count: number,
  first: number,
  share: number,
  bytes: boolean,
  progress: (done: number, of: number) => void,
): Promise<number> {
  const wanted = Array.from({ length: count }, (_, i) => [
    { trial: trialOf(first + i, 'prediction'), boards: Math.ceil(predicted * share), bytes: false },
    { trial: trialOf(first + i, 'outcome'), boards: Math.ceil(seen * share), bytes },
  ]).flat();
  const tested = await testBoards(wanted, progress);
  return Array.from({ length: count }, (_, i) => {
    const { low, high } = newcombeDifference(passed(tested[2 * i]!.outcomes), passed(tested[2 * i + 1]!.outcomes));
    return low <= 0 && high >= 0;
  }).filter(Boolean).length;
}

export const dryRun: Figure = {
  name: 'dry-run',
  title:
    'simulated boards: how fast, whether predicted yields come true, and what the editor and the server feel of them',
  async run(progress, share) {
    const timed = await speed(share);
    for (const row of timed.rows) progress(`${row.what}: ${row['boards/s/core']} boards a second and core`);
    const delayMs = await serverDelayMs(Math.ceil(60 * share));
    progress(`event loop beside a dry run: ${round(delayMs, 1)} ms at the 99th percentile`);
    const neighbours = await predictionRows(progress, share);
    const every = (what: string, steps: number) => {
      let told = 0;
      return (done: number, of: number) => {
        if (Math.floor((done / of) * steps) <= told) return;
        told = Math.floor((done / of) * steps);
        progress(`${what}: ${done} of ${of} jobs`);
      };
    };
    const many = Math.max(1, Math.ceil(repeats * share));
    const few = Math.max(1, Math.ceil(repeatsInBytes * share));
    const inBytes = await held(few, 1000, share, true, every('outcomes in bytes', 5));
    progress(`prediction held in ${inBytes} of ${few} outcomes with bytes`);
    const dry = await held(many, 0, share, false, every('outcomes without bytes', 20));
    progress(`prediction held in ${dry} of ${many} outcomes without bytes`);
    return {
      rows: [
        ...timed.rows,
        { what: 'prediction held, without bytes', boards: many },
        { what: 'prediction held, with bytes', boards: few },
        ...neighbours.rows,
      ],
      targets: [
        ...timed.targets,
        below('event loop of the server beside a dry run: 99th percentile, ms', round(delayMs, 1), 50),
        atLeast('interval holds 0, of 100 outcomes without bytes', round((100 * dry) / many, 0), 90),
        atLeast('interval holds 0, of 10 outcomes with bytes', round((10 * inBytes) / few, 1), 8),
        ...neighbours.targets,
      ],
      notes: [
        `A prediction is ${predicted} boards, an outcome ${seen} others of the same kind, drawn with another seed; Newcombe's 95 % interval for independent shares.`,
        'Boards/s/core: by the time the worker threads were busy. With bytes: SCPI over mock serial lines on a virtual clock.',
      ],
    };
  },
};
