import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { chartBaselines } from '@/db/schema/chart-baselines';
import { engineeringOffers } from '@/db/schema/engineering-offers';
import { runs } from '@/db/schema/runs';
import { siteSettings } from '@/db/schema/site-settings';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import type { Actor } from '@/lib/access/actor';
import type { BoardType } from '@/lib/contracts/board-type';
import { lotViewSchema } from '@/lib/contracts/lot-view';
import { operatorNamingKey } from '@/lib/contracts/operator-naming';
import type { RunPlan } from '@/lib/run/types';
import type { Sequence } from '@/lib/sequence/step';
import { chooseBaseline } from '@/server/operations/lots/choose-baseline';
import { createLot } from '@/server/operations/lots/create-lot';
import { freezeBaselines } from '@/server/operations/lots/freeze-baselines';
import { listBaselineCandidates } from '@/server/operations/lots/list-baseline-candidates';
import { readLotPage } from '@/server/operations/lots/read-lot-page';
import { readLotReview } from '@/server/operations/lots/read-lot-review';
import { insertAccount, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf, insertReleasedSequence } from './bases';
import { insertRun, type RunStory } from './runs';

let open: TemporaryDatabase;
let actor: Actor;
let station: { id: string; code: string };
let sequenceRevisionId: string;
beforeAll(async () => {
  open = await temporaryDatabase();
  actor = actorOf(await insertAccount(open.db, ['quality-manager'], { operatorNumber: '14' }));
  sequenceRevisionId = (await insertReleasedSequence(open.db)).sequenceRevision.id;
  station = await insertStation(open.db);
});
afterAll(() => open.close());

let next = 0;
async function makeLot(quantity: number) {
  const code = `R-${++next}`;
  await createLot(actor, {
    code,
    sequenceRevisionId,
    serials: { kind: 'counted', firstSerial: `CB1210${String(next).padStart(4, '0')}00001`, quantity },
  });
  const lot = (await readLotPage(code))!;
  const boards = await open.db.select().from(units).where(eq(units.lotId, lot.id)).orderBy(asc(units.position));
  const run = (place: number, over: Partial<RunStory> = {}) =>
    insertRun(open.db, {
      unit: boards[place - 1]!,
      stationId: station.id,
      operatorId: actor.accountId,
      attempt: 1,
      minute: place,
      ending: { verdict: 'pass' },
      ...over,
    });
  return { id: lot.id, code, boards, run };
}

const wobble = (place: number) => 10.8 + ((place * 7) % 11) / 1000;
const baselinesOf = (lotId: string) => open.db.select().from(chartBaselines).where(eq(chartBaselines.lotId, lotId));

