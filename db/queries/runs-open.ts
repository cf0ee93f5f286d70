import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { retestOrders } from '@/db/schema/retest-orders';
import { runEvents } from '@/db/schema/run-events';
import { runs } from '@/db/schema/runs';
import { stations } from '@/db/schema/stations';
import type { RunEvent } from '@/lib/run/types';

type Reader = Database | Transaction;
export type NewRun = typeof runs.$inferInsert;
export type OpenRun = typeof runs.$inferSelect;

export async function insertRun(tx: Transaction, run: NewRun): Promise<void> {
  await tx.insert(runs).values(run);
}

/** Number of the unit's next production run, from 1. Locks nothing: the unique index decides. */
export async function nextAttempt(tx: Transaction, unitId: string): Promise<number> {
  const [row] = await tx
    .select({ last: sql<number>`coalesce(max(${runs.attempt}), 0)::int` })
    .from(runs)
    .where(and(eq(runs.unitId, unitId), eq(runs.kind, 'production')));
  return row!.last + 1;
}

/**
 * Number of the board's next engineering run, from 1. A spare board, `unitId` null, is known by its serial number; nobody else
 * numbers it at the same moment, since it lies on one fixture.
 */
export async function nextEngineeringAttempt(tx: Transaction, unitId: string | null, serial: string): Promise<number> {
  const board = unitId ? eq(runs.unitId, unitId) : and(isNull(runs.unitId), sql`${runs.plan} ->> 'serial' = ${serial}`);
  const [row] = await tx
    .select({ last: sql<number>`coalesce(max(${runs.attempt}), 0)::int` })
    .from(runs)
    .where(and(board, eq(runs.kind, 'engineering')));
  return row!.last + 1;
}

export async function useRetestOrder(tx: Transaction, orderId: string, runId: string): Promise<void> {
  await tx.update(retestOrders).set({ usedByRunId: runId }).where(eq(retestOrders.id, orderId));
}

/** Writing a batch again changes nothing. Events are counted by batches, from 0. */
export async function insertRunEvents(
  db: Reader,
  runId: string,
  batches: { n: number; batch: RunEvent[] }[],
): Promise<void> {
  if (batches.length === 0) return;
  await db
    .insert(runEvents)
    .values(batches.map((each) => ({ ...each, runId })))
    .onConflictDoNothing();
}

export async function listRunEvents(db: Reader, runId: string): Promise<{ n: number; batch: RunEvent[] }[]> {
  return db
    .select({ n: runEvents.n, batch: runEvents.batch })
    .from(runEvents)
    .where(eq(runEvents.runId, runId))
    .orderBy(runEvents.n);
}

/** Runs that nobody closed: what a crash leaves behind. */
export async function listOpenRuns(db: Reader): Promise<OpenRun[]> {
  return db.select().from(runs).where(isNull(runs.endedAt));
}

export async function findOpenRunOfUnit(db: Reader, unitId: string): Promise<{ stationCode: string } | null> {
  const [row] = await db
    .select({ stationCode: stations.code })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(and(eq(runs.unitId, unitId), isNull(runs.endedAt)));
  return row ?? null;
}

export async function isRunOpen(db: Reader, runId: string): Promise<boolean> {
  return (await db.$count(runs, and(eq(runs.id, runId), isNull(runs.endedAt)))) > 0;
}
