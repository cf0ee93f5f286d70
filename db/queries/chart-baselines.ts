import { and, desc, eq, inArray, isNull, lte, ne, or, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { chartBaselines } from '@/db/schema/chart-baselines';
import { lots } from '@/db/schema/lots';
import type { ChartQuantity } from '@/lib/contracts/lot-review';

type Reader = Database | Transaction;

export interface StoredBaseline {
  centre: number;
  sigma: number;
  boards: number;
  frozenAt: Date;
  /** Codes; empty: the first boards of the lot itself. */
  fromLots: string[];
  /** Null: frozen by itself. */
  byName: string | null;
}

interface LotOfBaseline {
  id: string;
  boardTypeId: string;
  createdAt: Date;
}

/**
 * The baseline that a lot's chart is drawn from: the newest chosen for this lot, else the newest chosen for its board type before
 * it was made, else its own.
 */
export async function findBaseline(
  db: Reader,
  lot: LotOfBaseline,
  quantity: ChartQuantity,
): Promise<StoredBaseline | null> {
  const ofLot = eq(chartBaselines.lotId, lot.id);
  const ofType = and(
    isNull(chartBaselines.lotId),
    eq(chartBaselines.boardTypeId, lot.boardTypeId),
    lte(chartBaselines.frozenAt, lot.createdAt),
  );
  const rank = sql`case when ${chartBaselines.frozenBy} is null then 2 when ${chartBaselines.lotId} is null then 1 else 0 end`;
  const [row] = await db
    .select({ baseline: chartBaselines, byName: accounts.name })
    .from(chartBaselines)
    .leftJoin(accounts, eq(accounts.id, chartBaselines.frozenBy))
    .where(and(eq(chartBaselines.quantity, quantity), or(ofLot, ofType)))
    .orderBy(rank, desc(chartBaselines.frozenAt))
    .limit(1);
  if (!row) return null;
  const { centre, sigma, boards, frozenAt, fromLotIds } = row.baseline;
  const fromLots =
    fromLotIds.length === 0 ? [] : await db.select({ code: lots.code }).from(lots).where(inArray(lots.id, fromLotIds));
  return { centre, sigma, boards, frozenAt, fromLots: fromLots.map(({ code }) => code).sort(), byName: row.byName };
}

/** Quantities whose own baseline is frozen. */
export async function listOwnBaselines(db: Reader, lotId: string): Promise<ChartQuantity[]> {
  const rows = await db
    .select({ quantity: chartBaselines.quantity })
    .from(chartBaselines)
    .where(and(eq(chartBaselines.lotId, lotId), isNull(chartBaselines.frozenBy)));
  return rows.map((row) => row.quantity);
}

/** A lot's own baseline is frozen once; a second one is left out. */
export async function insertBaselines(
  db: Transaction | Database,
  rows: readonly (typeof chartBaselines.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0)
    await db
      .insert(chartBaselines)
      .values([...rows])
      .onConflictDoNothing();
}

export async function getLotBoardType(db: Reader, lotId: string): Promise<LotOfBaseline & { code: string }> {
  const [row] = await db
    .select({
      id: lots.id,
      code: lots.code,
      createdAt: lots.createdAt,
      boardTypeId: boardTypeRevisions.boardTypeId,
    })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(eq(lots.id, lotId));
  if (!row) throw new Error(`no lot ${lotId}`);
  return row;
}

/** Lots of the same board type that were made before, the newest first; at most twelve. */
export function listEarlierLots(db: Reader, lot: LotOfBaseline): Promise<{ id: string; code: string }[]> {
  return db
    .select({ id: lots.id, code: lots.code })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(
      and(eq(boardTypeRevisions.boardTypeId, lot.boardTypeId), ne(lots.id, lot.id), lte(lots.createdAt, lot.createdAt)),
    )
    .orderBy(desc(lots.createdAt))
    .limit(12);
}
