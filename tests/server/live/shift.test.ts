import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { labels } from '@/db/schema/labels';
import { lots } from '@/db/schema/lots';
import { measurements } from '@/db/schema/measurements';
import { runEvents } from '@/db/schema/run-events';
import { runs } from '@/db/schema/runs';
import { traces } from '@/db/schema/traces';
import { units } from '@/db/schema/units';
import { liveInTest, type LiveInTest } from './live-in-test';

let live: LiveInTest;
beforeAll(async () => {
  live = await liveInTest(20);
  await live.start();
});
afterAll(() => live.close());

test('a shift at a simulated station: badge, PIN, lot sheet, and a board from the box to a recorded pass', async () => {
  const screen = await live.screen('S1', await live.enrol('S1'));
  expect(screen.leads).toBe(true);
  const [lot] = await live.open.db.select().from(lots).where(eq(lots.size, 24)).orderBy(lots.code).limit(1);
  await screen.beginShift('4471', '2580', lot!.code);
  const serial = await screen.testNextBoard();
  expect(screen.view!.run!.screen.kind).toBe('pass');
  await screen.until(({ view }) => view?.lot?.tested === 1 && view.lot.passed === 1);

  const { db } = live.open;
  const [unit] = await db.select().from(units).where(eq(units.serial, serial));
  const [run, ...others] = await db.select().from(runs).where(eq(runs.unitId, unit!.id));
  expect(others).toEqual([]);
  expect(run).toMatchObject({ verdict: 'pass', closedBy: 'station', supplyOffConfirmed: true, attempt: 1 });
  const verified = await db
    .select()
    .from(measurements)
    .where(and(eq(measurements.runId, run!.id), eq(measurements.phase, 'verified')));
  expect(verified.map((each) => each.quantity)).toEqual(
    expect.arrayContaining(['trip-volts', 'release-volts', 'hysteresis-volts']),
  );
  expect((await db.select().from(runEvents).where(eq(runEvents.runId, run!.id))).length).toBeGreaterThan(3);
  expect((await db.select().from(traces).where(eq(traces.runId, run!.id))).map((trace) => trace.kind)).toEqual(
    expect.arrayContaining(['find', 'trim', 'verify']),
  );
  expect(await db.select().from(labels).where(eq(labels.runId, run!.id))).toHaveLength(1);

  const again = await screen.scan(serial);
  expect(again).toMatchObject({ ok: false, code: 'board-passed' });
});
