import { and, eq, like, sql } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { listHolds } from '@/db/queries/lot-holds';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import { accounts } from '@/db/schema/accounts';
import { commissionings } from '@/db/schema/commissionings';
import { dailyChecks } from '@/db/schema/daily-checks';
import { labels } from '@/db/schema/labels';
import { lotHolds } from '@/db/schema/lot-holds';
import { lots } from '@/db/schema/lots';
import { measurements } from '@/db/schema/measurements';
import { retestOrders } from '@/db/schema/retest-orders';
import { runEvents } from '@/db/schema/run-events';
import { runs } from '@/db/schema/runs';
import { traces } from '@/db/schema/traces';
import { units } from '@/db/schema/units';
import { seedDemo } from '@/db/seed/demo';
import type { BenchPlace } from '@/lib/bench/types';
import type { RunPlan } from '@/lib/run/types';
import { appendEvents } from '@/server/operations/runs/append-events';
import { releaseLot } from '@/server/operations/lots/hold-lot';
import { readLotStrip } from '@/server/operations/runs/lot-strip';
import { openRun } from '@/server/operations/runs/open-run';
import { recordRun } from '@/server/operations/runs/record-run';
import { closeLostRun, recoverOpenRuns } from '@/server/operations/runs/recover-open-runs';
import type { RunRecord } from '@/server/operations/runs/run-record';
import { scanBin } from '@/server/operations/runs/scan-bin';
import { verifyTrail } from '@/server/operations/trail/verify-trail';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';
import { playBoard, type Played } from '../../lib/run/play-board';

let open: TemporaryDatabase;
let benches: BenchRow[];
let who: BenchPlace;
let lot: typeof lots.$inferSelect;
beforeAll(async () => {
  open = await temporaryDatabase();
  await seedDemo(open.db);
  benches = await listBenches(open.db);
  const [operator] = await open.db.select().from(accounts).where(eq(accounts.operatorNumber, '14'));
  [lot] = (await open.db.select().from(lots).where(like(lots.code, '%-02'))) as [typeof lot];
  who = { accountId: operator!.id, sessionId: null, lotId: lot.id, offerId: null, serial: null };
});
afterAll(() => open.close());

const log = { warn() {} };
const supplyOff = { confirmed: true, volts: 0.2, by: 'meter' } as const;

let used = 0;
let serial: string;
beforeEach(async () => {
  const boards = await open.db.select().from(units).where(eq(units.lotId, lot.id)).orderBy(units.position);
  serial = boards[used++]!.serial;
});

const begin = (bench: BenchRow, over: { serial?: string; lotId?: string } = {}) =>
  openRun(
    open.db,
    bench,
    { kind: 'board', serial: over.serial ?? serial, lotId: over.lotId ?? lot.id, offerId: null, byHand: false },
    who,
  );

async function opened(bench = benches[0]!): Promise<RunPlan> {
  const answer = await begin(bench);
  if (!answer.ok) throw new Error(JSON.stringify(answer.refusal));
  return answer.value.plan;
}

const played = (plan: RunPlan, over: Parameters<typeof playBoard>[1] = { seed: 3 }) => playBoard(plan, over);

function recordOf(plan: RunPlan, { events, result }: Pick<Played, 'events' | 'result'>): RunRecord {
  const recorded = events.map((event) => ({ event, during: 'find' as const }));
  const half = recorded.length >> 1;
  return {
    runId: plan.runId,
    batches: [
      { n: 0, events: recorded.slice(0, half) },
      { n: 1, events: recorded.slice(half) },
    ],
    result,
    seconds: 41,
    endedAtIso: new Date().toISOString(),
  };
}
const rowOf = async (runId: string) => (await open.db.select().from(runs).where(eq(runs.id, runId)))[0]!;

