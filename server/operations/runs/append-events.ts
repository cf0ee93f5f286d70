import type { Database } from '@/db/client';
import { insertRunEvents } from '@/db/queries/runs-open';
import type { EventBatch } from './run-record';

/** Stores events of an open run as they happen. Storing a batch again changes nothing. */
export async function appendEvents(db: Database, runId: string, batches: readonly EventBatch[]): Promise<void> {
  await insertRunEvents(
    db,
    runId,
    batches.map(({ n, events }) => ({ n, batch: events.map(({ event }) => event) })),
  );
}
