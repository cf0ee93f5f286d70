import { desc, eq, like } from 'drizzle-orm';
import { encode } from 'next-auth/jwt';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { insertSession } from '@/db/queries/sessions';
import { accounts } from '@/db/schema/accounts';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { sessions } from '@/db/schema/sessions';
import { stationEnrolments } from '@/db/schema/station-enrolments';
import type { Live } from '@/server/live/start-live';
import { liveInTest, type LiveInTest } from './live-in-test';
import type { ScreenInTest } from './screen-in-test';

let live: LiveInTest;
let running: Live;
let lotCode: string;
beforeAll(async () => {
  live = await liveInTest(20);
  running = await live.start();
  const [lot] = await live.open.db.select().from(lots).where(like(lots.code, '%-02'));
  lotCode = lot!.code;
});
afterAll(() => live.close());

async function deskCookie(name: string) {
  const [account] = await live.open.db.select().from(accounts).where(eq(accounts.name, name));
  const sessionId = await insertSession(live.open.db, { accountId: account!.id, stationId: null });
  const token = await encode({ token: { sessionId }, secret: process.env.NEXTAUTH_SECRET! });
  return { sessionId, cookie: `next-auth.session-token=${token}` };
}

const newestRun = async () => (await live.open.db.select().from(runs).orderBy(desc(runs.startedAt)).limit(1))[0]!;
const gone = (screen: ScreenInTest) => screen.until(() => !screen.socket.connected, 5_000);

