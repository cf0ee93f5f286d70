import { sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import type { ChartQuantity } from '@/lib/contracts/lot-review';

/** How a stored quantity is read from a run `r`; those measured from its verified measurements. */
const readings: Record<ChartQuantity, ReturnType<typeof sql>> = {
  'trip-volts': measured('trip-volts'),
  'release-volts': measured('release-volts'),
  'hysteresis-volts': measured('hysteresis-volts'),
  turns: sql`case when exists (select from measurements f where f.run_id = r.id and f.quantity = 'trip-volts'
    and f.phase = 'found') then r.turns_advised end`,
  seconds: sql`r.seconds`,
};

function measured(quantity: string) {
  return sql`(select m.value from measurements m where m.run_id = r.id and m.quantity = ${quantity}
    and m.phase = 'verified' order by m.n desc limit 1)`;
}

/** The first `most` first-attempt values of a lot, in test order, without reading the rest of it. */
export async function listFirstValues(
  db: Database | Transaction,
  lotId: string,
  quantity: ChartQuantity,
  most: number,
): Promise<number[]> {
  // The inner query is put in order first, so that values are read of as few runs as it takes.
  const { rows } = await db.execute<{ value: number }>(sql`
    select value from (
      select r.* from runs r join units u on u.id = r.unit_id
      where r.lot_id = ${lotId} and r.kind = 'production' and r.verdict in ('pass', 'reject')
        and not exists (select from runs e where e.unit_id = r.unit_id and e.kind = 'production'
          and e.verdict in ('pass', 'reject') and e.attempt < r.attempt)
      order by r.ended_at, u.position offset 0
    ) r cross join lateral (select ${readings[quantity]} as value) measured
    where value is not null limit ${most}`);
  return rows.map((row) => Number(row.value));
}

/** Whether a lot has at least `least` boards with a verdict; looks at no more runs than it must. */
export async function hasVerdicts(db: Database | Transaction, lotId: string, least: number): Promise<boolean> {
  const { rows } = await db.execute<{ enough: boolean }>(sql`
    select count(*) >= ${least} as enough from (
      select from runs where lot_id = ${lotId} and kind = 'production' and verdict in ('pass', 'reject')
      limit ${least}) boards`);
  return rows[0]?.enough ?? false;
}
