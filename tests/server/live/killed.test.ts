import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { gt, like } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { lots } from '@/db/schema/lots';
import { runEvents } from '@/db/schema/run-events';
import { runs } from '@/db/schema/runs';
import { liveInTest, type LiveInTest } from './live-in-test';

let live: LiveInTest;
beforeAll(async () => {
  live = await liveInTest(20);
});
afterAll(() => live.close());

test('killed in the middle of a search, the restarted server has the supply off and the run closed before anyone connects', async () => {
  await live.freePort();
  const child = spawn(process.execPath, ['--import', 'tsx', join(import.meta.dirname, 'live-process.ts')], {
    env: process.env,
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  await once(child.stdout, 'data');
  const cookie = await live.enrol('S1');
  const screen = await live.screen('S1', cookie);
  const [lot] = await live.open.db.select().from(lots).where(like(lots.code, '%-02'));
  await screen.beginShift('4471', '2580', lot!.code);
  await screen.until(({ hands }) => hands?.nextSerial !== null);
  const began = new Date();
  await screen.act({ kind: 'place-board' });
  await screen.until(({ hands }) => hands?.boardSerial !== null);
  await screen.scan(screen.hands!.boardSerial!);
  await screen.until(({ view }) => (view?.run?.rails.travelled.fallingOnToVolts ?? null) !== null);
  const stored = () => live.open.db.select().from(runEvents);
  await expect.poll(async () => (await stored()).length, { timeout: 10_000 }).toBeGreaterThan(0);
  child.kill('SIGKILL');
  await once(child, 'exit');
  // The demo's finished lot has runs of its own.
  const ofThisBoard = () => live.open.db.select().from(runs).where(gt(runs.startedAt, began));
  expect(await ofThisBoard()).toMatchObject([{ endedAt: null }]);

  await live.start();
  const rows = await ofThisBoard();
  expect(rows).toMatchObject([
    { verdict: 'no-verdict', noVerdictReason: 'interrupted', closedBy: 'recovery', supplyOffConfirmed: true },
  ]);
  expect((await stored()).flatMap((row) => row.batch).length).toBeGreaterThan(5);
  expect(await readdir(join(live.dataFolder, 'journal'))).toEqual([]);
  const again = await live.screen('S1', cookie);
  expect(again.view!.screen).toEqual({ kind: 'badge' });
});
