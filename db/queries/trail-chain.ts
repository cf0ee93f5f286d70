import { and, asc, eq, gt, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { runEvents } from '@/db/schema/run-events';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { traces } from '@/db/schema/traces';
import { trail } from '@/db/schema/trail';
import { trailCheckpoints } from '@/db/schema/trail-checkpoints';
import type { SealedFields } from '@/lib/trail/seal-text';

type Reader = Database | Transaction;

export interface ChainHead {
  chain: string;
  place: number;
  seal: string;
}
export type SealedEntry = SealedFields & { id: number; seal: string | null };

/** The newest entry of every chain, by chain. */
export async function listChainHeads(db: Reader): Promise<ChainHead[]> {
  const { rows } = await db.execute<{ chain: string; place: string; seal: string }>(
    sql`select distinct on (chain) chain, place, seal from trail where chain is not null order by chain, place desc`,
  );
  return rows.map(({ chain, place, seal }) => ({ chain, place: Number(place), seal }));
}

/** Up to `most` entries of a chain after a place, in order, every value as PostgreSQL writes it. */
export async function listSealedEntries(
  db: Reader,
  chain: string,
  afterPlace: number,
  most: number,
): Promise<SealedEntry[]> {
  return db
    .select({
      id: trail.id,
      chain: sql<string>`${trail.chain}`,
      place: sql<number>`${trail.place}`.mapWith(Number),
      at: sql<string>`to_char(${trail.at} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"')`,
      accountId: trail.accountId,
      stationId: trail.stationId,
      action: trail.action,
      entity: trail.entity,
      entityId: trail.entityId,
      before: sql<string | null>`${trail.before}::text`,
      after: sql<string | null>`${trail.after}::text`,
      reason: trail.reason,
      seal: trail.seal,
    })
    .from(trail)
    .where(and(eq(trail.chain, chain), gt(trail.place, afterPlace)))
    .orderBy(asc(trail.place))
    .limit(most);
}

/** Entries whose seal is missing: none, once their transaction has committed. */
export async function countUnsealed(db: Reader): Promise<number> {
  return db.$count(trail, isNull(trail.seal));
}

export async function listCheckpoints(db: Reader): Promise<(typeof trailCheckpoints.$inferSelect)[]> {
  return db.select().from(trailCheckpoints).orderBy(asc(trailCheckpoints.chain), asc(trailCheckpoints.place));
}

export async function insertCheckpoints(tx: Reader, rows: (typeof trailCheckpoints.$inferInsert)[]): Promise<void> {
  if (rows.length > 0) await tx.insert(trailCheckpoints).values(rows);
}

/** What of a closed run never changes: all but the scan of its red bin, which may follow. Null: no such run. */
export async function findRunRecord(db: Reader, runId: string) {
  const [run] = await db
    .select({
      id: runs.id,
      kind: runs.kind,
      unitId: runs.unitId,
      lotId: runs.lotId,
      referenceBoardId: runs.referenceBoardId,
      offerId: runs.offerId,
      stationId: runs.stationId,
      operatorId: runs.operatorId,
      attempt: runs.attempt,
      plan: runs.plan,
      startedAt: runs.startedAt,
      endedAt: runs.endedAt,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      likelyCause: runs.likelyCause,
      noVerdictReason: runs.noVerdictReason,
      faultCode: runs.faultCode,
      faultDetail: runs.faultDetail,
      failingWhenStopped: runs.failingWhenStopped,
      supplyOffConfirmed: runs.supplyOffConfirmed,
      supplyOffVolts: runs.supplyOffVolts,
      supplyOffBy: runs.supplyOffBy,
      seconds: runs.seconds,
      trimRounds: runs.trimRounds,
      turnsAdvised: runs.turnsAdvised,
      adjustments: runs.adjustments,
      closedBy: runs.closedBy,
    })
    .from(runs)
    .where(eq(runs.id, runId));
  if (!run) return null;
  // One after the other: inside a transaction they share a connection.
  const measured = await db
    .select()
    .from(measurements)
    .where(eq(measurements.runId, runId))
    .orderBy(asc(measurements.n));
  const events = await db
    .select({ n: runEvents.n, batch: runEvents.batch })
    .from(runEvents)
    .where(eq(runEvents.runId, runId))
    .orderBy(asc(runEvents.n));
  const stretches = await db.select().from(traces).where(eq(traces.runId, runId)).orderBy(asc(traces.n));
  return { run, measurements: measured, events, traces: stretches };
}
