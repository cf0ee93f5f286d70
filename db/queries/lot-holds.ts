import { and, desc, eq, gt, inArray, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { holdRuleSets } from '@/db/schema/hold-rule-sets';
import { lotHolds } from '@/db/schema/lot-holds';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { signatures } from '@/db/schema/signatures';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import type { HoldRuleSet } from '@/lib/contracts/lot-hold';
import type { HoldBoard } from '@/lib/quality/hold-cause';

type Reader = Database | Transaction;

/** The newest rules of a board type with who set them; null while nobody has. */
export async function findRuleSet(
  db: Reader,
  boardTypeId: string,
): Promise<{ rules: HoldRuleSet; reason: string; setBy: string; setAt: Date } | null> {
  const [row] = await db
    .select({
      rules: holdRuleSets.rules,
      reason: holdRuleSets.reason,
      setBy: accounts.name,
      setAt: holdRuleSets.setAt,
    })
    .from(holdRuleSets)
    .innerJoin(accounts, eq(accounts.id, holdRuleSets.setBy))
    .where(eq(holdRuleSets.boardTypeId, boardTypeId))
    .orderBy(desc(holdRuleSets.setAt))
    .limit(1);
  return row ?? null;
}

/** Every change of a board type's rules, newest first. */
export function listRuleSets(db: Reader, boardTypeId: string) {
  return db
    .select({
      rules: holdRuleSets.rules,
      reason: holdRuleSets.reason,
      setBy: accounts.name,
      setAt: holdRuleSets.setAt,
    })
    .from(holdRuleSets)
    .innerJoin(accounts, eq(accounts.id, holdRuleSets.setBy))
    .where(eq(holdRuleSets.boardTypeId, boardTypeId))
    .orderBy(desc(holdRuleSets.setAt));
}

export async function insertRuleSet(tx: Transaction, values: typeof holdRuleSets.$inferInsert): Promise<void> {
  await tx.insert(holdRuleSets).values(values);
}

/** When the board at this place in test order, from 1, got its first verdict; null: none did yet. */
export async function findFirstVerdictAt(db: Reader, lotId: string, place: number): Promise<Date | null> {
  const { rows } = await db.execute<{ at: string }>(sql`
    select ended_at as at from (
      select distinct on (unit_id) ended_at from runs
      where lot_id = ${lotId} and kind = 'production' and verdict in ('pass', 'reject')
      order by unit_id, attempt) firsts
    order by ended_at offset ${place - 1} limit 1`);
  return rows[0] ? new Date(rows[0].at) : null;
}

/** Stations that passed boards of the lot. */
export async function listPassingStations(db: Reader, lotId: string): Promise<{ id: string; code: string }[]> {
  return db
    .selectDistinct({ id: stations.id, code: stations.code })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(and(eq(runs.lotId, lotId), eq(runs.kind, 'production'), eq(runs.verdict, 'pass')))
    .orderBy(stations.code);
}

/** When the lot's last hold was released; null: it never was on hold, or still is on its first. */
export async function findLastRelease(db: Reader, lotId: string): Promise<Date | null> {
  const [row] = await db
    .select({ at: sql<string | null>`max(${lotHolds.releasedAt})` })
    .from(lotHolds)
    .where(eq(lotHolds.lotId, lotId));
  return row?.at ? new Date(row.at) : null;
}

/** First attempts with a verdict that ended after `since`, in test order; places count from the lot's first board. */
export async function listHoldBoards(db: Reader, lotId: string, since: Date | null): Promise<HoldBoard[]> {
  const firsts = db
    .selectDistinctOn([runs.unitId], {
      id: runs.id,
      stationId: runs.stationId,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      endedAt: runs.endedAt,
    })
    .from(runs)
    .where(and(eq(runs.lotId, lotId), eq(runs.kind, 'production'), inArray(runs.verdict, ['pass', 'reject'])))
    .orderBy(runs.unitId, runs.attempt)
    .as('firsts');
  const trip = sql<number | null>`(select ${measurements.value} from ${measurements}
    where ${measurements.runId} = ${firsts.id} and ${measurements.quantity} = 'trip-volts'
      and ${measurements.phase} = 'verified' order by ${measurements.n} desc limit 1)`;
  const rows = await db
    .select({
      verdict: firsts.verdict,
      rejectReason: firsts.rejectReason,
      endedAt: firsts.endedAt,
      stationCode: stations.code,
      tripVolts: trip,
    })
    .from(firsts)
    .innerJoin(stations, eq(stations.id, firsts.stationId))
    .orderBy(firsts.endedAt);
  return rows
    .map(({ endedAt, verdict, ...row }, i) => ({
      ...row,
      verdict: verdict as 'pass' | 'reject',
      place: i + 1,
      endedAt: endedAt!,
    }))
    .filter(({ endedAt }) => since === null || endedAt > since)
    .map(({ endedAt: _endedAt, ...board }) => board);
}

export async function insertHold(tx: Transaction, values: typeof lotHolds.$inferInsert): Promise<{ id: string }> {
  const [row] = await tx.insert(lotHolds).values(values).returning({ id: lotHolds.id });
  return row!;
}

export async function findOpenHold(db: Reader, lotId: string): Promise<typeof lotHolds.$inferSelect | null> {
  const [row] = await db
    .select()
    .from(lotHolds)
    .where(and(eq(lotHolds.lotId, lotId), isNull(lotHolds.releasedAt)))
    .orderBy(desc(lotHolds.raisedAt))
    .limit(1);
  return row ?? null;
}

export async function closeHold(
  tx: Transaction,
  holdId: string,
  release: { releasedAt: Date; releasedBy: string; releaseReason: string; signatureId: string },
): Promise<void> {
  await tx.update(lotHolds).set(release).where(eq(lotHolds.id, holdId));
}

/** Every hold of a lot with the signature of its release, newest first. */
export function listHolds(db: Reader, lotId: string) {
  return db
    .select({ hold: lotHolds, raisedByName: accounts.name, signature: signatures })
    .from(lotHolds)
    .leftJoin(accounts, eq(accounts.id, lotHolds.raisedBy))
    .leftJoin(signatures, eq(signatures.id, lotHolds.signatureId))
    .where(eq(lotHolds.lotId, lotId))
    .orderBy(desc(lotHolds.raisedAt));
}

/** Boards of a lot that passed at a station after a moment, in test order. */
export async function listPassedSince(
  db: Reader,
  of: { lotId: string; stationId: string | null },
  since: Date,
): Promise<{ serial: string; endedAt: Date; stationCode: string }[]> {
  const rows = await db
    .select({ serial: units.serial, endedAt: runs.endedAt, stationCode: stations.code })
    .from(runs)
    .innerJoin(units, eq(units.id, runs.unitId))
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(
      and(
        eq(runs.lotId, of.lotId),
        eq(runs.kind, 'production'),
        eq(runs.verdict, 'pass'),
        gt(runs.endedAt, since),
        of.stationId ? eq(runs.stationId, of.stationId) : undefined,
      ),
    )
    .orderBy(runs.endedAt);
  return rows.map((row) => ({ ...row, endedAt: row.endedAt! }));
}

/** Lots, open or paused, of which a station passed boards after a moment. */
export async function listLotsPassedAt(
  db: Reader,
  stationId: string,
  since: Date,
): Promise<{ lotId: string; boardTypeId: string; boards: number }[]> {
  const { rows } = await db.execute<{ lot_id: string; board_type_id: string; boards: string }>(sql`
    select r.lot_id, b.board_type_id, count(*) as boards
    from runs r join lots l on l.id = r.lot_id join board_type_revisions b on b.id = l.board_type_revision_id
    where r.station_id = ${stationId} and r.kind = 'production' and r.verdict = 'pass' and r.ended_at > ${since}
      and l.state <> 'closed'
    group by r.lot_id, b.board_type_id`);
  return rows.map((row) => ({ lotId: row.lot_id, boardTypeId: row.board_type_id, boards: Number(row.boards) }));
}

/** Suspect from here on: the newest good daily check of each station before a moment. Null: none is on record. */
export async function findLastGoodCheck(db: Reader, stationId: string, before: Date): Promise<Date | null> {
  const { rows } = await db.execute<{ at: Date | string | null }>(sql`
    select max(at) as at from daily_checks where station_id = ${stationId} and passed and at < ${before}`);
  return rows[0]?.at ? new Date(rows[0].at) : null;
}

export async function getStationCode(db: Reader, stationId: string): Promise<string> {
  const [row] = await db.select({ code: stations.code }).from(stations).where(eq(stations.id, stationId));
  if (!row) throw new Error(`no station ${stationId}`);
  return row.code;
}
