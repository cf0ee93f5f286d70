import type { Database } from '@/db/client';
import { claimDueLabels, findLabelJob, updateLabel } from '@/db/queries/labels';
import { mostTries, sendLabel } from './send-label';

export interface LabelSender {
  /** Finishes the label in hand, takes no other. */
  stop(): Promise<void>;
}

interface LabelSenderOptions {
  db: Database;
  log: { warn(details: object, message: string): void };
  pollMs?: number;
}

/** Longer than all answers of a printer together, so that a label is not taken twice. */
const leaseMs = 30_000;
const databaseAwayMs = 2_000;

/**
 * Sends waiting labels to their printers, in the server process, for as long as it runs. Several servers on one database
 * share the work. A failure is written beside the label and tried again; nothing here reaches a bench.
 */
export function startLabelSender({ db, log, pollMs = 500 }: LabelSenderOptions): LabelSender {
  let stopped = false;
  let wake = () => {};
  const pause = (ms: number) =>
    new Promise<void>((resolve) => {
      const timer = setTimeout(resolve, ms);
      wake = () => {
        clearTimeout(timer);
        resolve();
      };
    });

  async function sendDue(): Promise<void> {
    const now = new Date();
    const leaseUntil = new Date(now.getTime() + leaseMs);
    // One at a time: labels leave the printer in the order of their boards.
    while (!stopped) {
      const [claimed] = await claimDueLabels(db, { now, leaseUntil, most: 1, mostTries });
      if (!claimed) return;
      const job = await findLabelJob(db, claimed.id);
      if (!job) continue;
      const change = await sendLabel(job, () => new Date());
      await updateLabel(db, job.id, change);
      if (change.state === 'failed')
        log.warn(
          { labelId: job.id, serial: job.serial, problem: change.problem, tries: change.tries },
          'label not printed',
        );
    }
  }

  const running = (async () => {
    while (!stopped) {
      const waitMs = await sendDue().then(
        () => pollMs,
        (error: unknown) => {
          log.warn({ error }, 'label sender could not reach the database');
          return databaseAwayMs;
        },
      );
      if (!stopped) await pause(waitMs);
    }
  })();

  return {
    async stop() {
      stopped = true;
      wake();
      await running;
    },
  };
}