describe('the review of a lot', () => {
  it('shows the first attempt with a verdict of every board, in test order; runs without a verdict never count', async () => {
    const lot = await makeLot(4);
    await lot.run(3, { minute: 1, tripVolts: 10.83 });
    const stopped = { verdict: 'no-verdict', reason: 'operator-stop' } as const;
    await lot.run(1, { minute: 2, ending: stopped, tripVolts: 11.4 });
    await lot.run(1, { minute: 3, attempt: 2, tripVolts: 10.81 });
    await lot.run(2, { minute: 4, ending: { verdict: 'reject', reason: 'trip-too-high' }, tripVolts: 10.95 });
    await lot.run(2, { minute: 5, attempt: 2, tripVolts: 10.82 });
    const review = (await readLotReview(lot.code))!;
    expect(review.points.serials).toEqual([2, 0, 1].map((i) => lot.boards[i]!.serial));
    expect(review.points.values).toEqual([10.83, 10.81, 10.95]);
    expect(review.points.found).toEqual([10.34, 10.34, 10.34]);
    expect(review.points.marks).toBe('PPW');
    expect(review.yields).toMatchObject({ tested: 3, passedFirst: 2, passedLast: 3 });
    expect(review.withoutVerdict).toEqual([{ station: station.code, operator: 'A', runs: 1 }]);
    expect(review.limits).toMatchObject({ min: 10.7, max: 10.9 });
    expect(review.baseline).toMatchObject({ kind: 'waiting', values: 3 });
  });

  it('leaves engineering runs out, whatever they measured', async () => {
    const lot = await makeLot(1);
    const offer = {
      stationId: station.id,
      revisionId: sequenceRevisionId,
      boardTypeId: '00000000-0000-4000-8000-000000000001',
      sequence: { steps: [] } as unknown as Sequence,
      boardType: {} as BoardType,
      offeredBy: actor.accountId,
    };
    const [made] = await open.db.insert(engineeringOffers).values(offer).returning();
    await open.db.insert(runs).values({
      kind: 'engineering',
      offerId: made!.id,
      unitId: lot.boards[0]!.id,
      lotId: lot.id,
      stationId: station.id,
      operatorId: actor.accountId,
      attempt: 1,
      plan: {} as RunPlan,
      endedAt: new Date(),
      verdict: 'reject',
      rejectReason: 'never-on',
      closedBy: 'station',
    });
    expect((await readLotReview(lot.code))!).toMatchObject({ points: { serials: [] }, yields: { tested: 0 } });
  });

  it('shows turns and seconds too, which have no limits', async () => {
    const lot = await makeLot(2);
    await lot.run(1);
    const view = (quantity: 'turns' | 'seconds') => readLotReview(lot.code, lotViewSchema.parse({ quantity }));
    expect((await view('turns'))!).toMatchObject({ points: { values: [0.5] }, limits: null });
    expect((await view('seconds'))!).toMatchObject({ points: { values: [15] }, capability: { kind: 'noLimits' } });
  });

  it('names operators by their number only where the site allows it', async () => {
    const lot = await makeLot(1);
    await lot.run(1);
    const groups = async () =>
      (await readLotReview(lot.code, lotViewSchema.parse({ compare: 'operator' })))!.comparison.groups;
    expect(await groups()).toMatchObject([{ label: 'A', boards: 1 }]);
    await open.db.insert(siteSettings).values({ key: operatorNamingKey, value: { shown: true } });
    expect(await groups()).toMatchObject([{ label: '14', boards: 1 }]);
    await open.db.delete(siteSettings);
  });

  it('is null for a lot that does not exist', async () => {
    expect(await readLotReview('NONE')).toBeNull();
  });
});

