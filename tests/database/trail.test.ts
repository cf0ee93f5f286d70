import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { insertTrail } from '@/db/queries/trail';
import { listChainHeads } from '@/db/queries/trail-chain';
import { verifyTrail } from '@/server/operations/trail/verify-trail';
import { writeCheckpoints } from '@/server/operations/trail/write-checkpoints';
import { insertStation } from './records';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

let open: TemporaryDatabase;
let stationId: string;

const desk = (n: number) => ({
  action: 'lot.held',
  entity: 'lot',
  entityId: `lot-${n}`,
  before: { held: false, volts: 10.7 + n / 7 },
  after: { held: true, words: 'Zenerdiode größer' },
  reason: n % 2 === 0 ? null : `reason ${n}`,
});

/** As whoever owns the tables could do, past every trigger. */
async function asOwner(statement: ReturnType<typeof sql>): Promise<void> {
  await open.db.execute(sql`alter table trail disable trigger user`);
  await open.db.execute(statement);
  await open.db.execute(sql`alter table trail enable trigger user`);
}

async function firstBreak() {
  const { breaks } = await verifyTrail(open.db);
  return breaks[0] ?? null;
}

beforeAll(async () => {
  open = await temporaryDatabase();
  stationId = (await insertStation(open.db)).id;
});
afterAll(() => open.close());
beforeEach(async () => {
  await open.db.execute(sql`alter table trail disable trigger user`);
  await open.db.execute(sql`truncate trail, trail_checkpoints restart identity`);
  await open.db.execute(sql`alter table trail enable trigger user`);
  for (let n = 1; n <= 6; n++) await insertTrail(open.db, null, desk(n));
  for (let n = 1; n <= 3; n++) await insertTrail(open.db, { accountId: null, stationId }, desk(n));
});

describe('the chain of the trail', () => {
  test('is whole as it was written, one chain a station and one for the desk', async () => {
    const report = await verifyTrail(open.db);
    expect(report.breaks).toEqual([]);
    expect(report.entries).toBe(9);
    expect(report.chains.map(({ entries }) => entries).sort()).toEqual([3, 6]);
  });

  test('stays whole when many connections write at once, several entries to a transaction', async () => {
    await Promise.all(
      Array.from({ length: 24 }, (_, n) =>
        open.db.transaction(async (tx) => {
          await insertTrail(tx, null, desk(n));
          await insertTrail(tx, { accountId: null, stationId }, desk(n));
          await insertTrail(tx, null, desk(n + 100));
        }),
      ),
    );
    const report = await verifyTrail(open.db);
    expect(report.breaks).toEqual([]);
    expect(report.entries).toBe(9 + 72);
  });

  test('takes no entry of a transaction that was rolled back', async () => {
    const failing = open.db.transaction(async (tx) => {
      await insertTrail(tx, null, desk(7));
      throw new Error('given up');
    });
    await expect(failing).rejects.toThrow('given up');
    await insertTrail(open.db, null, desk(8));
    expect(await firstBreak()).toBeNull();
    expect((await listChainHeads(open.db)).find(({ chain }) => chain === 'desk')!.place).toBe(7);
  });

  test('cannot be changed, not even its seal', async () => {
    for (const statement of [`update trail set seal = 'x'`, `update trail set reason = 'x'`, `delete from trail`])
      await expect(open.pool.query(statement)).rejects.toMatchObject({ code: 'SW002' });
  });

  test.each([
    ['an altered value', sql`update trail set after = '{"held": false}' where chain = 'desk' and place = 3`, 3],
    ['an altered time', sql`update trail set at = at - interval '1 hour' where chain = 'desk' and place = 3`, 3],
    ['an altered reason', sql`update trail set reason = null where chain = 'desk' and place = 3`, 3],
    [
      'an entry moved to another thing',
      sql`update trail set entity_id = 'lot-9' where chain = 'desk' and place = 1`,
      1,
    ],
    ['a removed entry', sql`delete from trail where chain = 'desk' and place = 4`, 5],
    [
      'a removed entry whose place was closed up',
      sql`with gone as (delete from trail where chain = 'desk' and place = 4 returning id) update trail set place = place - 1 where chain = 'desk' and place > 4 and exists (select from gone)`,
      4,
    ],
  ])('shows %s', async (_, tampering, place) => {
    await asOwner(tampering);
    expect(await firstBreak()).toMatchObject({ chain: 'desk', place });
  });

  test('shows entries that changed places', async () => {
    await asOwner(sql`update trail set place = -place where chain = 'desk' and place in (2, 3)`);
    await asOwner(
      sql`update trail set place = case place when -2 then 3 else 2 end where chain = 'desk' and place < 0`,
    );
    expect(await firstBreak()).toMatchObject({ chain: 'desk', place: 2 });
  });

  test('shows a chain that was cut off, by the head that was kept', async () => {
    await writeCheckpoints(open.db, null);
    await asOwner(sql`delete from trail where chain = 'desk' and place > 4`);
    expect(await firstBreak()).toMatchObject({ chain: 'desk', place: 4 });
    expect((await firstBreak())!.sentence).toContain('entry 6');
  });

  test('shows a chain that was written anew, by a head kept outside the database', async () => {
    const known = (await writeCheckpoints(open.db, null)).map((head) => ({ ...head, from: 'object storage' }));
    await asOwner(sql`truncate trail, trail_checkpoints restart identity`);
    for (let n = 1; n <= 6; n++) await insertTrail(open.db, null, desk(n + 1));
    expect(await firstBreak()).toBeNull();
    const { breaks } = await verifyTrail(open.db, { known: known.filter(({ chain }) => chain === 'desk') });
    expect(breaks[0]).toMatchObject({ chain: 'desk', place: 6 });
  });

  test('shows an entry that was never sealed', async () => {
    await asOwner(sql`insert into trail (action, entity, entity_id) values ('a', 'b', 'c')`);
    expect((await firstBreak())?.sentence).toBe('1 entries were written without a seal.');
  });
});
