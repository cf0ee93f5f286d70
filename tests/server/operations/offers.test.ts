import { and, eq, like } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { listFoundPoints, findSecondsEach } from '@/db/queries/runs-bench';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import { countLots, listLots } from '@/db/queries/lots';
import { accounts } from '@/db/schema/accounts';
import { dailyChecks } from '@/db/schema/daily-checks';
import { engineeringOffers } from '@/db/schema/engineering-offers';
import { labels } from '@/db/schema/labels';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import { seedDemo } from '@/db/seed/demo';
import type { Actor } from '@/lib/access/actor';
import type { BenchPlace } from '@/lib/bench/types';
import type { RunPlan } from '@/lib/run/types';
import { readStanding } from '@/server/operations/bench/read-standing';
import { takeOffer } from '@/server/operations/bench/take-offer';
import { endOffer } from '@/server/operations/engineering/offers/end-offer';
import { listOffersOf } from '@/server/operations/engineering/offers/list-offers';
import { offerDraft } from '@/server/operations/engineering/offers/offer-draft';
import { readEngineeringRun } from '@/server/operations/engineering/offers/read-engineering-run';
import { readStationsOverview } from '@/server/operations/engineering/read-stations';
import { readLotStrip } from '@/server/operations/runs/lot-strip';
import { openRun } from '@/server/operations/runs/open-run';
import { recordRun } from '@/server/operations/runs/record-run';
import { recoverOpenRuns } from '@/server/operations/runs/recover-open-runs';
import { readUnitPage } from '@/server/operations/units/read-unit-page';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';
import { playBoard } from '../../lib/run/play-board';

let open: TemporaryDatabase;
let benches: BenchRow[];
let engineer: Actor;
let operator: BenchPlace;
let untrained: BenchPlace;
let lot: typeof lots.$inferSelect;
let boards: (typeof units.$inferSelect)[];
let draftId: string;

const personOf = async (name: string) => (await open.db.select().from(accounts).where(eq(accounts.name, name)))[0]!;
const placeOf = (accountId: string): BenchPlace => ({
  accountId,
  sessionId: null,
  lotId: lot.id,
  offerId: null,
  serial: null,
});

beforeAll(async () => {
  open = await temporaryDatabase();
  await seedDemo(open.db);
  benches = await listBenches(open.db);
  [lot] = (await open.db
    .select()
    .from(lots)
    .where(and(like(lots.code, '%-02'), eq(lots.state, 'open')))) as [typeof lot];
  boards = await open.db.select().from(units).where(eq(units.lotId, lot.id)).orderBy(units.position);
  engineer = actorOf(await personOf('T. Marsden'));
  operator = placeOf((await personOf('M. Adeyemi')).id);
  untrained = placeOf((await personOf('J. Okafor')).id);
  draftId = await insertDraft();
});
afterAll(() => open.close());
beforeEach(async () => {
  await open.db.update(engineeringOffers).set({ endedAt: new Date(), endedBy: engineer.accountId });
});

/** A draft with the steps of the lot's sequence; the demo's own draft of it, if there is one, makes place. */
async function insertDraft(): Promise<string> {
  const [used] = await open.db.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, lot.sequenceRevisionId));
  const { sequenceId, data } = used!;
  const all = await open.db.select().from(sequenceRevisions).where(eq(sequenceRevisions.sequenceId, sequenceId));
  const standing = all.find(({ status }) => status === 'draft' || status === 'submitted');
  if (standing) return standing.id;
  const number = Math.max(...all.map((each) => each.number)) + 1;
  const [draft] = await open.db
    .insert(sequenceRevisions)
    .values({ sequenceId, number, data, madeBy: engineer.accountId })
    .returning();
  return draft!.id;
}

async function offered(stationCode = 'S1', note = ''): Promise<string> {
  const outcome = await offerDraft(engineer, { revisionId: draftId, stationCode, note });
  if (!outcome.ok) throw new Error(outcome.sentence);
  return outcome.value.offerId;
}

let used = 0;
const nextSerial = () => boards[used++]!.serial;
const scan = (offerId: string | null, serial: string, who = operator, bench = benches[0]!) =>
  openRun(open.db, bench, { kind: 'board', serial, lotId: lot.id, offerId, byHand: false }, who);

