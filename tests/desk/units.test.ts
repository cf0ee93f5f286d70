import { and, asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { printers } from '@/db/schema/printers';
import type { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import type { Actor } from '@/lib/access/actor';
import { readingsAsCsv } from '@/lib/contracts/readings-csv';
import { hashSecret } from '@/server/auth/secret-hash';
import { createLot } from '@/server/operations/lots/create-lot';
import { listUnitsForDesk } from '@/server/operations/units/list-units';
import { orderRetest } from '@/server/operations/units/order-retest';
import { printLabelAgain } from '@/server/operations/units/print-label-again';
import { readUnitPage } from '@/server/operations/units/read-unit-page';
import { searchEverywhere } from '@/server/operations/units/search';
import { signDispositions } from '@/server/operations/units/sign-dispositions';
import { insertAccount, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf, insertReleasedSequence } from './bases';
import { insertRun, type RunStory } from './runs';

const password = 'a password of quality';
const lotCode = '2648-B';
let open: TemporaryDatabase;
let actor: Actor;
let station: typeof stations.$inferSelect;
let boards: (typeof units.$inferSelect)[];
let nextBoard = 0;
let minute = 0;

beforeAll(async () => {
  open = await temporaryDatabase();
  const account = await insertAccount(open.db, ['quality-manager']);
  await open.db
    .update(accounts)
    .set({ passwordHash: await hashSecret(password) })
    .where(eq(accounts.id, account.id));
  actor = actorOf(account);
  const [printer] = await open.db.insert(printers).values({ name: 'Labels', uri: 'ipp://127.0.0.1:1/' }).returning();
  station = await insertStation(open.db, { printerId: printer!.id });
  const basis = await insertReleasedSequence(open.db);
  await createLot(actor, {
    code: lotCode,
    sequenceRevisionId: basis.sequenceRevision.id,
    serials: { kind: 'counted', firstSerial: 'CB1210264800001', quantity: 20 },
  });
  boards = await open.db.select().from(units).orderBy(asc(units.position));
});
afterAll(() => open.close());

/** A board of its own with these endings, oldest first. */
async function board(...endings: RunStory['ending'][]) {
  const unit = boards[nextBoard++]!;
  const ids: string[] = [];
  for (const [i, ending] of endings.entries()) {
    const story = {
      unit,
      stationId: station.id,
      operatorId: actor.accountId,
      attempt: i + 1,
      minute: minute++,
      ending,
    };
    ids.push((await insertRun(open.db, story)).id);
  }
  return { unit, runIds: ids };
}
const pass = { verdict: 'pass' } as const;
const reject = { verdict: 'reject', reason: 'release-too-high' } as const;
const failing = { verdict: 'no-verdict', reason: 'operator-stop', failing: true } as const;

const rework = ({ unit, runIds }: Awaited<ReturnType<typeof board>>, over: object = {}) => ({
  boards: [{ unitId: unit.id, runId: runIds.at(-1)! }],
  kind: 'rework' as const,
  action: 'R14 changed',
  reasonCodeId: null,
  reason: 'Wrong reel',
  password,
  ...over,
});
const standingOf = async (serial: string) => (await readUnitPage(serial))!.standing;

describe('the page of a board', () => {
  it('shows every attempt newest first, with values, limits, uncertainty and traces', async () => {
    const { unit } = await board(reject, pass);
    const page = (await readUnitPage(unit.serial))!;
    expect(page).toMatchObject({ serial: unit.serial, lotCode, boardTypeCode: 'CB1210', standing: { kind: 'passed' } });
    expect(page.runs.map((run) => [run.attempt, run.verdict, run.stationCode])).toEqual([
      [2, 'pass', station.code],
      [1, 'reject', station.code],
    ]);
    const trip = page.runs[0]!.measurements.find((m) => m.quantity === 'trip-volts' && m.phase === 'verified');
    expect(trip).toMatchObject({ value: 10.81, min: 10.7, max: 10.9, expandedUncertainty: 0.004 });
    expect(page.runs[0]!.traces).toEqual([
      { kind: 'find-points', atMs: [0, 500, 900], volts: [12, 11, expect.closeTo(10.2, 5)], output: [1, 1, 0] },
    ]);
    expect(page.label).toEqual({ tripVolts: 10.81, releaseVolts: 12.23 });
  });

  it('is null for a serial that nobody knows', async () => {
    expect(await readUnitPage('CB1210999999999')).toBeNull();
  });

  it('exports its readings, oldest attempt first', async () => {
    const { unit } = await board(reject, pass);
    const lines = readingsAsCsv((await readUnitPage(unit.serial))!)
      .trimEnd()
      .split('\r\n');
    expect(lines).toHaveLength(1 + 2 * 3);
    expect(lines.slice(0, 2)).toEqual([
      'serial,run,attempt,part,seconds,volts,output',
      `${unit.serial},production,1,find-points,0.000,12.00000,on`,
    ]);
    expect(lines.at(-1)).toBe(`${unit.serial},production,2,find-points,0.900,10.20000,off`);
  });
});

describe('a disposition', () => {
  it('of rework lets a rejected board be tested again, and stands in the trail', async () => {
    const made = await board(reject);
    const { unit, runIds } = made;
    expect(await standingOf(unit.serial)).toEqual({ kind: 'needs-disposition' });
    expect(await signDispositions(actor, rework(made))).toEqual({ ok: true, value: { boards: 1 } });
    const page = (await readUnitPage(unit.serial))!;
    expect(page.standing).toEqual({ kind: 'may-be-tested', retestOrderId: null });
    expect(page.dispositions).toMatchObject([
      { kind: 'rework', action: 'R14 changed', runId: runIds[0], signedByName: actor.name },
    ]);
    const entries = await open.db
      .select()
      .from(trail)
      .where(and(eq(trail.entity, 'unit'), eq(trail.entityId, unit.id)));
    expect(entries).toMatchObject([{ action: 'unit.rework', reason: 'Wrong reel', accountId: actor.accountId }]);
    expect(JSON.stringify(entries)).not.toContain(password);
  });

  it('of scrap ends the board', async () => {
    const made = await board(reject);
    const { unit } = made;
    await signDispositions(actor, rework(made, { kind: 'scrap', action: '' }));
    expect(await standingOf(unit.serial)).toEqual({ kind: 'scrapped' });
    expect(await signDispositions(actor, rework(made))).toMatchObject({ ok: false, code: 'nothing-to-decide' });
  });

  it('is not signed with a wrong password, beside the field, and stores nothing', async () => {
    const made = await board(reject);
    const { unit } = made;
    const refused = await signDispositions(actor, rework(made, { password: 'wrong' }));
    expect(refused).toMatchObject({ ok: false, code: 'wrong-password', field: 'password' });
    expect((await readUnitPage(unit.serial))!.dispositions).toEqual([]);
  });

  it('is refused for a board that passed', async () => {
    expect(await signDispositions(actor, rework(await board(pass)))).toMatchObject({
      ok: false,
      code: 'nothing-to-decide',
    });
  });

  it('of rework is refused when no attempt is left, scrap is not', async () => {
    const made = await board(reject, reject, reject);
    const { unit } = made;
    expect((await readUnitPage(unit.serial))!.decidable).toEqual(['scrap', 'concession', 'return']);
    expect(await signDispositions(actor, rework(made))).toMatchObject({ ok: false, code: 'attempts-used' });
    expect(await signDispositions(actor, rework(made, { kind: 'scrap' }))).toMatchObject({ ok: true });
  });

  it('frees a board that was stopped while failing', async () => {
    const made = await board(failing);
    const { unit } = made;
    expect(await standingOf(unit.serial)).toMatchObject({ kind: 'waits-for-quality' });
    await signDispositions(actor, rework(made));
    expect(await standingOf(unit.serial)).toMatchObject({ kind: 'may-be-tested' });
  });
});

describe('a retest order', () => {
  it('lets a passed board be tested once more', async () => {
    const { unit } = await board(pass);
    expect(await orderRetest(actor, { unitId: unit.id, reason: 'Drift in the lot', password })).toMatchObject({
      ok: true,
    });
    const page = (await readUnitPage(unit.serial))!;
    expect(page.standing).toEqual({ kind: 'may-be-tested', retestOrderId: page.retestOrders[0]!.id });
  });

  it('is refused for a rejected board, which needs a rework', async () => {
    const { unit } = await board(reject);
    const refused = await orderRetest(actor, { unitId: unit.id, reason: 'x', password });
    expect(refused).toMatchObject({
      ok: false,
      code: 'retest-not-possible',
      sentence: expect.stringContaining('rework'),
    });
  });
});

describe('a label printed again', () => {
  it('goes to the printer of the station that passed the board', async () => {
    const { unit, runIds } = await board(reject, pass);
    expect(await printLabelAgain(actor, unit.id)).toEqual({ ok: true, value: null });
    expect((await readUnitPage(unit.serial))!.labels).toMatchObject([
      { runId: runIds[1], state: 'waiting', printerName: 'Labels' },
    ]);
  });

  it('is refused for a board that did not pass', async () => {
    const { unit } = await board(reject);
    expect(await printLabelAgain(actor, unit.id)).toMatchObject({ ok: false, code: 'not-passed' });
  });
});

describe('search', () => {
  it.each([
    ['CB1210264800003', { kind: 'unit', serial: 'CB1210264800003' }],
    [' cb1210 2648 00003 ', { kind: 'unit', serial: 'CB1210264800003' }],
    ['2648-b', { kind: 'lot', code: lotCode }],
    ['SWL-2648-B', { kind: 'lot', code: lotCode }],
  ])('opens %s at once', async (entered, exact) => {
    expect((await searchEverywhere(entered)).exact).toEqual(exact);
  });

  it('lists what contains a part of a number', async () => {
    const found = await searchEverywhere('0001');
    expect(found.exact).toBeNull();
    expect(found.units.map((unit) => unit.serial)).toContain('CB1210264800015');
    expect((await searchEverywhere('2648-')).lots).toMatchObject([{ code: lotCode }]);
  });

  it('takes no character for a wildcard', async () => {
    expect(await searchEverywhere('%')).toMatchObject({ units: [], lots: [] });
    expect(await searchEverywhere('CB_21')).toMatchObject({ units: [], lots: [] });
  });

  it('finds nothing for nothing', async () => {
    expect(await searchEverywhere('   ')).toMatchObject({ text: '', exact: null, units: [], lots: [] });
  });
});

describe('the list of boards', () => {
  it('takes a verdict and a station', async () => {
    const { rows } = await listUnitsForDesk({ verdict: 'pass', stationCode: station.code });
    expect(rows.length).toBeGreaterThan(0);
    expect(rows.every((row) => row.verdict === 'pass')).toBe(true);
    expect((await listUnitsForDesk({ verdict: null, stationCode: 'elsewhere' })).rows).toEqual([]);
  });
});
