import { atMost, below, type Figure } from './figure';
import { rows, targetRows, type SearchRow } from './search/rows';
import { medianCommandMs } from './search/command-time';
import type { SearchAnswer, SearchedOne, SearchJob } from './search/search-worker';
import { type CommandMs, summarise } from './search/summarise';
import { round, upperLimitOfNone } from './statistics';
import { runJobs } from './worker-pool';

/** Tuned on another seed. */
const seed = 31337;
const boardsPerJob = 25;
const timedBoards = 12;
const worker = new URL('./search/search-worker.ts', import.meta.url);

/** Milliseconds a command takes at a link speed, from searches timed by the virtual clock. */
async function timeCommands(baudRate: 9600 | 115200): Promise<CommandMs> {
  const job: SearchJob = { row: targetRows.fine, seed, from: 0, count: timedBoards, baudRate };
  let times: CommandMs = { settle: Number.NaN, waypoint: Number.NaN };
  await runJobs<SearchJob, SearchAnswer>(worker, [job], (_job, { times: { settle, waypoint } }) => {
    times = { settle: settle.ms / settle.count, waypoint: waypoint.ms / waypoint.count };
  });
  return times;
}

/** Searches the boards of every row, calling back as each row is done. */
async function searchRows(share: number, onRow: (row: SearchRow, boards: SearchedOne[]) => void): Promise<void> {
  const jobs = rows.flatMap((row) => {
    const boards = Math.ceil(row.boards * share);
    return Array.from({ length: Math.ceil(boards / boardsPerJob) }, (_, i): SearchJob => {
      const from = i * boardsPerJob;
      return { row, seed, from, count: Math.min(boardsPerJob, boards - from), baudRate: 115200 };
    });
  });
  const waiting = new Map(rows.map((row) => [row, jobs.filter((job) => job.row === row).length]));
  const answers = new Map<SearchJob, SearchedOne[]>();
  await runJobs<SearchJob, SearchAnswer>(worker, jobs, (job, answer) => {
    answers.set(job, answer.boards);
    const left = waiting.get(job.row)! - 1;
    waiting.set(job.row, left);
    if (left === 0) {
      const own = jobs.filter((each) => each.row === job.row);
      onRow(
        job.row,
        own.flatMap((each) => answers.get(each)!),
      );
    }
  });
}

export const search: Figure = {
  name: 'search',
  title: 'finding trip and release: settles, seconds and errors, against ramps and bisection, through the whole stack',
  async run(progress, share) {
    const at9600 = await timeCommands(9600);
    const at115200 = await timeCommands(115200);
    const ms = (times: CommandMs) => `${round(times.settle, 1)} ms a settle, ${round(times.waypoint, 1)} a waypoint`;
    progress(`9,600 baud: ${ms(at9600)}; 115,200 baud: ${ms(at115200)}`);
    const commandMs = medianCommandMs();
    progress(`choosing a command: ${round(commandMs, 3)} ms median`);

    const summaries = new Map<SearchRow, ReturnType<typeof summarise>>();
    await searchRows(share, (row, boards) => {
      const summary = summarise(row, boards, at9600, at115200);
      summaries.set(row, summary);
      const { meanSettles, rmsMillivolts, wrongBy5, wrongClass } = summary;
      const rms = Number.isNaN(rmsMillivolts) ? '' : `, RMS ${round(rmsMillivolts, 2)} mV`;
      progress(
        `${summaries.size}/${rows.length} ${row.name}, noise ${row.noiseMillivolts} mV: ${round(meanSettles, 1)} settles` +
          `${rms}, ${wrongBy5} by over 5 mV, ${wrongClass} in the wrong class`,
      );
    });
    const fine = summaries.get(targetRows.fine)!;
    const quick = summaries.get(targetRows.quick)!;
    const prior = summaries.get(targetRows.prior)!;
    const targeted = [fine, quick, prior];
    const sum = (of: 'wrongBy5' | 'wrongClass') => targeted.reduce((total, each) => total + each[of], 0);
    return {
      rows: rows.map((row) => summaries.get(row)!.columns),
      targets: [
        atMost('no prior: mean settles', round(fine.meanSettles, 2), 50),
        below('no prior: RMS error, mV', round(fine.rmsMillivolts, 3), 0.5),
        atMost('no prior, quick: mean settles', round(quick.meanSettles, 2), 34),
        below('no prior, quick: RMS error, mV', round(quick.rmsMillivolts, 3), 0.75),
        atMost('prior 30 mV: mean settles', round(prior.meanSettles, 2), 40),
        below('prior 30 mV: RMS error, mV', round(prior.rmsMillivolts, 3), 0.5),
        atMost('wrong by over 5 mV in the three rows', sum('wrongBy5'), 0),
        atMost('wrong class in the three rows', sum('wrongClass'), 0),
        below('choosing a command: median ms', round(commandMs, 3), 2),
      ],
      notes: [
        'Settles include waypoints and leave out the end check (column check); seconds include everything. Errors in mV.',
        'All rows: SCPI bytes over mock serial lines, simulated instruments and board, virtual clock. The RMS of a target is the larger of T and R.',
        `None wrong in 2,000 leaves an upper 95 % limit of ${round(100 * upperLimitOfNone(2000), 2)} %; in 500, ${round(100 * upperLimitOfNone(500), 1)} %.`,
      ],
    };
  },
};