async function begun(offerId: string | null, serial = nextSerial(), bench = benches[0]!): Promise<RunPlan> {
  const answer = await scan(offerId, serial, operator, bench);
  if (!answer.ok) throw new Error(JSON.stringify(answer.refusal));
  expect(answer.value.engineering).toBe(offerId !== null);
  return answer.value.plan;
}

/** The run as a board of this kind makes it, recorded. */
async function finished(plan: RunPlan, over: Parameters<typeof playBoard>[1] = { seed: 3 }) {
  const { events, result } = playBoard(plan, over);
  const batches = [{ n: 0, events: events.map((event) => ({ event, during: 'find' as const })) }];
  await recordRun(
    open.db,
    { runId: plan.runId, batches, result, seconds: 40, endedAtIso: new Date().toISOString() },
    'station',
  );
  return result;
}
const rowOf = async (runId: string) => (await open.db.select().from(runs).where(eq(runs.id, runId)))[0]!;

describe('offering a draft', () => {
  test('keeps the draft as it is now, tells the bench, and stands in the trail', async () => {
    const offerId = await offered('S1', 'Ten boards, please.');
    const { standing } = await readStanding(open.db, benches[0]!, operator);
    expect(standing.offer).toMatchObject({
      offerId,
      offeredBy: 'T. Marsden',
      revision: expect.stringMatching(/^r\d+$/),
      boardTypeCode: 'CB1210',
      note: 'Ten boards, please.',
    });
    const { stations } = await readStationsOverview();
    expect(stations.find(({ code }) => code === 'S1')!.offer).toMatchObject({ id: offerId });
    expect(stations.find(({ code }) => code === 'S2')!.offer).toBeNull();
    const entries = await open.db.select().from(trail).where(eq(trail.entityId, offerId));
    expect(entries).toMatchObject([{ action: 'offer.made', accountId: engineer.accountId, after: { station: 'S1' } }]);
  });

  test('is refused while another offer is open there, however closely they come', async () => {
    const both = await Promise.all(
      [1, 2].map(() => offerDraft(engineer, { revisionId: draftId, stationCode: 'S1', note: '' })),
    );
    expect(both.map((each) => (each.ok ? 'offered' : each.code)).sort()).toEqual(['offered', 'station-has-offer']);
    expect(both.find((each) => !each.ok)).toMatchObject({
      field: 'stationCode',
      sentence: expect.stringContaining('T. Marsden'),
    });
  });

  test.each([
    ['a station that does not exist', { stationCode: 'S99' }, 'station-unknown'],
    ['a station without the equipment it needs', { stationCode: 'S3' }, 'station-lacks-equipment'],
    ['a draft that does not exist', { revisionId: '00000000-0000-4000-8000-000000000000' }, 'revision-unknown'],
  ])('is refused for %s', async (_, over, code) => {
    const outcome = await offerDraft(engineer, { revisionId: draftId, stationCode: 'S1', note: '', ...over });
    expect(outcome).toMatchObject({ ok: false, code });
  });

  test('is refused for a released revision: that one is production', async () => {
    const outcome = await offerDraft(engineer, { revisionId: lot.sequenceRevisionId, stationCode: 'S1', note: '' });
    expect(outcome).toMatchObject({ ok: false, code: 'not-a-draft' });
  });

  test('is refused for a draft with errors, with the first of them in words', async () => {
    const [row] = await open.db.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, draftId));
    const faulty = { ...row!.data, steps: row!.data.steps.filter(({ kind }) => kind !== 'verify') };
    await open.db.update(sequenceRevisions).set({ data: faulty }).where(eq(sequenceRevisions.id, draftId));
    const outcome = await offerDraft(engineer, { revisionId: draftId, stationCode: 'S1', note: '' });
    await open.db.update(sequenceRevisions).set({ data: row!.data }).where(eq(sequenceRevisions.id, draftId));
    expect(outcome).toMatchObject({ ok: false, code: 'sequence-has-errors' });
    expect((outcome as { sentence: string }).sentence.length).toBeGreaterThan(50);
  });

  test('ended, it is gone from the bench; ending it again is refused', async () => {
    const offerId = await offered();
    expect(await endOffer(engineer, offerId)).toMatchObject({ ok: true });
    expect((await readStanding(open.db, benches[0]!, operator)).standing.offer).toBeNull();
    expect(await endOffer(engineer, offerId)).toMatchObject({ ok: false, code: 'offer-ended' });
    expect((await listOffersOf(draftId))[0]).toMatchObject({ id: offerId, endedByName: 'T. Marsden', runs: [] });
  });
});

