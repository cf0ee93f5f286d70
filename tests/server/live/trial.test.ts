import { and, eq, like } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { engineerCalls } from '@/db/schema/engineer-calls';
import { labels } from '@/db/schema/labels';
import { lots } from '@/db/schema/lots';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import type { Actor } from '@/lib/access/actor';
import { acknowledgeCall } from '@/server/operations/engineering/calls';
import { endOffer } from '@/server/operations/engineering/offers/end-offer';
import { offerDraft } from '@/server/operations/engineering/offers/offer-draft';
import { actorOf } from '../../desk/bases';
import { liveInTest, type LiveInTest } from './live-in-test';
import type { ScreenInTest } from './screen-in-test';

let live: LiveInTest;
let engineer: Actor;
let screen: ScreenInTest;
let lot: typeof lots.$inferSelect;
let draftId: string;

/** Sooner than the look every three seconds would find it. */
const atOnceMs = 2_000;

beforeAll(async () => {
  live = await liveInTest(20);
  const { db } = live.open;
  const [person] = await db.select().from(accounts).where(eq(accounts.name, 'T. Marsden'));
  engineer = actorOf(person!);
  const open = and(like(lots.code, '%-02'), eq(lots.state, 'open'));
  [lot] = (await db.select().from(lots).where(open)) as [typeof lot];
  draftId = await insertDraft();
  await live.start();
  screen = await live.screen('S1', await live.enrol('S1'));
  await screen.beginShift('4471', '2580', lot.code);
});
afterAll(() => live.close());

/** The lot's sequence without its seal, as a draft. */
async function insertDraft(): Promise<string> {
  const { db } = live.open;
  const [used] = await db.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, lot.sequenceRevisionId));
  const data = { ...used!.data, steps: used!.data.steps.filter(({ kind }) => kind !== 'seal') };
  const all = await db.select().from(sequenceRevisions).where(eq(sequenceRevisions.sequenceId, used!.sequenceId));
  const draft = all.find(({ status }) => status === 'draft' || status === 'submitted');
  if (draft) {
    await db.update(sequenceRevisions).set({ data }).where(eq(sequenceRevisions.id, draft.id));
    return draft.id;
  }
  const number = Math.max(...all.map((each) => each.number)) + 1;
  const made = { sequenceId: used!.sequenceId, number, data, madeBy: engineer.accountId };
  const [row] = await db.insert(sequenceRevisions).values(made).returning();
  return row!.id;
}

const offered = async () => {
  const outcome = await offerDraft(engineer, { revisionId: draftId, stationCode: 'S1', note: 'Two boards.' });
  if (!outcome.ok) throw new Error(outcome.sentence);
  return outcome.value.offerId;
};

test('a draft offered at a desk reaches the bench at once, and runs there only after an act: to the record of an engineering run', async () => {
  const { db } = live.open;
  const offerId = await offered();
  await screen.until(({ view }) => view?.offer?.offerId === offerId, atOnceMs);
  expect(screen.view).toMatchObject({ engineering: null, offer: { offeredBy: 'T. Marsden', note: 'Two boards.' } });
  const tested = screen.view!.lot!.tested;

  expect(await screen.command({ kind: 'start-trial', offerId })).toEqual({ ok: true });
  await screen.until(({ view }) => view?.engineering?.offerId === offerId);
  expect(screen.view!.next!.stepGroups).not.toContain('seal');
  const serial = await screen.testNextBoard();
  expect(screen.view).toMatchObject({ engineering: { offerId }, lot: null, label: null, screen: { kind: 'run' } });
  const [run, ...others] = await db.select().from(runs).where(eq(runs.offerId, offerId));
  expect(others).toEqual([]);
  expect(run).toMatchObject({ kind: 'engineering', lotId: lot.id, closedBy: 'station', supplyOffConfirmed: true });
  expect(run!.plan.serial).toBe(serial);
  expect((await db.select().from(measurements).where(eq(measurements.runId, run!.id))).length).toBeGreaterThan(3);
  expect(await db.select().from(labels).where(eq(labels.runId, run!.id))).toEqual([]);

  expect(await screen.command({ kind: 'leave-trial' })).toEqual({ ok: true });
  await screen.until(({ view }) => view?.engineering === null && view.lot?.code === lot.code);
  expect(screen.view!.lot).toMatchObject({ tested });
  expect(screen.view!.next!.stepGroups).toContain('seal');
});

test('a trial whose offer is taken back at the desk ends between boards, at once', async () => {
  const offerId = screen.view!.offer!.offerId;
  await screen.command({ kind: 'start-trial', offerId });
  await screen.until(({ view }) => view?.engineering !== null);
  expect(await endOffer(engineer, offerId)).toMatchObject({ ok: true });
  await screen.until(({ view }) => view?.engineering === null && view.offer === null, atOnceMs);
  expect(screen.view).toMatchObject({ lot: { code: lot.code }, refusal: { code: 'offer-ended' } });
});

test('called done at the bench, a trial ends its offer', async () => {
  const offerId = await offered();
  await screen.until(({ view }) => view?.offer?.offerId === offerId, atOnceMs);
  await screen.command({ kind: 'start-trial', offerId });
  expect(await screen.command({ kind: 'end-trial' })).toEqual({ ok: true });
  expect(await endOffer(engineer, offerId)).toMatchObject({ ok: false, code: 'offer-ended' });
});

test('an answered call and a lot moved to another revision reach the bench at once', async () => {
  const { db } = live.open;
  await screen.command({ kind: 'call-engineer' });
  const [call] = await db.select().from(engineerCalls);
  await acknowledgeCall(engineer, call!.id);
  await screen.until(({ view }) => view?.call?.acknowledgedBy === 'T. Marsden', atOnceMs);

  await db.update(lots).set({ sequenceRevisionId: draftId }).where(eq(lots.id, lot.id));
  await screen.until(({ view }) => view?.next?.stepGroups.includes('seal') === false, atOnceMs);
});
