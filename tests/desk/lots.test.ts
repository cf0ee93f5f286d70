import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import type { Actor } from '@/lib/access/actor';
import { changeLot } from '@/server/operations/lots/change-lot';
import { checkLotSerials } from '@/server/operations/lots/check-lot-serials';
import { createLot } from '@/server/operations/lots/create-lot';
import { hashSecret } from '@/server/auth/secret-hash';
import { holdLot, releaseLot } from '@/server/operations/lots/hold-lot';
import { listLotsForDesk } from '@/server/operations/lots/list-lots';
import { readLotPage } from '@/server/operations/lots/read-lot-page';
import { recordComponentBatch } from '@/server/operations/lots/record-component-batch';
import { and, asc, eq } from 'drizzle-orm';
import { insertAccount, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf, insertReleasedSequence } from './bases';
import { insertRun } from './runs';

const password = 'a password of quality';
let open: TemporaryDatabase;
let actor: Actor;
let basis: Awaited<ReturnType<typeof insertReleasedSequence>>;
beforeAll(async () => {
  open = await temporaryDatabase();
  const account = await insertAccount(open.db, ['quality-manager']);
  const passwordHash = await hashSecret(password);
  await open.db.update(accounts).set({ passwordHash }).where(eq(accounts.id, account.id));
  actor = actorOf(account);
  basis = await insertReleasedSequence(open.db);
});
afterAll(() => open.close());

let next = 0;
async function makeLot(quantity: number) {
  const code = `L-${++next}`;
  const made = await createLot(actor, {
    code,
    sequenceRevisionId: basis.sequenceRevision.id,
    serials: { kind: 'counted', firstSerial: `CB1210${String(next).padStart(4, '0')}00001`, quantity },
  });
  expect(made).toMatchObject({ ok: true });
  return (await readLotPage(code))!;
}
const unitsOf = (lotId: string) =>
  open.db.select().from(units).where(eq(units.lotId, lotId)).orderBy(asc(units.position));
const trailOf = (lotId: string) =>
  open.db
    .select()
    .from(trail)
    .where(and(eq(trail.entity, 'lot'), eq(trail.entityId, lotId)))
    .orderBy(asc(trail.id));

describe('making a lot', () => {
  it('stores its boards in order and names who made it in the trail', async () => {
    const lot = await makeLot(3);
    expect((await unitsOf(lot.id)).map((unit) => unit.serial.slice(-5))).toEqual(['00001', '00002', '00003']);
    expect(lot).toMatchObject({ state: 'open', boardTypeCode: 'CB1210', sequenceNumber: 6, hold: null });
    expect(lot.summary).toMatchObject({ size: 3, tested: 0, firstPassYield: null, marks: '...' });
    expect(await trailOf(lot.id)).toMatchObject([{ action: 'lot.created', accountId: actor.accountId }]);
  });

  it('from a file with bad rows is refused as a whole, and shows each row with its reason', async () => {
    const serials = {
      kind: 'listed' as const,
      text: 'serial\nCB1210700000001\nX\nCB1210700000001',
      leaveOutBad: false,
    };
    const input = { sequenceRevisionId: basis.sequenceRevision.id, serials };
    expect(await checkLotSerials(input)).toEqual({
      ok: true,
      value: [
        { line: 2, serial: 'CB1210700000001', problem: null },
        { line: 3, serial: 'X', problem: 'Not a serial number of CB1210.' },
        { line: 4, serial: 'CB1210700000001', problem: 'The same as on line 2.' },
      ],
    });
    expect(await createLot(actor, { code: 'BAD', ...input })).toMatchObject({ ok: false, code: 'serials-bad' });
    expect(await readLotPage('BAD')).toBeNull();
    const leftOut = await createLot(actor, { code: 'GOOD', ...input, serials: { ...serials, leaveOutBad: true } });
    expect(leftOut).toEqual({ ok: true, value: { code: 'GOOD', size: 1 } });
  });

  it('says that a serial is in another lot already', async () => {
    const lot = await makeLot(1);
    const [unit] = await unitsOf(lot.id);
    const serials = { kind: 'listed' as const, text: unit!.serial, leaveOutBad: false };
    const checked = await checkLotSerials({ sequenceRevisionId: basis.sequenceRevision.id, serials });
    expect(checked).toMatchObject({ value: [{ problem: `Already in lot ${lot.code}.` }] });
  });

  it('is refused for a number that exists, beside the field', async () => {
    const lot = await makeLot(1);
    const again = await createLot(actor, {
      code: lot.code,
      sequenceRevisionId: basis.sequenceRevision.id,
      serials: { kind: 'counted', firstSerial: 'CB1210800000001', quantity: 1 },
    });
    expect(again).toMatchObject({ ok: false, code: 'lot-exists', field: 'code' });
  });

  it('is refused from a sequence that is not released', async () => {
    const draft = await insertReleasedSequence(open.db, { status: 'draft' });
    const made = await createLot(actor, {
      code: 'DRAFT',
      sequenceRevisionId: draft.sequenceRevision.id,
      serials: { kind: 'counted', firstSerial: 'CB1210900000001', quantity: 1 },
    });
    expect(made).toMatchObject({ ok: false, code: 'sequence-not-released' });
  });
});