describe('taking an offer', () => {
  test('is an act of whoever is signed in at that bench, and is kept', async () => {
    const offerId = await offered();
    const answer = await takeOffer(open.db, benches[0]!, { kind: 'offer', offerId }, operator);
    expect(answer).toMatchObject({ ok: true, value: { offer: { offerId }, next: { stepGroups: expect.any(Array) } } });
    const taken = and(eq(trail.entityId, offerId), eq(trail.action, 'offer.taken'));
    expect(await open.db.select().from(trail).where(taken)).toMatchObject([
      { accountId: operator.accountId, stationId: benches[0]!.id },
    ]);
  });

  test('is refused to those who neither test boards nor make engineering runs, and at another bench', async () => {
    const offerId = await offered();
    const quality = placeOf((await personOf('A. Boyle')).id);
    const take = (bench: BenchRow, who: BenchPlace) => takeOffer(open.db, bench, { kind: 'offer', offerId }, who);
    expect(await take(benches[0]!, quality)).toMatchObject({ ok: false, refusal: { code: 'not-permitted' } });
    expect(await take(benches[1]!, operator)).toMatchObject({ ok: false, refusal: { code: 'offer-ended' } });
  });
});

describe('an engineering run', () => {
  test('is made with the draft as it was offered, numbered by itself, and shows its record', async () => {
    const offerId = await offered();
    const serial = nextSerial();
    const plan = await begun(offerId, serial);
    const unit = boards.find((each) => each.serial === serial)!;
    expect(plan).toMatchObject({ serial, attempt: 1, sequenceRevision: expect.stringContaining('draft') });
    await finished(plan);
    expect(await rowOf(plan.runId)).toMatchObject({ kind: 'engineering', offerId, unitId: unit.id, verdict: 'pass' });
    const again = await begun(offerId, serial);
    expect(again.attempt).toBe(2);
    await finished(again);
    expect(await readEngineeringRun(plan.runId)).toMatchObject({
      serial,
      isUnit: true,
      offeredByName: 'T. Marsden',
      run: { kind: 'engineering', verdict: 'pass', measurements: expect.arrayContaining([expect.anything()]) },
    });
    const [latest] = (await listOffersOf(draftId))[0]!.runs;
    expect(latest).toMatchObject({ serial, attempt: 2, verdict: 'pass', seconds: 40, operatorName: 'M. Adeyemi' });
    expect(Math.abs(latest!.tripVolts! - 10.8)).toBeLessThan(0.1);
  });

  test('takes a spare board that belongs to no lot', async () => {
    const offerId = await offered();
    const plan = await begun(offerId, 'CB1210999900001');
    await finished(plan);
    expect(await rowOf(plan.runId)).toMatchObject({ kind: 'engineering', unitId: null, lotId: null, verdict: 'pass' });
    expect(await readEngineeringRun(plan.runId)).toMatchObject({ serial: 'CB1210999900001', isUnit: false });
    const again = await begun(offerId, 'CB1210999900001');
    expect(again.attempt).toBe(2);
    await finished(again);
  });

  test('takes neither a board that passed nor one of another type or form', async () => {
    const offerId = await offered();
    const passed = await begun(null);
    await finished(passed);
    const other = (
      await open.db
        .select()
        .from(units)
        .where(eq(units.lotId, (await otherTypesLot()).id))
    )[0]!;
    for (const [serial, code] of [
      [passed.serial, 'board-passed'],
      [other.serial, 'serial-wrong-form'],
      ['nonsense', 'serial-wrong-form'],
    ] as const)
      expect(await scan(offerId, serial)).toMatchObject({ ok: false, refusal: { code } });
  });

  test('needs a station as fit as production does, an operator trained for the type, and an open offer', async () => {
    const offerId = await offered();
    const serial = nextSerial();
    expect(await scan(offerId, serial, untrained)).toMatchObject({ ok: false, refusal: { code: 'training-ended' } });
    const checks = await open.db.select().from(dailyChecks);
    await open.db.update(dailyChecks).set({ passed: false });
    expect(await scan(offerId, serial)).toMatchObject({ ok: false, refusal: { code: 'daily-check-failed' } });
    const { standing } = await readStanding(open.db, benches[0]!, { ...operator, offerId });
    expect(standing.reasons).toMatchObject([{ code: 'daily-check-failed' }]);
    for (const { id, passed } of checks)
      await open.db.update(dailyChecks).set({ passed }).where(eq(dailyChecks.id, id));
    await endOffer(engineer, offerId);
    expect(await scan(offerId, serial)).toMatchObject({ ok: false, refusal: { code: 'offer-ended' } });
  });

  test('may be made by an engineer, who needs no training for the type', async () => {
    const offerId = await offered();
    const answer = await scan(offerId, nextSerial(), placeOf(engineer.accountId));
    expect(answer).toMatchObject({ ok: true });
    if (answer.ok) await finished(answer.value.plan);
  });

  test('keeps its kind and offer through a crash, and a board on a fixture is refused at another', async () => {
    const offerId = await offered();
    const plan = await begun(offerId);
    const elsewhere = await scan(null, plan.serial, operator, benches[1]!);
    expect(elsewhere).toMatchObject({ ok: false, refusal: { code: 'board-in-test', params: { station: 'S1' } } });
    await recoverOpenRuns(open.db, () => ({ confirmed: true, volts: 0.1, by: 'meter' }), { warn() {} });
    expect(await rowOf(plan.runId)).toMatchObject({
      kind: 'engineering',
      offerId,
      verdict: 'no-verdict',
      closedBy: 'recovery',
    });
  });
});

