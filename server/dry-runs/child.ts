import { constants, setPriority } from 'node:os';
import { entryOf } from './entry';
import { BoardPool } from './board-pool';
import type { DryRunJob, DryRunTold } from './job';
import { runJob } from './run-job';

/** A process of its own for one dry run, behind everything else that this computer does. Ends with its parent. */

setPriority(constants.priority.PRIORITY_BELOW_NORMAL);
process.on('disconnect', () => process.exit());

/** Resolves once the message is on its way, so that the process may end. */
const tell = (told: DryRunTold) => new Promise<void>((resolve) => process.send!(told, undefined, {}, () => resolve()));

process.once('message', (job: DryRunJob) => {
  const pool = new BoardPool(entryOf('worker'), job.workers);
  runJob(
    job,
    (task) => pool.run(task),
    (told) => void tell(told),
  )
    .catch((error: unknown) =>
      tell({ kind: 'failed', problem: error instanceof Error ? error.message : String(error) }),
    )
    .finally(async () => {
      await pool.close();
      process.disconnect();
    });
});
