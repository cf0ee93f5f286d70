import { and, asc, desc, eq, inArray, ne, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { dryRuns } from '@/db/schema/dry-runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import type { DryRunResult } from '@/lib/contracts/dry-run';

type Reader = Database | Transaction;
export type DryRunRow = typeof dryRuns.$inferSelect;
const atWork = ['waiting', 'running'] as const;

/** A revision with what a dry run of it needs: the newest approved specification of its board type, or the newest where none is. */
export async function findRevisionToTry(tx: Transaction, revisionId: string) {
  const [row] = await tx
    .select({
      id: sequenceRevisions.id,
      sequenceId: sequenceRevisions.sequenceId,
      number: sequenceRevisions.number,
      version: sequenceRevisions.version,
      sequence: sequenceRevisions.data,
      boardType: boardTypeRevisions.specification,
    })
    .from(sequenceRevisions)
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.boardTypeId, sequences.boardTypeId))
    .where(eq(sequenceRevisions.id, revisionId))
    .orderBy(sql`${boardTypeRevisions.status} = 'approved' desc`, desc(boardTypeRevisions.number))
    .limit(1);
  return row ?? null;
}

/** The revision in use of a sequence, other than the one given; null: nothing is released. */
export async function findReleasedBeside(db: Reader, sequenceId: string, revisionId: string) {
  const [row] = await db
    .select({ id: sequenceRevisions.id, number: sequenceRevisions.number, sequence: sequenceRevisions.data })
    .from(sequenceRevisions)
    .where(
      and(
        eq(sequenceRevisions.sequenceId, sequenceId),
        eq(sequenceRevisions.status, 'released'),
        ne(sequenceRevisions.id, revisionId),
      ),
    )
    .orderBy(desc(sequenceRevisions.number))
    .limit(1);
  return row ?? null;
}

/** Null while another dry run of the revision is at work. */
export async function insertDryRun(tx: Transaction, run: typeof dryRuns.$inferInsert): Promise<{ id: string } | null> {
  const [row] = await tx.insert(dryRuns).values(run).onConflictDoNothing().returning({ id: dryRuns.id });
  return row ?? null;
}

/** Those of a revision that are over and were not kept: the next one replaces them. */
export async function deleteDryRunsNotKept(tx: Transaction, revisionId: string): Promise<void> {
  await tx
    .delete(dryRuns)
    .where(
      and(
        eq(dryRuns.revisionId, revisionId),
        eq(dryRuns.kept, false),
        inArray(dryRuns.state, ['done', 'cancelled', 'failed']),
      ),
    );
}

/** Stops one that is at work; false when it was over already. */
export async function cancelDryRun(tx: Transaction, id: string): Promise<boolean> {
  const rows = await tx
    .update(dryRuns)
    .set({ state: 'cancelled', endedAt: sql`now()` })
    .where(and(eq(dryRuns.id, id), inArray(dryRuns.state, [...atWork])))
    .returning({ id: dryRuns.id });
  return rows.length > 0;
}

/** False unless it is done. */
export async function setDryRunKept(tx: Transaction, id: string, kept: boolean): Promise<boolean> {
  const rows = await tx
    .update(dryRuns)
    .set({ kept })
    .where(and(eq(dryRuns.id, id), eq(dryRuns.state, 'done')))
    .returning({ id: dryRuns.id });
  return rows.length > 0;
}

const dryRunHeads = (db: Reader) =>
  db
    .select({
      run: dryRuns,
      revisionNumber: sequenceRevisions.number,
      sequenceId: sequences.id,
      sequenceName: sequences.name,
      askedByName: accounts.name,
      releasedNumber: sql<
        number | null
      >`(select number from sequence_revisions released where released.id = ${dryRuns.releasedRevisionId})`,
      releasedSequence: sql<
        DryRunRow['sequence'] | null
      >`(select data from sequence_revisions released where released.id = ${dryRuns.releasedRevisionId})`,
    })
    .from(dryRuns)
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, dryRuns.revisionId))
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .innerJoin(accounts, eq(accounts.id, dryRuns.askedBy))
    .$dynamic();

export type DryRunHead = Awaited<ReturnType<typeof dryRunHeads>>[number];

export async function findDryRun(db: Reader, id: string): Promise<DryRunHead | null> {
  const [row] = await dryRunHeads(db).where(eq(dryRuns.id, id));
  return row ?? null;
}

export async function findNewestDryRun(db: Reader, revisionId: string): Promise<DryRunHead | null> {
  const [row] = await dryRunHeads(db).where(eq(dryRuns.revisionId, revisionId)).orderBy(desc(dryRuns.askedAt)).limit(1);
  return row ?? null;
}

/** Takes the one that waits longest; null when none does. Several servers never take the same. */
export async function claimDryRun(db: Database): Promise<DryRunRow | null> {
  const next = db
    .select({ id: dryRuns.id })
    .from(dryRuns)
    .where(eq(dryRuns.state, 'waiting'))
    .orderBy(asc(dryRuns.askedAt))
    .limit(1)
    .for('update', { skipLocked: true });
  const [row] = await db
    .update(dryRuns)
    .set({ state: 'running', startedAt: sql`now()`, done: 0, result: null, problem: null })
    .where(inArray(dryRuns.id, next))
    .returning();
  return row ?? null;
}

/** A server that is gone left them running: they begin again. */
export async function returnLostDryRuns(db: Database): Promise<number> {
  const rows = await db
    .update(dryRuns)
    .set({ state: 'waiting', startedAt: null, done: 0, result: null })
    .where(eq(dryRuns.state, 'running'))
    .returning({ id: dryRuns.id });
  return rows.length;
}

export async function isDryRunRunning(db: Database, id: string): Promise<boolean> {
  const [row] = await db
    .select({ id: dryRuns.id })
    .from(dryRuns)
    .where(and(eq(dryRuns.id, id), eq(dryRuns.state, 'running')));
  return row !== undefined;
}

/** How far it has come, or how it ended; nothing once it was stopped. */
export async function updateRunningDryRun(
  db: Database,
  id: string,
  change: { done?: number; result?: DryRunResult | null; state?: 'done' | 'failed' | 'waiting'; problem?: string },
): Promise<void> {
  const over = change.state === 'done' || change.state === 'failed';
  await db
    .update(dryRuns)
    .set({ ...change, ...(over && { endedAt: sql`now()` }), ...(change.state === 'waiting' && { startedAt: null }) })
    .where(and(eq(dryRuns.id, id), eq(dryRuns.state, 'running')));
}