test('engineering runs of every verdict change nothing that is counted of a lot', async () => {
  const production = await begun(null);
  await finished(production);
  const counted = async () => ({
    strip: await readLotStrip(open.db, { lotId: lot.id, code: lot.code, boardTypeCode: 'CB1210' }),
    counts: await countLots(open.db, [lot.id]),
    seconds: await findSecondsEach(open.db, lot.id),
    points: await listFoundPoints(open.db, lot.id, 60),
    testedAtS2: (await listLots(open.db, { state: 'all', stationCode: 'S2', since: null })).map(({ code }) => code),
    lotAtS2: (await readStationsOverview()).stations.find(({ code }) => code === 'S2')!.lot,
    bin: (await readStanding(open.db, benches[1]!, operator)).pendingBin,
    labels: (await open.db.select().from(labels)).length,
  });
  const before = await counted();
  // A station that has made no production run of the lot.
  const bench = benches[1]!;
  const offerId = await offered('S2');
  const serials = [nextSerial(), nextSerial(), nextSerial(), nextSerial()];
  const [pass, reject, stopped, open4] = serials as [string, string, string, string];
  expect((await finished(await begun(offerId, pass, bench))).verdict).toBe('pass');
  expect((await finished(await begun(offerId, reject, bench), { seed: 5, defect: 'feedback-open' })).verdict).toBe(
    'reject',
  );
  // Three runs without a verdict, or one failing when stopped, would make a production board wait for quality.
  for (let i = 0; i < 3; i++) {
    await begun(offerId, stopped, bench);
    await recoverOpenRuns(open.db, () => ({ confirmed: false }), { warn() {} });
  }
  await begun(offerId, open4, bench);
  expect(await counted()).toEqual(before);
  const overview = await readStationsOverview();
  expect(overview.stations.find(({ code }) => code === 'S2')).toMatchObject({
    state: 'testing',
    engineering: true,
    serial: open4,
    lot: before.lotAtS2,
  });
  await recoverOpenRuns(open.db, () => ({ confirmed: false }), { warn() {} });
  expect(await counted()).toEqual(before);
  for (const serial of serials) {
    const page = (await readUnitPage(serial))!;
    expect(page).toMatchObject({ standing: { kind: 'may-be-tested' }, label: null, labels: [] });
    expect(page.runs.every((run) => run.kind === 'engineering')).toBe(true);
  }
  const attempt = await begun(null, reject);
  expect(attempt.attempt).toBe(1);
  await finished(attempt);
});

async function otherTypesLot() {
  const all = await open.db.select().from(lots);
  return all.find((each) => each.boardTypeRevisionId !== lot.boardTypeRevisionId)!;
}
