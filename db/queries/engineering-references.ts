import { asc, desc, eq, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypes } from '@/db/schema/board-types';
import { commissionings } from '@/db/schema/commissionings';
import { dailyChecks } from '@/db/schema/daily-checks';
import { referenceBoards } from '@/db/schema/reference-boards';
import { trainings } from '@/db/schema/trainings';

type Reader = Database | Transaction;

export function listReferenceBoards(db: Reader) {
  return db
    .select({
      id: referenceBoards.id,
      code: referenceBoards.code,
      boardTypeCode: boardTypes.code,
      tripVolts: referenceBoards.tripVolts,
      releaseVolts: referenceBoards.releaseVolts,
      toleranceVolts: referenceBoards.toleranceVolts,
      retiredAt: referenceBoards.retiredAt,
    })
    .from(referenceBoards)
    .innerJoin(boardTypes, eq(boardTypes.id, referenceBoards.boardTypeId))
    .orderBy(sql`${referenceBoards.retiredAt} is not null`, asc(referenceBoards.code));
}

export async function insertReferenceBoard(
  tx: Transaction,
  row: typeof referenceBoards.$inferInsert,
): Promise<{ id: string }> {
  const [made] = await tx.insert(referenceBoards).values(row).returning({ id: referenceBoards.id });
  return made!;
}

export async function findReferenceBoardForUpdate(tx: Transaction, id: string) {
  const [row] = await tx.select().from(referenceBoards).where(eq(referenceBoards.id, id)).for('update');
  return row ?? null;
}

export async function updateReferenceBoard(
  tx: Transaction,
  id: string,
  change: Partial<typeof referenceBoards.$inferInsert>,
): Promise<void> {
  await tx.update(referenceBoards).set(change).where(eq(referenceBoards.id, id));
}

/** Checks of a station, newest first. */
export function listDailyChecks(db: Reader, stationId: string, most: number) {
  return db
    .select({
      id: dailyChecks.id,
      at: dailyChecks.at,
      validHours: dailyChecks.validHours,
      passed: dailyChecks.passed,
      tripVolts: dailyChecks.tripVolts,
      releaseVolts: dailyChecks.releaseVolts,
      runId: dailyChecks.runId,
      referenceCode: referenceBoards.code,
      knownTripVolts: referenceBoards.tripVolts,
      knownReleaseVolts: referenceBoards.releaseVolts,
      toleranceVolts: referenceBoards.toleranceVolts,
      byName: accounts.name,
    })
    .from(dailyChecks)
    .innerJoin(referenceBoards, eq(referenceBoards.id, dailyChecks.referenceBoardId))
    .innerJoin(accounts, eq(accounts.id, dailyChecks.byAccountId))
    .where(eq(dailyChecks.stationId, stationId))
    .orderBy(desc(dailyChecks.at))
    .limit(most);
}

/** Commissionings of a station, newest first. */
export function listCommissionings(db: Reader, stationId: string, most: number) {
  return db
    .select({
      id: commissionings.id,
      at: commissionings.at,
      validUntil: commissionings.validUntil,
      overshoot: commissionings.overshoot,
      settleMs: commissionings.settleMs,
      waypointMs: commissionings.waypointMs,
      noiseVolts: commissionings.noiseVolts,
      referenceCode: referenceBoards.code,
      byName: accounts.name,
    })
    .from(commissionings)
    .innerJoin(referenceBoards, eq(referenceBoards.id, commissionings.referenceBoardId))
    .innerJoin(accounts, eq(accounts.id, commissionings.byAccountId))
    .where(eq(commissionings.stationId, stationId))
    .orderBy(desc(commissionings.at))
    .limit(most);
}

export function listBoardTypes(db: Reader) {
  return db
    .select({ id: boardTypes.id, code: boardTypes.code, name: boardTypes.name })
    .from(boardTypes)
    .orderBy(asc(boardTypes.code));
}

/** Everyone who has a role at a bench, and the latest day of each training. */
export async function listTrainings(db: Reader) {
  const [people, latest] = await Promise.all([
    db
      .select({ id: accounts.id, name: accounts.name, operatorNumber: accounts.operatorNumber })
      .from(accounts)
      .where(sql`${accounts.disabledAt} is null and 'operator' = any(${accounts.roles})`)
      .orderBy(asc(accounts.name)),
    db
      .select({
        accountId: trainings.accountId,
        boardTypeId: trainings.boardTypeId,
        validUntil: sql<string>`max(${trainings.validUntil})`,
      })
      .from(trainings)
      .groupBy(trainings.accountId, trainings.boardTypeId),
  ]);
  return { people, latest: latest.map((row) => ({ ...row, validUntil: new Date(row.validUntil) })) };
}

export async function insertTraining(tx: Transaction, row: typeof trainings.$inferInsert): Promise<{ id: string }> {
  const [made] = await tx.insert(trainings).values(row).returning({ id: trainings.id });
  return made!;
}
