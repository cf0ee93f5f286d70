import type { Database } from '@/db/client';
import { isRunOpen } from '@/db/queries/runs-open';
import type { RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import type { StepGroup } from '@/lib/sequence/step';
import { appendEvents } from '../operations/runs/append-events';
import { recordRun } from '../operations/runs/record-run';
import type { EventBatch, RecordedEvent, RunRecord } from '../operations/runs/run-record';
import type { Journal } from './journal';

interface Log {
  warn(details: object, message: string): void;
}

/** A database that does not answer for so long at the end of a run counts as away: the bench goes on. */
const closeWithinMs = 8_000;

/** Events that come this close together share a batch. */
const gatherMs = 200;

/**
 * Keeps the events of runs: first in the journal, then in the database. When the database is away the run goes on into the
 * journal alone, and `storeEnded` stores it once the database is back.
 */
export class RunRecorder {
  private readonly open = new Set<string>();
  private storing: Promise<number> | null = null;

  constructor(
    private readonly db: Database,
    private readonly journal: Journal,
    private readonly log: Log,
  ) {}

  begin(plan: RunPlan): RecordedRun {
    this.open.add(plan.runId);
    return new RecordedRun(plan.runId, this.db, this.journal, this.log, () => this.open.delete(plan.runId));
  }

  /** Stores every ended run that only the journal has; how many. Rejects while the database is away. */
  storeEnded(): Promise<number> {
    this.storing ??= this.storeAllEnded().finally(() => (this.storing = null));
    return this.storing;
  }

  private async storeAllEnded(): Promise<number> {
    let stored = 0;
    for (const { runId, batches, ending } of await this.journal.list()) {
      if (this.open.has(runId) || !ending) continue;
      const recorded = await recordRun(this.db, { runId, batches, ...ending }, 'journal');
      await (recorded.ok ? this.journal.forget(runId) : this.setAside(runId));
      if (recorded.ok) stored++;
    }
    return stored;
  }

  /** At start: hands the events of runs that a crash broke off to the database, where recovery will close them. */
  async handOverBroken(): Promise<void> {
    for (const { runId, batches, ending } of await this.journal.list()) {
      if (ending) continue;
      const open = await isRunOpen(this.db, runId);
      if (open) await appendEvents(this.db, runId, batches);
      await (open ? this.journal.forget(runId) : this.setAside(runId));
    }
  }

  private async setAside(runId: string): Promise<void> {
    this.log.warn({ runId }, 'the journal has a run that the database does not know');
    await this.journal.setAside(runId);
  }
}

export class RecordedRun {
  private waiting: RecordedEvent[] = [];
  private readonly batches: EventBatch[] = [];
  /** Batches from here on are not in the database yet. */
  private stored = 0;
  private timer: NodeJS.Timeout | null = null;
  /** Never waits for the database. */
  private journalling: Promise<void>;
  private storing: Promise<void> = Promise.resolve();
  private file: Awaited<ReturnType<Journal['begin']>> | null = null;

  constructor(
    private readonly runId: string,
    private readonly db: Database,
    private readonly journal: Journal,
    private readonly log: Log,
    private readonly onClosed: () => void,
  ) {
    this.journalling = journal.begin(runId).then(
      (file) => void (this.file = file),
      (error: unknown) => this.log.warn({ error, runId }, 'the journal of a run cannot be written'),
    );
  }

  record(event: RunEvent, during: StepGroup): void {
    this.waiting.push({ event, during });
    this.timer ??= setTimeout(() => this.flush(), gatherMs);
  }

  /** Never rejects. `stored` false: the journal has the run, and the database will when it is back. */
  async close(result: RunResult, seconds: number): Promise<{ stored: boolean; validUntilIso: string | null }> {
    const ending = { result, seconds, endedAtIso: new Date().toISOString() };
    this.gather();
    this.journalling = this.journalling
      .then(() => this.journalled(() => this.file?.append({ close: ending })))
      .then(() => this.journalled(() => this.file?.close()));
    await this.journalling;
    const record: RunRecord = { runId: this.runId, batches: this.batches, ...ending };
    try {
      const recorded = await within(
        closeWithinMs,
        this.storing.then(() => recordRun(this.db, record, 'station')),
      );
      if (!recorded.ok) throw new Error(recorded.sentence);
      await this.journalled(() => this.journal.forget(this.runId));
      return { stored: true, ...recorded.value };
    } catch (error) {
      this.log.warn({ error, runId: this.runId }, 'a run waits in the journal until the database is back');
      return { stored: false, validUntilIso: null };
    } finally {
      this.onClosed();
    }
  }

  private flush(): void {
    this.gather();
    this.storing = this.storing.then(() => this.store());
  }

  /** Makes a batch of what waits and writes it to the journal. */
  private gather(): void {
    if (this.timer) clearTimeout(this.timer);
    this.timer = null;
    if (this.waiting.length === 0) return;
    const batch: EventBatch = { n: this.batches.length, events: this.waiting };
    this.batches.push(batch);
    this.waiting = [];
    this.journalling = this.journalling.then(() => this.journalled(() => this.file?.append({ batch })));
  }

  /** What the database does not take now is given to it again with the next batch, or at the end. */
  private async store(): Promise<void> {
    const unstored = this.batches.slice(this.stored);
    try {
      await appendEvents(this.db, this.runId, unstored);
      this.stored += unstored.length;
    } catch (error) {
      this.log.warn({ error, runId: this.runId }, 'events of a run are in the journal only');
    }
  }

  private async journalled(write: () => Promise<void> | undefined): Promise<void> {
    try {
      await write();
    } catch (error) {
      this.log.warn({ error, runId: this.runId }, 'the journal of a run cannot be written');
    }
  }
}

function within<T>(ms: number, work: Promise<T>): Promise<T> {
  let timer: NodeJS.Timeout;
  const late = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new Error(`The database did not answer within ${ms} ms.`)), ms);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}