describe('opening a run', () => {
  test('makes a plan from the lot, the station and its commissioning', async () => {
    const plan = await opened();
    expect(plan).toMatchObject({
      serial,
      attempt: 1,
      hasController: true,
      commissioning: { overshoot: 0.05 },
      prior: null,
      boardType: { code: 'CB1210' },
    });
    expect(await rowOf(plan.runId)).toMatchObject({ kind: 'production', endedAt: null, stationId: benches[0]!.id });
    await recordRun(open.db, recordOf(plan, played(plan)), 'station');
  });

  test('refuses a second run at the station, and the same board at another, however closely they come', async () => {
    const both = await Promise.all([begin(benches[0]!), begin(benches[1]!)]);
    const codes = both.map((answer) => (answer.ok ? 'opened' : answer.refusal.code)).sort();
    expect(codes).toEqual(['board-in-test', 'opened']);
    const busy = both[0].ok ? benches[0]! : benches[1]!;
    const other = (await open.db.select().from(units).where(eq(units.lotId, lot.id))).at(-1)!.serial;
    expect(await begin(busy, { serial: other })).toMatchObject({ ok: false, refusal: { code: 'station-in-use' } });
    await recoverOpenRuns(open.db, () => supplyOff, log);
  });

  test('refuses a passed board with its time, until quality orders a retest, which serves one run', async () => {
    const plan = await opened();
    await recordRun(open.db, recordOf(plan, played(plan)), 'station');
    const row = await rowOf(plan.runId);
    expect(await begin(benches[0]!)).toMatchObject({
      ok: false,
      refusal: { code: 'board-passed', params: { atIso: row.endedAt!.toISOString() } },
    });
    const [quality] = await open.db.select().from(accounts).where(eq(accounts.name, 'A. Boyle'));
    await open.db.insert(retestOrders).values({ unitId: row.unitId!, reason: 'Complaint', signedBy: quality!.id });
    const again = await opened();
    expect(again.attempt).toBe(2);
    await recordRun(open.db, recordOf(again, played(again)), 'station');
    expect(await begin(benches[0]!)).toMatchObject({ ok: false, refusal: { code: 'board-passed' } });
    expect(await open.db.select().from(retestOrders)).toMatchObject([{ usedByRunId: again.runId }]);
  });

  test('refuses a rejected board without a disposition, and one of another lot', async () => {
    const plan = await opened();
    const record = recordOf(plan, played(plan, { seed: 4, defect: 'zener-open' }));
    expect(record.result.verdict).toBe('reject');
    await recordRun(open.db, record, 'station');
    expect(await begin(benches[0]!)).toMatchObject({ ok: false, refusal: { code: 'board-needs-disposition' } });
    const [other] = await open.db.select().from(lots).where(eq(lots.size, 24)).orderBy(lots.code).limit(1);
    expect(await begin(benches[0]!, { lotId: other!.id })).toMatchObject({
      ok: false,
      refusal: { code: 'serial-of-other-lot', params: { lot: lot.code } },
    });
  });

  test('is refused where the rules find an error in the sequence for this station as it was commissioned', async () => {
    const bench = benches[0]!;
    const [usual] = await open.db.select().from(commissionings).where(eq(commissionings.stationId, bench.id)).limit(1);
    const { id: _id, at: _at, ...values } = usual!;
    const [slow] = await open.db
      .insert(commissionings)
      .values({ ...values, settleMs: 70, at: new Date() })
      .returning();
    expect(await begin(bench)).toMatchObject({ ok: false, refusal: { code: 'sequence-has-errors' } });
    await open.db.delete(commissionings).where(eq(commissionings.id, slow!.id));
    const plan = await opened(bench);
    await recordRun(open.db, recordOf(plan, played(plan)), 'station');
  });

  test('is for whoever may test boards: an engineer without that role is refused', async () => {
    const [engineer] = await open.db.select().from(accounts).where(eq(accounts.name, 'T. Marsden'));
    const answer = await openRun(
      open.db,
      benches[0]!,
      { kind: 'board', serial, lotId: lot.id, offerId: null, byHand: false },
      { ...who, accountId: engineer!.id },
    );
    expect(answer).toMatchObject({ ok: false, refusal: { code: 'not-permitted' } });
  });

  test('is refused where the operator’s training ended', async () => {
    const [untrained] = await open.db.select().from(accounts).where(eq(accounts.name, 'J. Okafor'));
    const answer = await openRun(
      open.db,
      benches[0]!,
      { kind: 'board', serial, lotId: lot.id, offerId: null, byHand: false },
      { ...who, accountId: untrained!.id },
    );
    expect(answer).toMatchObject({ ok: false, refusal: { code: 'training-ended' } });
  });
});