/** A board on the fixture whose search has begun. */
async function beginSearch(screen: ScreenInTest): Promise<void> {
  await screen.act({ kind: 'lid', closed: false });
  if (screen.hands?.boardSerial) {
    await screen.act({ kind: 'remove-board' });
    await screen.until(({ hands }) => hands?.boardSerial === null);
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  await screen.until(({ hands }) => hands?.nextSerial !== null);
  await screen.act({ kind: 'place-board' });
  await screen.until(({ hands }) => hands?.boardSerial !== null);
  expect(await screen.scan(screen.hands!.boardSerial!)).toEqual({ ok: true });
  await screen.until(({ view }) => view?.run?.supply.state === 'on');
}

describe('the door', () => {
  test('is closed to other sites, to strangers and to stations that do not exist', async () => {
    const cookie = await live.enrol('S1');
    await expect(live.screen('S1', cookie, 'https://elsewhere.example')).rejects.toThrow('wrong-origin');
    await expect(live.screen('S1', '')).rejects.toThrow('sign-in');
    await expect(live.screen('S9', cookie)).rejects.toThrow('station-unknown');
    await expect(live.screen('S2', cookie)).rejects.toThrow('not-allowed');
  });

  test('lets a desk in to watch, never to act', async () => {
    const { cookie } = await deskCookie('A. Boyle');
    const desk = await live.screen('S1', cookie);
    expect(desk.leads).toBe(false);
    expect(desk.view!.station.code).toBe('S1');
    expect(await desk.scan('SWB-4471')).toEqual({ ok: false, code: 'not-permitted' });
    expect(await desk.command({ kind: 'stop' })).toEqual({ ok: false, code: 'not-permitted' });
    expect(await desk.act({ kind: 'lid', closed: true })).toEqual({ ok: false, code: 'not-permitted' });
    desk.close();
  });

  test('closes behind a desk session that ends, and behind an enrolment that is taken back, within five seconds', async () => {
    const { cookie, sessionId } = await deskCookie('A. Boyle');
    const desk = await live.screen('S2', cookie);
    await live.open.db
      .update(sessions)
      .set({ endedAt: new Date(), endedBecause: 'signed-out' })
      .where(eq(sessions.id, sessionId));
    await gone(desk);

    const bench = await live.screen('S2', await live.enrol('S2'));
    await live.open.db.update(stationEnrolments).set({ revokedAt: new Date() });
    await gone(bench);
  });

  test('takes nothing that is not a command', async () => {
    const screen = await live.screen('S2', await live.enrol('S2'));
    const send = (given: unknown) => screen.socket.timeout(5_000).emitWithAck('command', given);
    for (const given of [null, 'stop', { kind: 'pass' }, { kind: 'pin', digits: 'abcd' }])
      expect(await send(given)).toMatchObject({ ok: false });
    screen.close();
  });
});

describe('a bench', () => {
  test('is led by its first screen; a second one watches and may only stop', async () => {
    const cookie = await live.enrol('S1');
    const first = await live.screen('S1', cookie);
    const second = await live.screen('S1', cookie);
    second.obedient = false;
    expect([first.leads, second.leads]).toEqual([true, false]);
    await first.beginShift('4471', '2580', lotCode);
    await second.until(({ view }) => view?.lot?.code === lotCode);
    expect(await second.scan('SWB-4502')).toEqual({ ok: false, code: 'screen-watches' });
    await beginSearch(first);
    expect(await second.command({ kind: 'stop' })).toEqual({ ok: true });
    await first.until(({ view }) => view?.run?.screen.kind === 'no-verdict' && view.run.supply.state === 'off');
    await expect.poll(newestRun).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'operator-stop' });
    expect(first.readings).toBeGreaterThan(0);
    first.close();
    second.close();
  });

  test('survives a reload in the middle of a run', async () => {
    const cookie = await live.enrol('S1');
    const first = await live.screen('S1', cookie);
    await first.until(({ leads }) => leads === true, 10_000);
    await beginSearch(first);
    const serial = first.view!.run!.serial;
    first.obedient = false;
    first.close();
    const reloaded = await live.screen('S1', cookie);
    expect(reloaded.leads).toBe(true);
    const view = await reloaded.runOver(serial);
    expect(view.run!.screen.kind).toBe('pass');
    reloaded.close();
  });

  test('that is gone for more than five seconds has its supply switched off and the board without a verdict', async () => {
    const screen = await live.screen('S1', await live.enrol('S1'));
    await screen.until(({ leads }) => leads === true, 10_000);
    screen.obedient = false;
    await beginSeated(screen);
    screen.close();
    const { cookie } = await deskCookie('A. Boyle');
    const desk = await live.screen('S1', cookie);
    await desk.until(({ view }) => view?.run?.screen.kind === 'no-verdict' && view.run.supply.state === 'off', 15_000);
    await expect.poll(newestRun).toMatchObject({ noVerdictReason: 'bench-lost', supplyOffConfirmed: true });
    desk.close();
  });

  /** A run that waits for its lid to close: it has begun, and nobody goes on with it. */
  async function beginSeated(screen: ScreenInTest): Promise<void> {
    await screen.act({ kind: 'lid', closed: false });
    await screen.act({ kind: 'remove-board' });
    await new Promise((resolve) => setTimeout(resolve, 200));
    await screen.act({ kind: 'place-board' });
    await screen.until(({ hands }) => hands?.boardSerial !== null);
    expect(await screen.scan(screen.hands!.boardSerial!)).toEqual({ ok: true });
  }

  test('goes back to the badge when its operator’s session is ended from the office', async () => {
    const screen = await live.screen('S1', await live.enrol('S1'));
    await screen.until(({ leads }) => leads === true, 10_000);
    await live.open.db.update(sessions).set({ endedAt: new Date(), endedBecause: 'disabled' });
    await screen.until(({ view }) => view?.screen.kind === 'badge', 5_000);
    screen.close();
  });
});

test('a stop in the middle of a run switches the supply off and closes the run; the next start begins at the badge', async () => {
  const screen = await live.screen('S1', await live.enrol('S1'));
  await screen.until(({ leads }) => leads === true, 10_000);
  await screen.beginShift('4471', '2580', lotCode);
  await beginSearch(screen);
  const open = await newestRun();
  expect(open.verdict).toBeNull();
  await running.stop();
  expect(await newestRun()).toMatchObject({ id: open.id, noVerdictReason: 'shutdown', supplyOffConfirmed: true });
  running = await live.start();
  const again = await live.screen('S1', await live.enrol('S1'));
  expect(again.view!.screen).toEqual({ kind: 'badge' });
});
