import { eq, like } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { commissionings } from '@/db/schema/commissionings';
import { dailyChecks } from '@/db/schema/daily-checks';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import { liveInTest, type LiveInTest } from './live-in-test';
import type { ScreenInTest } from './screen-in-test';

let live: LiveInTest;
let stationId: string;
beforeAll(async () => {
  live = await liveInTest(60);
  const [station] = await live.open.db.select().from(stations).where(eq(stations.code, 'S2'));
  stationId = station!.id;
  await live.start();
});
afterAll(() => live.close());

async function signIn(badge: string, pin: string): Promise<ScreenInTest> {
  const screen = await live.screen('S2', await live.enrol('S2'));
  await screen.until(({ leads, view }) => leads === true && view?.screen.kind === 'badge', 10_000);
  await screen.scan(`SWB-${badge}`);
  expect(await screen.command({ kind: 'pin', digits: pin })).toEqual({ ok: true });
  // The answer may come before the view that shows what it did.
  await screen.until(({ view }) => view?.operator != null);
  return screen;
}

const reference = 'REF-CB1210-1';

async function placeReference(screen: ScreenInTest): Promise<void> {
  await screen.act({ kind: 'lid', closed: false });
  if (screen.hands?.boardSerial) await screen.act({ kind: 'remove-board' });
  await new Promise((resolve) => setTimeout(resolve, 200));
  expect(await screen.act({ kind: 'place-board', serial: reference })).toEqual({ ok: true });
}

test('a station without a valid daily check may not test, until its operator scans the reference board and it passes', async () => {
  const { db } = live.open;
  await db.update(dailyChecks).set({ at: new Date(Date.now() - 13 * 3_600_000) });
  const screen = await signIn('4471', '2580');
  await screen.until(({ view }) => view?.screen.kind === 'may-not-test');
  expect(screen.view!.screen).toMatchObject({
    reasons: [{ code: 'daily-check-ended', faultCode: 'C-311' }],
    otherStation: null,
  });
  await placeReference(screen);
  expect(await screen.scan(reference)).toEqual({ ok: true });
  await screen.until(({ view }) => view?.screen.kind === 'daily-check');
  expect(screen.view!.screen).toMatchObject({ passed: true, points: [{ passed: true }, { passed: true }] });
  const checks = await db
    .select()
    .from(dailyChecks)
    .where(eq(dailyChecks.stationId, stationId))
    .orderBy(dailyChecks.at);
  expect(checks.at(-1)).toMatchObject({ passed: true, validHours: 12 });
  const [run] = await db
    .select()
    .from(runs)
    .where(eq(runs.id, checks.at(-1)!.runId!));
  expect(run).toMatchObject({ kind: 'daily-check', verdict: 'pass', unitId: null });
  await screen.command({ kind: 'continue' });
  await screen.until(({ view }) => view?.screen.kind === 'choose-lot');
  await screen.command({ kind: 'end-shift' });
  screen.close();
});

test('an engineer commissions the station at the bench; an operator may not, and an engineer does not test boards', async () => {
  const { db } = live.open;
  const operator = await signIn('4471', '2580');
  expect(await operator.command({ kind: 'start-commissioning' })).toMatchObject({ ok: false, code: 'not-permitted' });
  await operator.command({ kind: 'end-shift' });
  operator.close();

  await new Promise((resolve) => setTimeout(resolve, 100));
  const screen = await signIn('4410', '7319');
  expect(screen.view!.operator).toMatchObject({ mayCommission: true });
  await placeReference(screen);
  expect(await screen.command({ kind: 'start-commissioning' })).toEqual({ ok: true });
  expect(await screen.scan('CB1210000000000')).toMatchObject({ ok: false, code: 'reference-unknown' });
  expect(await screen.scan(reference)).toEqual({ ok: true });
  await screen.act({ kind: 'lid', closed: true });
  await screen.until(({ view }) => view?.screen.kind === 'commissioning' && view.screen.state === 'measuring');
  await screen.until(
    ({ view }) => view?.screen.kind === 'commissioning' && ['done', 'failed'].includes(view.screen.state),
    180_000,
  );
  expect(screen.view!.screen).toMatchObject({ state: 'done' });
  const rows = await db
    .select()
    .from(commissionings)
    .where(eq(commissionings.stationId, stationId))
    .orderBy(commissionings.at);
  const measured = rows.at(-1)!;
  expect(rows).toHaveLength(2);
  expect(measured.overshoot).toBeGreaterThan(0.03);
  expect(measured.overshoot).toBeLessThan(0.07);
  expect(measured.validUntil.getTime()).toBeGreaterThan(Date.now() + 100 * 24 * 3_600_000);
  await screen.command({ kind: 'continue' });

  const [lot] = await db.select().from(lots).where(like(lots.code, '%-02'));
  await screen.scan(`SWL-${lot!.code}`);
  await screen.act({ kind: 'lid', closed: false });
  await screen.act({ kind: 'remove-board' });
  await new Promise((resolve) => setTimeout(resolve, 200));
  const [board] = await db.select().from(units).where(eq(units.lotId, lot!.id)).limit(1);
  expect(await screen.scan(board!.serial)).toMatchObject({ ok: false, code: 'not-permitted' });
  screen.close();
}, 240_000);

test('an engineer who stops the commissioning leaves the supply off and no result', async () => {
  const { db } = live.open;
  const screen = await live.screen('S2', await live.enrol('S2'));
  await screen.until(({ leads }) => leads === true, 10_000);
  const before = await db.select().from(commissionings);
  await placeReference(screen);
  await screen.command({ kind: 'start-commissioning' });
  await screen.scan(reference);
  await screen.act({ kind: 'lid', closed: true });
  await screen.until(({ view }) => view?.screen.kind === 'commissioning' && view.screen.done > 0);
  await screen.command({ kind: 'stop' });
  await screen.until(({ view }) => view?.screen.kind === 'commissioning' && view.screen.state === 'failed');
  expect(screen.view!.screen).toMatchObject({ what: { code: 'commissioning-stopped' }, values: null });
  expect(await db.select().from(commissionings)).toHaveLength(before.length);
});
