import { fork, type ChildProcess } from 'node:child_process';
import { availableParallelism } from 'node:os';
import type { Database } from '@/db/client';
import {
  claimDryRun,
  isDryRunRunning,
  returnLostDryRuns,
  updateRunningDryRun,
  type DryRunRow,
} from '@/db/queries/dry-runs';
import { listen } from '../postgres';
import { entryOf } from './entry';
import type { DryRunJob, DryRunTold } from './job';
import { jobOf } from './job-of';

export interface DryRuns {
  /** Ends the one at work, which begins again with the next server. */
  stop(): Promise<void>;
}

interface Options {
  db: Database;
  log: { warn(details: object, message: string): void };
}

const lookEveryMs = 10_000;
const crashed = 'The simulation ended unexpectedly. Run it again.';

/**
 * Performs what is asked for in the table of dry runs, one at a time, each in a process of its own with worker threads: the
 * server's own loop never simulates. Hears of new and cancelled ones by notification.
 */
export async function startDryRuns({ db, log }: Options): Promise<DryRuns> {
  let current: { id: string; child: ChildProcess } | null = null;
  let stopped = false;
  /** Something new may wait: what is under way looks once more. */
  let asked = false;
  let working: Promise<void> | null = null;

  async function work(): Promise<void> {
    while (!stopped) {
      asked = false;
      const row = await claimDryRun(db);
      if (row) await perform(row);
      else if (!asked) return;
    }
  }
  function look(): void {
    asked = true;
    if (stopped) return;
    working ??= work()
      .catch((error: unknown) => log.warn({ error }, 'dry runs could not be looked at'))
      .finally(() => (working = null));
  }

  async function perform(row: DryRunRow): Promise<void> {
    const job = await jobOf(db, row, Math.max(2, availableParallelism() - 1));
    const begin = (child: ChildProcess) => {
      current = { id: row.id, child };
      // Stopped or cancelled before there was a process to end.
      if (stopped) child.kill('SIGKILL');
      else considerQuietly(row.id);
    };
    const ended = await runInChild(job, begin, ({ done, result }) => updateRunningDryRun(db, row.id, { done, result }));
    current = null;
    if (stopped && ended === null) return updateRunningDryRun(db, row.id, { state: 'waiting', done: 0, result: null });
    if (ended?.kind === 'done')
      return updateRunningDryRun(db, row.id, { state: 'done', done: ended.done, result: ended.result });
    if (!(await isDryRunRunning(db, row.id))) return;
    log.warn({ dryRunId: row.id, problem: ended?.problem }, 'dry run failed');
    await updateRunningDryRun(db, row.id, { state: 'failed', problem: crashed });
  }

  async function consider(id: string): Promise<void> {
    if (current?.id !== id) return look();
    if (!(await isDryRunRunning(db, id))) current?.child.kill('SIGKILL');
  }

  function considerQuietly(id: string): void {
    consider(id).catch((error: unknown) => log.warn({ error }, 'a dry run could not be looked at'));
  }

  const lost = await returnLostDryRuns(db);
  if (lost > 0) log.warn({ lost }, 'dry runs of an ended server begin again');
  const onReconnected = () => (current ? considerQuietly(current.id) : look());
  const listener = await listen('dry_run', considerQuietly, onReconnected);
  const timer = setInterval(onReconnected, lookEveryMs);
  timer.unref();
  look();
  return {
    async stop() {
      stopped = true;
      clearInterval(timer);
      await listener.close();
      current?.child.kill('SIGKILL');
      await working;
    },
  };
}

/** Resolves once the process is gone: with its last word, or null when it had none. */
function runInChild(
  job: DryRunJob,
  onChild: (child: ChildProcess) => void,
  onProgress: (told: Extract<DryRunTold, { kind: 'progress' }>) => Promise<void>,
): Promise<Exclude<DryRunTold, { kind: 'progress' }> | null> {
  const { path, execArgv } = entryOf('child');
  return new Promise((resolve) => {
    let last: Exclude<DryRunTold, { kind: 'progress' }> | null = null;
    let writing: Promise<void> | null = null;
    const child = fork(path, [], { execArgv, stdio: ['ignore', 'ignore', 'inherit', 'ipc'] });
    onChild(child);
    child.on('message', (told: DryRunTold) => {
      if (told.kind !== 'progress') last = told;
      // A database that is slow or away costs a step of progress, no more.
      else
        writing ??= onProgress(told)
          .catch(() => undefined)
          .finally(() => (writing = null));
    });
    child.on('error', () => undefined);
    child.on('close', () => void Promise.resolve(writing).then(() => resolve(last)));
    child.send(job);
  });
}