describe('recording a run', () => {
  test('stores events, traces, measurements, verdict and label once, however often and at once it is asked', async () => {
    const plan = await opened();
    const board = played(plan);
    const record = recordOf(plan, board);
    await appendEvents(open.db, plan.runId, record.batches.slice(0, 1));
    await appendEvents(open.db, plan.runId, record.batches.slice(0, 1));
    await Promise.all([1, 2, 3].map(() => recordRun(open.db, record, 'station')));
    await recordRun(open.db, record, 'journal');

    expect(await rowOf(plan.runId)).toMatchObject({
      verdict: 'pass',
      closedBy: 'station',
      supplyOffConfirmed: true,
      seconds: 41,
      trimRounds: board.result.trimRounds,
    });
    const stored = await open.db.select().from(measurements).where(eq(measurements.runId, plan.runId));
    expect(stored.sort((a, b) => a.n - b.n).map((each) => each.value)).toEqual(
      board.result.measurements.map((each) => each.value),
    );
    const events = await open.db.select().from(runEvents).where(eq(runEvents.runId, plan.runId)).orderBy(runEvents.n);
    expect(events.flatMap((row) => row.batch)).toEqual(board.events);
    expect(await open.db.select().from(labels).where(eq(labels.runId, plan.runId))).toHaveLength(1);
    const [trace] = await open.db.select().from(traces).where(eq(traces.runId, plan.runId));
    expect(trace!.volts.length).toBeGreaterThan(30);
  });

  test('shows in the lot rule, and a reject goes to its own bin once', async () => {
    const bench = benches[0]!;
    const plan = await opened();
    await recordRun(open.db, recordOf(plan, played(plan, { seed: 4, defect: 'feedback-open' })), 'station');
    const ask = { kind: 'bin', runId: plan.runId } as const;
    expect(await scanBin(open.db, bench, { ...ask, binCode: benches[1]!.binCode }, who)).toMatchObject({
      ok: false,
      refusal: { code: 'wrong-bin' },
    });
    expect(await scanBin(open.db, bench, { ...ask, binCode: bench.binCode }, who)).toMatchObject({ ok: true });
    const first = await rowOf(plan.runId);
    expect(first).toMatchObject({ binCode: bench.binCode, closedBy: 'station' });
    await scanBin(open.db, bench, { ...ask, binCode: bench.binCode }, who);
    expect((await rowOf(plan.runId)).binScannedAt).toEqual(first.binScannedAt);
    const strip = await readLotStrip(open.db, { lotId: lot.id, code: lot.code, boardTypeCode: 'CB1210' });
    expect(strip.marks[used - 1]).toBe('R');
    expect(strip.marks).toHaveLength(240);
  });

  test('gives the lot’s own distribution to later boards once ten are known', async () => {
    for (let i = 0; i < 10; i++) {
      const plan = await opened();
      await recordRun(open.db, recordOf(plan, played(plan, { seed: 100 + i })), 'station');
      const boards = await open.db.select().from(units).where(eq(units.lotId, lot.id)).orderBy(units.position);
      serial = boards[used++]!.serial;
    }
    const plan = await opened();
    expect(plan.prior!.tripMeanVolts).toBeGreaterThan(9);
    expect(plan.prior!.hysteresisMeanVolts).toBeCloseTo(1.5, 0);
    await recoverOpenRuns(open.db, () => supplyOff, log);
  });
});

