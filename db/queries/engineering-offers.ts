import { and, asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { engineeringOffers } from '@/db/schema/engineering-offers';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { stations } from '@/db/schema/stations';

type Reader = Database | Transaction;

export type OpenOffer = Awaited<ReturnType<typeof listOpenOffers>>[number];

/** Every offer that a bench may take, with what it offers. One a station. */
export function listOpenOffers(db: Reader) {
  return openOffers(db).where(isNull(engineeringOffers.endedAt));
}

export async function findOpenOffer(db: Reader, stationId: string): Promise<OpenOffer | null> {
  const ofStation = and(eq(engineeringOffers.stationId, stationId), isNull(engineeringOffers.endedAt));
  const [row] = await openOffers(db).where(ofStation);
  return row ?? null;
}

const openOffers = (db: Reader) =>
  db
    .select({
      id: engineeringOffers.id,
      stationId: engineeringOffers.stationId,
      boardTypeId: engineeringOffers.boardTypeId,
      boardTypeCode: boardTypes.code,
      sequence: engineeringOffers.sequence,
      boardType: engineeringOffers.boardType,
      note: engineeringOffers.note,
      offeredAt: engineeringOffers.offeredAt,
      offeredByName: accounts.name,
      revisionNumber: sequenceRevisions.number,
      sequenceName: sequences.name,
    })
    .from(engineeringOffers)
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, engineeringOffers.revisionId))
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .innerJoin(boardTypes, eq(boardTypes.id, engineeringOffers.boardTypeId))
    .innerJoin(accounts, eq(accounts.id, engineeringOffers.offeredBy))
    .$dynamic();

/** A revision with its board type and the specification a trial runs with: the newest approved, or the newest where none is. */
export async function findRevisionToOffer(tx: Transaction, revisionId: string) {
  const [row] = await tx
    .select({
      id: sequenceRevisions.id,
      number: sequenceRevisions.number,
      status: sequenceRevisions.status,
      version: sequenceRevisions.version,
      sequence: sequenceRevisions.data,
      sequenceName: sequences.name,
      boardTypeId: sequences.boardTypeId,
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

export async function insertOffer(
  tx: Transaction,
  offer: typeof engineeringOffers.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(engineeringOffers).values(offer).returning({ id: engineeringOffers.id });
  return row!;
}

/** The station of the offer, when it was still open; null when it had ended. */
export async function endOpenOffer(
  tx: Transaction,
  offerId: string,
  by: { accountId: string; at: Date },
): Promise<{ stationId: string } | null> {
  const [row] = await tx
    .update(engineeringOffers)
    .set({ endedAt: by.at, endedBy: by.accountId })
    .where(and(eq(engineeringOffers.id, offerId), isNull(engineeringOffers.endedAt)))
    .returning({ stationId: engineeringOffers.stationId });
  return row ?? null;
}

/** Ends what is still open of a revision, on every station. */
export async function endOpenOffersOf(
  tx: Transaction,
  revisionId: string,
  by: { accountId: string; at: Date },
): Promise<void> {
  await tx
    .update(engineeringOffers)
    .set({ endedAt: by.at, endedBy: by.accountId })
    .where(and(eq(engineeringOffers.revisionId, revisionId), isNull(engineeringOffers.endedAt)));
}

/** What an offer offered, ended or not. */
export async function findOfferHead(db: Reader, offerId: string) {
  const [row] = await db
    .select({
      revisionNumber: sequenceRevisions.number,
      sequenceId: sequences.id,
      sequenceName: sequences.name,
      note: engineeringOffers.note,
      offeredByName: accounts.name,
    })
    .from(engineeringOffers)
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, engineeringOffers.revisionId))
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .innerJoin(accounts, eq(accounts.id, engineeringOffers.offeredBy))
    .where(eq(engineeringOffers.id, offerId));
  return row ?? null;
}

/** Offers of a revision, newest first. */
export async function listOffersOfRevision(db: Reader, revisionId: string) {
  const rows = await db
    .select({
      id: engineeringOffers.id,
      stationCode: stations.code,
      stationName: stations.name,
      note: engineeringOffers.note,
      offeredByName: accounts.name,
      offeredAt: engineeringOffers.offeredAt,
      endedAt: engineeringOffers.endedAt,
      endedBy: engineeringOffers.endedBy,
    })
    .from(engineeringOffers)
    .innerJoin(stations, eq(stations.id, engineeringOffers.stationId))
    .innerJoin(accounts, eq(accounts.id, engineeringOffers.offeredBy))
    .where(eq(engineeringOffers.revisionId, revisionId))
    .orderBy(desc(engineeringOffers.offeredAt));
  const enders = rows.flatMap(({ endedBy }) => endedBy ?? []);
  const names = enders.length
    ? await db.select({ id: accounts.id, name: accounts.name }).from(accounts).where(inArray(accounts.id, enders))
    : [];
  return rows.map(({ endedBy, ...row }) => ({
    ...row,
    endedByName: names.find(({ id }) => id === endedBy)?.name ?? null,
  }));
}

/** Engineering runs of these offers, newest first. `serial` is as planned: the board may belong to no lot. */
export function listRunsOfOffers(db: Reader, offerIds: readonly string[]) {
  if (offerIds.length === 0) return Promise.resolve([]);
  return db
    .select({
      id: runs.id,
      offerId: runs.offerId,
      serial: sql<string>`${runs.plan} ->> 'serial'`,
      attempt: runs.attempt,
      startedAt: runs.startedAt,
      operatorName: accounts.name,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      noVerdictReason: runs.noVerdictReason,
      seconds: runs.seconds,
    })
    .from(runs)
    .innerJoin(accounts, eq(accounts.id, runs.operatorId))
    .where(inArray(runs.offerId, [...offerIds]))
    .orderBy(desc(runs.startedAt));
}

/** The points that each run measured last. Volts. */
export async function listLastPoints(db: Reader, runIds: readonly string[]): Promise<Map<string, Map<string, number>>> {
  const points = new Map<string, Map<string, number>>();
  if (runIds.length === 0) return points;
  const rows = await db
    .select({ runId: measurements.runId, quantity: measurements.quantity, value: measurements.value })
    .from(measurements)
    .where(
      and(
        inArray(measurements.runId, [...runIds]),
        inArray(measurements.quantity, ['trip-volts', 'release-volts', 'hysteresis-volts']),
      ),
    )
    .orderBy(asc(measurements.n));
  for (const { runId, quantity, value } of rows)
    points.set(runId, (points.get(runId) ?? new Map<string, number>()).set(quantity, value));
  return points;
}
