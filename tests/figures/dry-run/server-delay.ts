import { fork } from 'node:child_process';
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { boardTypes } from '../../../db/seed/board-types';
import { sequences } from '../../../db/seed/sequences';
import { usualDryRun } from '../../../lib/contracts/dry-run';
import { usualStation } from '../../../lib/prediction/types';
import { entryOf } from '../../../server/dry-runs/entry';
import type { DryRunJob, DryRunTold } from '../../../server/dry-runs/job';

/** How late this process's event loop is, 99th percentile in milliseconds, while the server's own child tests boards on both cores. */
export async function serverDelayMs(boards: number): Promise<number> {
  const { sequence, boardTypeCode } = sequences[0]!;
  const boardType = boardTypes.find(({ code }) => code === boardTypeCode)!;
  const settings = { ...usualDryRun, boards: Math.max(20, boards) };
  const draft = { sequence, boardType, station: usualStation, settings };
  const job: DryRunJob = { draft, released: sequence, changes: [], workers: 2 };
  const { path, execArgv } = entryOf('child');
  const child = fork(path, [], { execArgv, stdio: ['ignore', 'ignore', 'inherit', 'ipc'] });
  const resolutionMs = 10;
  const delay = monitorEventLoopDelay({ resolution: resolutionMs });
  await new Promise<void>((resolve, reject) => {
    child.on('message', (told: DryRunTold) => {
      if (told.kind === 'progress') delay.enable();
      if (told.kind === 'failed') reject(new Error(told.problem));
    });
    child.on('close', () => resolve());
    child.send(job);
  });
  delay.disable();
  return Math.max(0, delay.percentile(99) / 1e6 - resolutionMs);
}