describe('control limits', () => {
  it('are frozen once with the thirtieth board, and a drift after it does not move them', async () => {
    const lot = await makeLot(45);
    for (let place = 1; place <= 29; place++) await lot.run(place, { tripVolts: wobble(place) });
    await freezeBaselines(open.db, lot.id);
    expect(await baselinesOf(lot.id)).toEqual([]);
    await lot.run(30, { tripVolts: wobble(30) });
    await Promise.all([freezeBaselines(open.db, lot.id), freezeBaselines(open.db, lot.id)]);
    const frozen = (await baselinesOf(lot.id)).find(({ quantity }) => quantity === 'trip-volts')!;
    expect(frozen).toMatchObject({ boards: 30, frozenBy: null, fromLotIds: [] });
    for (let place = 31; place <= 45; place++) await lot.run(place, { tripVolts: wobble(place) + 0.03 });
    const review = (await readLotReview(lot.code))!;
    expect(review.baseline).toMatchObject({ kind: 'frozen', centre: frozen.centre, sigma: frozen.sigma });
    expect(review.stretches.some(({ rule, to }) => rule === 2 && to === 45)).toBe(true);
    expect(await baselinesOf(lot.id)).toHaveLength(1);
  });

  it('of an older lot are frozen when it is first read', async () => {
    const lot = await makeLot(31);
    for (let place = 1; place <= 31; place++) await lot.run(place, { tripVolts: wobble(place) });
    expect((await readLotReview(lot.code))!.baseline).toMatchObject({ kind: 'frozen', boards: 30 });
  });

  it('are taken from earlier stable lots with a reason, and the trail says so', async () => {
    const earlier = await makeLot(32);
    const drifting = await makeLot(40);
    const lot = await makeLot(31);
    for (let place = 1; place <= 32; place++) await earlier.run(place, { tripVolts: wobble(place) });
    for (let place = 1; place <= 40; place++)
      await drifting.run(place, { tripVolts: wobble(place) + (place > 28 ? 0.06 : 0) });
    for (let place = 1; place <= 31; place++) await lot.run(place, { tripVolts: wobble(place) + 0.01 });
    const candidates = await listBaselineCandidates(lot.code, 'trip-volts');
    expect(candidates).toContainEqual(expect.objectContaining({ code: earlier.code, boards: 32, stable: true }));
    expect(candidates).toContainEqual(expect.objectContaining({ code: drifting.code, stable: false }));

    const ask = { lotId: lot.id, quantity: 'trip-volts', scope: 'lot', reason: 'Own boards were few' } as const;
    expect(await chooseBaseline(actor, { ...ask, fromLotIds: [drifting.id] })).toMatchObject({
      ok: false,
      code: 'lot-not-stable',
      field: 'fromLotIds',
    });
    expect(await chooseBaseline(actor, { ...ask, fromLotIds: [lot.id] })).toMatchObject({ code: 'lot-of-other-type' });
    expect(await chooseBaseline(actor, { ...ask, fromLotIds: [earlier.id] })).toMatchObject({ ok: true });
    expect((await readLotReview(lot.code))!.baseline).toMatchObject({
      kind: 'frozen',
      boards: 32,
      fromLots: [earlier.code],
      byName: actor.name,
    });
    const told = await open.db.select().from(trail).where(eq(trail.action, 'baseline.chosen'));
    expect(told).toMatchObject([{ entityId: lot.id, accountId: actor.accountId, reason: 'Own boards were few' }]);
  });

  it('chosen for a board type hold for lots made later only', async () => {
    const earlier = await makeLot(30);
    for (let place = 1; place <= 30; place++) await earlier.run(place, { tripVolts: wobble(place) });
    const now = await makeLot(1);
    const ask = { quantity: 'trip-volts', scope: 'board-type', reason: 'Usual limits' } as const;
    await chooseBaseline(actor, { ...ask, lotId: now.id, fromLotIds: [earlier.id] });
    const later = await makeLot(1);
    await later.run(1);
    expect((await readLotReview(later.code))!.baseline).toMatchObject({ kind: 'frozen', fromLots: [earlier.code] });
    expect((await readLotReview(now.code))!.baseline).toMatchObject({ kind: 'waiting' });
  });
});

describe('the boards of a lot', () => {
  it('come sorted and a page at a time from the server', async () => {
    const lot = await makeLot(120);
    await lot.run(70, { tripVolts: 10.88 });
    await lot.run(71, { tripVolts: 10.72, ending: { verdict: 'reject', reason: 'release-too-high' } });
    const page = (query: Record<string, string>) => readLotPage(lot.code, lotViewSchema.parse(query));
    const third = (await page({ page: '3' }))!;
    expect(third).toMatchObject({
      boardsChosen: 120,
      firstSerial: lot.boards[0]!.serial,
      lastSerial: lot.boards[119]!.serial,
    });
    expect(third.boards.map(({ position }) => position)).toEqual(Array.from({ length: 20 }, (_, i) => 101 + i));
    expect((await page({ page: '99' }))!.boards).toHaveLength(20);
    const trips = (await page({ sort: 'trip', order: 'falling' }))!.boards.slice(0, 3).map(({ position }) => position);
    expect(trips).toEqual([70, 71, 1]);
    expect((await page({ boards: 'rejected' }))!).toMatchObject({ boardsChosen: 1, boards: [{ position: 71 }] });
    expect((await page({ sort: 'position', order: 'falling' }))!.boards[0]!.position).toBe(120);
  });
});
