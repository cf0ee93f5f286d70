import { and, asc, desc, eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { dispositions } from '@/db/schema/dispositions';
import { measurements } from '@/db/schema/measurements';
import { signatures } from '@/db/schema/signatures';
import type { RejectFilter } from '@/lib/contracts/reject-list';
import { mostRunsWithoutVerdict } from '@/lib/decision/board-standing';
import type { RejectReason } from '@/lib/run/types';

export interface WaitingBoard {
  unitId: string;
  runId: string;
  serial: string;
  boardTypeCode: string;
  lotCode: string;
  lotHeld: boolean;
  rejectReason: RejectReason | null;
  attempt: number;
  stationCode: string;
  endedAt: Date;
}

/** Runs after `attempt` that make a board wait for quality: one that was failing when stopped, or three without a verdict. */
const asksQuality = (attempt: SQL) => sql`(
  select coalesce(bool_or(w.failing_when_stopped), false) or count(*) >= ${mostRunsWithoutVerdict} from runs w
  where w.unit_id = n.unit_id and w.kind = 'production' and w.attempt > ${attempt})`;

/**
 * Every board that `boardStanding` says needs a disposition or waits for quality, as one row `n` of its newest run; a property
 * checks that both say the same. `offset 0` keeps the planner from joining a million later runs before the few rejects are sifted.
 */
const waiting = sql`
  (select r.id, r.unit_id, r.lot_id, r.station_id, r.attempt, r.verdict, r.reject_reason, r.ended_at from runs r
   where r.kind = 'production' and r.verdict in ('reject', 'no-verdict') and r.attempt = (
     select max(newest.attempt) from runs newest where newest.unit_id = r.unit_id and newest.kind = 'production')
   offset 0) n
  join units u on u.id = n.unit_id
  join lots l on l.id = n.lot_id
  join board_type_revisions br on br.id = l.board_type_revision_id
  join board_types b on b.id = br.board_type_id
  join stations s on s.id = n.station_id
  left join lateral (
    select v.attempt, v.verdict from runs v
    where v.unit_id = n.unit_id and v.kind = 'production' and v.verdict in ('pass', 'reject')
    order by v.attempt desc limit 1) verdict on true
  left join lateral (
    select d.kind, r.attempt from dispositions d join runs r on r.id = d.run_id
    where d.unit_id = n.unit_id and r.attempt >= coalesce(verdict.attempt, 0)
      and (d.kind <> 'concession' or d.second_signed_at is not null)
    order by d.signed_at desc limit 1) decided on true
  left join lateral (
    select o.id, used.attempt - 1 as before from retest_orders o left join runs used on used.id = o.used_by_run_id
    where o.unit_id = n.unit_id
      and (o.used_by_run_id is null or (used.verdict = 'no-verdict' and not used.failing_when_stopped))
    order by o.signed_at limit 1) retest on true
  where u.scrapped_at is null
    and (decided.kind is null or decided.kind = 'rework')
    and (retest.id is null
      or (retest.before is not null and ${asksQuality(sql`greatest(verdict.attempt, retest.before)`)}))
    and ((decided.kind is null and verdict.verdict = 'reject')
      or ${asksQuality(sql`greatest(coalesce(verdict.attempt, 0), coalesce(decided.attempt, 0))`)})`;

const sorts: Record<RejectFilter['sort'], SQL> = {
  ended: sql`n.ended_at`,
  serial: sql`u.serial`,
  lot: sql`l.code`,
  reason: sql`n.reject_reason`,
  station: sql`s.code`,
};

const waitsFor: Record<RejectFilter['waits'], SQL> = {
  all: sql``,
  decision: sql`and n.verdict = 'reject'`,
  stopped: sql`and n.verdict = 'no-verdict'`,
  second: sql`and exists (
    select from dispositions p where p.run_id = n.id and p.kind = 'concession' and p.second_signed_at is null)`,
};

/** One page of the boards that wait for a decision, and how many there are on all. */
export async function listWaitingBoards(
  db: Database,
  filter: RejectFilter,
  perPage: number,
): Promise<{ boards: WaitingBoard[]; total: number }> {
  const { type, lot, reason, station } = filter;
  const order = filter.order === 'rising' ? sql`asc nulls last` : sql`desc nulls last`;
  const { rows } = await db.execute<Record<string, string>>(sql`
    select n.unit_id, n.id, u.serial, b.code as type, l.code as lot, l.held_at is not null as held, n.reject_reason,
      n.attempt, s.code as station, n.ended_at, count(*) over () as total
    from ${waiting} ${waitsFor[filter.waits]}
      ${type ? sql`and b.code = ${type}` : sql``}
      ${lot ? sql`and l.code = ${lot.toUpperCase()}` : sql``}
      ${reason ? sql`and n.reject_reason = ${reason}` : sql``}
      ${station ? sql`and s.code = ${station}` : sql``}
    order by ${sorts[filter.sort]} ${order}, u.serial
    limit ${perPage} offset ${(filter.page - 1) * perPage}`);
  const boards = rows.map((row) => ({
    unitId: row.unit_id!,
    runId: row.id!,
    serial: row.serial!,
    boardTypeCode: row.type!,
    lotCode: row.lot!,
    lotHeld: Boolean(row.held),
    rejectReason: row.reject_reason as RejectReason | null,
    attempt: Number(row.attempt),
    stationCode: row.station!,
    endedAt: new Date(row.ended_at!),
  }));
  return { boards, total: Number(rows[0]?.total ?? 0) };
}

/** What these runs measured outside its limits, newest step first. */
export async function listFailedMeasurements(db: Database, runIds: readonly string[]) {
  if (runIds.length === 0) return [];
  return db
    .select({
      runId: measurements.runId,
      quantity: measurements.quantity,
      value: measurements.value,
      min: measurements.min,
      max: measurements.max,
    })
    .from(measurements)
    .where(and(inArray(measurements.runId, [...runIds]), eq(measurements.passed, false)))
    .orderBy(desc(measurements.stepIndex), asc(measurements.n));
}

/** Concessions after these runs that lack their second signature, with the first one. */
export async function listWaitingConcessions(db: Database, runIds: readonly string[]) {
  if (runIds.length === 0) return [];
  return db
    .select({ runId: dispositions.runId, byName: signatures.name, content: signatures.content })
    .from(dispositions)
    .innerJoin(signatures, eq(signatures.id, dispositions.signatureId))
    .where(
      and(
        inArray(dispositions.runId, [...runIds]),
        eq(dispositions.kind, 'concession'),
        sql`${dispositions.secondSignedAt} is null`,
      ),
    );
}