describe('after a crash', () => {
  test('an open run is closed without a verdict, with what was measured and how the supply was found', async () => {
    const plan = await opened();
    const board = played(plan);
    const upTo = board.events.slice(0, 60);
    await appendEvents(open.db, plan.runId, [{ n: 0, events: upTo.map((event) => ({ event, during: 'find' })) }]);
    expect(await recoverOpenRuns(open.db, () => ({ confirmed: false }), log)).toBe(1);
    expect(await rowOf(plan.runId)).toMatchObject({
      verdict: 'no-verdict',
      noVerdictReason: 'interrupted',
      closedBy: 'recovery',
      failingWhenStopped: false,
      supplyOffConfirmed: false,
      seconds: null,
    });
    expect(await open.db.select().from(measurements).where(eq(measurements.runId, plan.runId))).not.toEqual([]);
    expect(await open.db.select().from(traces).where(eq(traces.runId, plan.runId))).not.toEqual([]);
    expect(await recoverOpenRuns(open.db, () => supplyOff, log)).toBe(0);
    expect(await begin(benches[0]!)).toMatchObject({ ok: true, value: { plan: { attempt: 2 } } });
    await recoverOpenRuns(open.db, () => supplyOff, log);
  });

  test('a reject that was decided but not recorded waits for quality: a power cut launders nothing', async () => {
    const plan = await opened();
    const board = played(plan, { seed: 4, defect: 'feedback-open' });
    const beforeOff = board.events.filter((event) => event.kind !== 'supply-is-off' || event !== board.events.at(-1));
    await appendEvents(open.db, plan.runId, [{ n: 0, events: beforeOff.map((event) => ({ event, during: 'find' })) }]);
    await recoverOpenRuns(open.db, () => supplyOff, log);
    expect(await rowOf(plan.runId)).toMatchObject({ verdict: 'no-verdict', failingWhenStopped: true });
    expect(await begin(benches[0]!)).toMatchObject({ ok: false, refusal: { code: 'board-failing-when-stopped' } });
  });

  test('a record that cannot be replayed is closed all the same', async () => {
    const plan = await opened();
    const spoilt = { ...plan, sequence: { ...plan.sequence, steps: [{ kind: 'unheard-of' }] } };
    await open.db
      .update(runs)
      .set({ plan: spoilt as never })
      .where(eq(runs.id, plan.runId));
    await recoverOpenRuns(open.db, () => supplyOff, log);
    expect(await rowOf(plan.runId)).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'interrupted' });
  });

  test('a run whose opening was never answered is closed when its station asks for the next board', async () => {
    const plan = await opened();
    await closeLostRun(open.db, benches[1]!.id, log);
    expect((await rowOf(plan.runId)).verdict).toBeNull();
    await closeLostRun(open.db, benches[0]!.id, log);
    expect(await rowOf(plan.runId)).toMatchObject({ noVerdictReason: 'interrupted', closedBy: 'recovery' });
  });

  test('a run of which nothing was written yet is closed too', async () => {
    const plan = await opened();
    expect(await recoverOpenRuns(open.db, () => supplyOff, log)).toBe(1);
    expect(await rowOf(plan.runId)).toMatchObject({ verdict: 'no-verdict', supplyOffConfirmed: true });
  });
});

describe('the daily check', () => {
  const code = 'REF-CB1210-1';
  const check = async () => {
    const answer = await begin(benches[1]!, { serial: code });
    if (!answer.ok) throw new Error(JSON.stringify(answer.refusal));
    return answer.value;
  };

  test('finds the reference board’s points without trimming it, and its result counts from now', async () => {
    const { plan, check: known } = await check();
    expect(plan.sequence.steps.map((step) => step.kind)).toEqual(['seat', 'power-up', 'verify', 'record']);
    const board = played(plan, { seed: 9, startTripVolts: known!.tripVolts });
    expect(board.result.verdict).toBe('pass');
    const recorded = await recordRun(open.db, recordOf(plan, board), 'station');
    const [row] = await open.db.select().from(dailyChecks).where(eq(dailyChecks.runId, plan.runId));
    expect(row).toMatchObject({ passed: true, stationId: benches[1]!.id, validHours: 12 });
    expect(Math.abs(row!.tripVolts! - known!.tripVolts)).toBeLessThan(known!.toleranceVolts);
    expect(recorded).toEqual({
      ok: true,
      value: { validUntilIso: new Date(row!.at.getTime() + 12 * 3_600_000).toISOString() },
    });
  });

  test('fails when a point is out of tolerance, and then the station may not test', async () => {
    const { plan, check: known } = await check();
    const board = played(plan, { seed: 9, startTripVolts: known!.tripVolts + 0.1 });
    await recordRun(open.db, recordOf(plan, board), 'station');
    const [row] = await open.db.select().from(dailyChecks).where(eq(dailyChecks.runId, plan.runId));
    expect(row).toMatchObject({ passed: false });
    expect(await begin(benches[1]!)).toMatchObject({ ok: false, refusal: { code: 'daily-check-failed' } });
  });
});

