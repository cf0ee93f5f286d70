import { eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { traces } from '@/db/schema/traces';
import type { Measurement } from '@/lib/run/types';
import type { Trace } from '@/lib/run/traces';

/** The run, locked until the transaction ends. */
export async function findRunForUpdate(tx: Transaction, runId: string): Promise<typeof runs.$inferSelect | null> {
  const [row] = await tx.select().from(runs).where(eq(runs.id, runId)).for('update');
  return row ?? null;
}

/** Before the run is closed: a closed run takes nothing more. */
export async function insertMeasurements(tx: Transaction, runId: string, made: readonly Measurement[]): Promise<void> {
  if (made.length > 0) await tx.insert(measurements).values(made.map((each, n) => ({ ...each, runId, n })));
}

export async function insertTraces(tx: Transaction, runId: string, made: readonly Trace[]): Promise<void> {
  if (made.length > 0) await tx.insert(traces).values(made.map((each, n) => ({ ...each, runId, n })));
}

export async function closeRun(
  tx: Transaction,
  runId: string,
  ending: Partial<typeof runs.$inferInsert> &
    Required<Pick<typeof runs.$inferInsert, 'verdict' | 'closedBy' | 'endedAt'>>,
): Promise<void> {
  await tx.update(runs).set(ending).where(eq(runs.id, runId));
}