describe('a lot', () => {
  it('is paused, opened, closed and opened again, each in the trail', async () => {
    const lot = await makeLot(1);
    for (const change of ['pause', 'open', 'close', 'open'] as const)
      expect(await changeLot(actor, lot.id, change)).toMatchObject({ ok: true });
    expect(await changeLot(actor, lot.id, 'open')).toMatchObject({ ok: false, code: 'lot-unchanged' });
    expect((await trailOf(lot.id)).map((entry) => entry.action)).toEqual([
      'lot.created',
      'lot.paused',
      'lot.opened',
      'lot.closed',
      'lot.opened',
    ]);
  });

  it('is held and released with reasons, once each', async () => {
    const lot = await makeLot(1);
    expect(await holdLot(actor, lot.id, 'Trip points drift')).toMatchObject({ ok: true });
    expect(await holdLot(actor, lot.id, 'again')).toMatchObject({ ok: false, code: 'lot-held' });
    expect((await readLotPage(lot.code))!.hold).toMatchObject({ reason: 'Trip points drift', byName: actor.name });
    expect(await releaseLot(actor, { lotId: lot.id, reason: 'Meter was off', password })).toMatchObject({ ok: true });
    expect(await releaseLot(actor, { lotId: lot.id, reason: 'again', password })).toMatchObject({
      ok: false,
      code: 'lot-not-held',
    });
    expect((await readLotPage(lot.code))!.hold).toBeNull();
  });

  it('keeps every batch of a component, with who and where', async () => {
    const lot = await makeLot(1);
    const station = await insertStation(open.db);
    const input = { lotId: lot.id, component: 'D1 reference', batch: 'A1' };
    expect(await recordComponentBatch(actor, input)).toMatchObject({ ok: true });
    await recordComponentBatch({ ...actor, stationId: station.id }, { ...input, batch: 'B7' });
    expect((await readLotPage(lot.code))!.components).toMatchObject([
      { component: 'D1 reference', batch: 'A1', stationCode: null },
      { component: 'D1 reference', batch: 'B7', stationCode: station.code },
    ]);
    await changeLot(actor, lot.id, 'close');
    expect(await recordComponentBatch(actor, input)).toMatchObject({ ok: false, code: 'lot-closed' });
  });

  it('counts by first and last verdict, the same on its page and in the list', async () => {
    const lot = await makeLot(4);
    const boards = await unitsOf(lot.id);
    const station = await insertStation(open.db);
    const common = { stationId: station.id, operatorId: actor.accountId };
    await insertRun(open.db, { ...common, unit: boards[0]!, attempt: 1, minute: 0, ending: { verdict: 'pass' } });
    const reject = { verdict: 'reject', reason: 'release-too-high' } as const;
    await insertRun(open.db, {
      ...common,
      unit: boards[1]!,
      attempt: 1,
      minute: 1,
      ending: reject,
      releaseVolts: 12.71,
    });
    await insertRun(open.db, { ...common, unit: boards[1]!, attempt: 2, minute: 2, ending: { verdict: 'pass' } });
    await insertRun(open.db, { ...common, unit: boards[2]!, attempt: 1, minute: 3, ending: reject });
    const stopped = { verdict: 'no-verdict', reason: 'operator-stop' } as const;
    await insertRun(open.db, { ...common, unit: boards[3]!, attempt: 1, minute: 4, ending: stopped });

    const page = (await readLotPage(lot.code))!;
    expect(page.summary).toMatchObject({
      tested: 3,
      passedFirst: 1,
      passedLater: 1,
      rejected: 1,
      undecided: 1,
      marks: 'PWRN',
    });
    expect(page.boards.map((board) => [board.standing, board.verdict, board.runs])).toEqual([
      ['passed', 'pass', 1],
      ['passed', 'pass', 2],
      ['needs-disposition', 'reject', 1],
      ['may-be-tested', 'no-verdict', 1],
    ]);
    expect(page.boards[0]).toMatchObject({
      tripVolts: { value: 10.81, min: 10.7, max: 10.9 },
      stationCode: station.code,
    });
    expect(page).toMatchObject({ stationCodes: [station.code], firstTestIso: '2026-12-01T08:00:00.000Z' });

    const list = await listLotsForDesk({ state: 'open', stationCode: station.code, since: null });
    expect(list.rows).toMatchObject([
      { code: lot.code, tested: 3, rejected: 1, firstPassYield: 1 / 3, finalYield: 2 / 3 },
    ]);
  });
});