describe('the hash of a closed run', () => {
  test('enters the chain of its station, and shows a measurement that was altered afterwards', async () => {
    const plan = await opened();
    await recordRun(open.db, recordOf(plan, played(plan)), 'station');
    const before = await verifyTrail(open.db, { runs: true });
    expect(before.breaks).toEqual([]);
    expect(before.runs).toBeGreaterThan(0);
    await open.db.execute(sql`alter table measurements disable trigger user`);
    await open.db
      .update(measurements)
      .set({ value: sql`${measurements.value} + 0.001` })
      .where(and(eq(measurements.runId, plan.runId), eq(measurements.n, 0)));
    await open.db.execute(sql`alter table measurements enable trigger user`);
    const [broken] = (await verifyTrail(open.db, { runs: true })).breaks;
    expect(broken).toMatchObject({ chain: benches[0]!.code });
    expect(broken!.sentence).toContain(serial);
  });
});

describe('a hold by rule', () => {
  const reject = async (seed: number) => {
    const boards = await open.db.select().from(units).where(eq(units.lotId, lot.id)).orderBy(units.position);
    serial = boards[used++]!.serial;
    const plan = await opened();
    const play = played(plan, { seed, defect: 'wrong-zener' });
    await recordRun(open.db, recordOf(plan, play), 'station');
    return play.result.rejectReason;
  };

  test('is raised with the run that breaks it, stops the next scan with its reason, and begins afresh after a release', async () => {
    const reasons = [await reject(31), await reject(32)];
    const held = async () => (await open.db.select().from(lots).where(eq(lots.id, lot.id)))[0]!;
    expect((await held()).heldAt).toBeNull();
    reasons.push(await reject(33));
    expect(new Set(reasons).size).toBe(1);
    const { heldAt, heldBy, holdReason } = await held();
    expect(heldAt).not.toBeNull();
    expect(heldBy).toBeNull();
    expect(holdReason).toContain('3 boards in a row');
    const [hold] = await listHolds(open.db, lot.id);
    expect(hold!.hold).toMatchObject({ cause: 'same-reason', detail: { times: 3, reason: reasons[0] } });
    const refused = await begin(benches[0]!);
    expect(refused).toMatchObject({ ok: false });
    expect(JSON.stringify(refused)).toContain('hold');

    const [quality] = await open.db.select().from(accounts).where(eq(accounts.name, 'A. Boyle'));
    const release = { lotId: lot.id, reason: 'Wrong reel of D1 taken off', password: 'gauge jaws demo' };
    const actor = actorOf(quality!);
    expect(await releaseLot(actor, { ...release, password: 'not it' })).toMatchObject({ code: 'wrong-password' });
    expect(await releaseLot(actor, release)).toMatchObject({ ok: true });
    await reject(34);
    expect((await held()).heldAt).toBeNull();
    const [released] = await listHolds(open.db, lot.id);
    expect(released).toMatchObject({ signature: { name: 'A. Boyle' }, hold: { releaseReason: release.reason } });
    await expect(
      open.db.update(lotHolds).set({ reason: 'x' }).where(eq(lotHolds.id, released!.hold.id)),
    ).rejects.toMatchObject({ cause: { code: 'SW002' } });
  });
});
