import { and, asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/schema/board-types';
import { commissionings } from '@/db/schema/commissionings';
import { engineerCalls } from '@/db/schema/engineer-calls';
import { referenceBoards } from '@/db/schema/reference-boards';
import type { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import type { Actor } from '@/lib/access/actor';
import { acknowledgeCall, readOpenCalls } from '@/server/operations/engineering/calls';
import {
  addInstrument,
  changeInstrument,
  readInstruments,
  recordCalibration,
} from '@/server/operations/engineering/instruments';
import { readStationPage } from '@/server/operations/engineering/read-station-page';
import { readStationsOverview } from '@/server/operations/engineering/read-stations';
import { recordDailyCheck } from '@/server/operations/engineering/record-daily-check';
import {
  addReferenceBoard,
  changeReferenceBoard,
  readReferenceBoards,
} from '@/server/operations/engineering/reference-boards';
import { readTrainings, recordTraining } from '@/server/operations/engineering/trainings';
import { insertAccount, insertLot, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf } from './bases';
import { insertRun } from './runs';

let open: TemporaryDatabase;
let engineer: Actor;
let station: typeof stations.$inferSelect;
let boardType: typeof boardTypes.$inferSelect;
beforeAll(async () => {
  open = await temporaryDatabase();
  engineer = actorOf(await insertAccount(open.db, ['test-engineer']));
  station = await insertStation(open.db);
  [boardType] = (await open.db.insert(boardTypes).values({ code: 'CB1210', name: '12 V 10 A' }).returning()) as [
    typeof boardTypes.$inferSelect,
  ];
});
afterAll(() => open.close());

const trailOf = (entity: string, entityId: string) =>
  open.db
    .select()
    .from(trail)
    .where(and(eq(trail.entity, entity), eq(trail.entityId, entityId)))
    .orderBy(asc(trail.id));
const now = new Date('2026-12-01T10:00:00Z');

async function addMeter(code: string, stationId = '') {
  await addInstrument(engineer, { code, kind: 'multimeter', stationId, expectedIdentity: '' });
  return (await readInstruments()).instruments.find((each) => each.code === code)!;
}

describe('instruments', () => {
  it('are added once under a code', async () => {
    await addMeter('DM-001');
    const again = await addInstrument(engineer, {
      code: 'DM-001',
      kind: 'supply',
      stationId: '',
      expectedIdentity: '',
    });
    expect(again).toMatchObject({ ok: false, code: 'instrument-exists', field: 'code' });
  });

  it('show their newest certificate, whatever was recorded last', async () => {
    const { id } = await addMeter('DM-002');
    const certificate = (calibratedOn: string, dueOn: string, certificateNumber: string) =>
      recordCalibration(engineer, { instrumentId: id, calibratedOn, dueOn, certificateNumber }, now);
    expect(await certificate('2026-05-15', '2027-05-15', 'HM-2')).toMatchObject({ ok: true });
    expect(await certificate('2025-05-10', '2026-05-10', 'HM-1')).toMatchObject({ ok: true });
    const { instruments, certificates } = await readInstruments();
    expect(instruments.find((each) => each.id === id)).toMatchObject({
      dueOn: '2027-05-15',
      certificateNumber: 'HM-2',
    });
    expect(certificates.filter((row) => row.instrumentCode === 'DM-002')).toHaveLength(2);
    expect((await trailOf('instrument', id)).map((entry) => entry.action)).toEqual([
      'instrument.added',
      'instrument.calibrated',
      'instrument.calibrated',
    ]);
  });

  it('take no certificate from the future', async () => {
    const { id } = await addMeter('DM-003');
    const form = { instrumentId: id, calibratedOn: '2026-12-02', dueOn: '2027-12-02', certificateNumber: 'x' };
    expect(await recordCalibration(engineer, form, now)).toMatchObject({ ok: false, field: 'calibratedOn' });
  });

  it('leave their station when they are retired', async () => {
    const { id } = await addMeter('DM-004', station.id);
    await changeInstrument(engineer, {
      instrumentId: id,
      stationId: station.id,
      expectedIdentity: 'A,B,C',
      retired: true,
    });
    const after = (await readInstruments()).instruments.find((each) => each.id === id)!;
    expect(after).toMatchObject({ stationCode: null, retiredAt: expect.any(Date) });
  });
});

describe('daily checks', () => {
  it('by hand are judged by the tolerance of the reference board', async () => {
    await addReferenceBoard(engineer, {
      code: 'RB-01',
      boardTypeId: boardType.id,
      tripVolts: 10.8,
      releaseVolts: 12.28,
      toleranceVolts: 0.02,
    });
    const reference = (await readReferenceBoards()).boards.find((each) => each.code === 'RB-01')!;
    const check = (tripVolts: number, releaseVolts: number) =>
      recordDailyCheck(engineer, {
        stationId: station.id,
        referenceBoardId: reference.id,
        tripVolts,
        releaseVolts,
        validHours: 12,
      });
    expect(await check(10.82, 12.26)).toEqual({ ok: true, value: { passed: true } });
    expect(await check(10.821, 12.28)).toEqual({ ok: true, value: { passed: false } });
    const page = (await readStationPage(station.code))!;
    expect(page.dailyChecks.map((each) => each.passed)).toEqual([false, true]);
    expect(page.dailyChecks[0]).toMatchObject({ atBench: false, referenceCode: 'RB-01', toleranceVolts: 0.02 });
  });

  it('are judged by the limits as they are now; a board out of use takes none', async () => {
    const reference = (await readReferenceBoards()).boards.find((each) => each.code === 'RB-01')!;
    const change = { referenceBoardId: reference.id, tripVolts: 10.8, releaseVolts: 12.28, toleranceVolts: 0.03 };
    const check = {
      stationId: station.id,
      referenceBoardId: reference.id,
      tripVolts: 10.825,
      releaseVolts: 12.28,
      validHours: 8,
    };
    await changeReferenceBoard(engineer, { ...change, retired: false });
    expect(await recordDailyCheck(engineer, check)).toMatchObject({ value: { passed: true } });
    expect(await changeReferenceBoard(engineer, { ...change, releaseVolts: 10, retired: false })).toMatchObject({
      ok: false,
      field: 'releaseVolts',
    });
    await changeReferenceBoard(engineer, { ...change, retired: true });
    expect(await recordDailyCheck(engineer, check)).toMatchObject({ ok: false, code: 'reference-unknown' });
    expect((await trailOf('reference-board', reference.id)).at(-1)).toMatchObject({
      action: 'reference.changed',
      before: expect.objectContaining({ toleranceVolts: 0.03, retiredAt: null }),
    });
  });
});

describe('training', () => {
  it('holds through its last day and is recorded by someone else', async () => {
    const operator = await insertAccount(open.db, ['operator']);
    const form = { accountId: operator.id, boardTypeId: boardType.id, validUntil: '2027-03-31' };
    expect(await recordTraining(engineer, form, now)).toEqual({ ok: true, value: null });
    const { people } = await readTrainings();
    const until = new Date(people.find((person) => person.id === operator.id)!.until[boardType.id]!);
    expect(until.getTime()).toBe(new Date('2027-04-01T00:00:00').getTime());
    expect(await recordTraining(actorOf(operator), form, now)).toMatchObject({ ok: false, code: 'training-own' });
  });

  it('that lies in the past is refused beside the day', async () => {
    const operator = await insertAccount(open.db, ['operator']);
    const form = { accountId: operator.id, boardTypeId: boardType.id, validUntil: '2026-11-29' };
    expect(await recordTraining(engineer, form, now)).toMatchObject({ ok: false, field: 'validUntil' });
  });
});

describe('calls for an engineer', () => {
  it('are open until the first who comes, and the wait stands in the trail', async () => {
    const at = new Date('2026-12-01T09:00:00Z');
    await open.db.insert(engineerCalls).values({ stationId: station.id, at });
    const [call] = await readOpenCalls();
    expect(call).toMatchObject({ stationCode: station.code, sinceIso: at.toISOString() });
    expect(await acknowledgeCall(engineer, call!.id, new Date('2026-12-01T09:06:00Z'))).toEqual({
      ok: true,
      value: null,
    });
    expect(await acknowledgeCall(engineer, call!.id)).toMatchObject({ ok: false, code: 'call-over' });
    expect(await readOpenCalls()).toEqual([]);
    expect((await trailOf('station', station.id)).at(-1)).toMatchObject({
      action: 'call.acknowledged',
      after: { waitedSeconds: 360 },
    });
  });
});

describe('the list of stations', () => {
  it('has the most urgent first, each with its reason', async () => {
    const { db } = open;
    const operator = await insertAccount(db, ['operator']);
    const ready = async () => {
      const made = await insertStation(db);
      const [reference] = await db
        .insert(referenceBoards)
        .values({
          code: `RB-${made.code}`,
          boardTypeId: boardType.id,
          tripVolts: 10.8,
          releaseVolts: 12.28,
          toleranceVolts: 0.02,
        })
        .returning();
      for (const kind of ['supply', 'multimeter'] as const) {
        await addInstrument(engineer, {
          code: `${kind.slice(0, 2).toUpperCase()}-${made.code}`,
          kind,
          stationId: made.id,
          expectedIdentity: '',
        });
        const { id } = (await readInstruments()).instruments.find(
          (each) => each.stationId === made.id && each.kind === kind,
        )!;
        const today = new Date();
        const dueOn = new Date(today.getTime() + 90 * 24 * 3_600_000).toISOString().slice(0, 10);
        await recordCalibration(
          engineer,
          { instrumentId: id, calibratedOn: '2026-01-05', dueOn, certificateNumber: 'c' },
          new Date('2027-01-01'),
        );
      }
      const values = { overshoot: 0.05, settleMs: 40, waypointMs: 30, noiseVolts: 0.001 };
      await db.insert(commissionings).values({
        ...values,
        stationId: made.id,
        referenceBoardId: reference!.id,
        validUntil: new Date(Date.now() + 24 * 3_600_000),
        byAccountId: engineer.accountId,
      });
      await recordDailyCheck(engineer, {
        stationId: made.id,
        referenceBoardId: reference!.id,
        tripVolts: 10.8,
        releaseVolts: 12.28,
        validHours: 12,
      });
      return made;
    };
    const [idle, waiting, calling] = [await ready(), await ready(), await ready()];
    const { units } = await insertLot(db, 2);
    const reject = { verdict: 'reject', reason: 'release-too-high' } as const;
    await insertRun(db, {
      unit: units[0]!,
      stationId: waiting.id,
      operatorId: operator.id,
      attempt: 1,
      minute: 0,
      ending: reject,
    });
    await db.insert(engineerCalls).values({ stationId: calling.id });

    const { stations: rows } = await readStationsOverview();
    const of = (id: string) => rows.find((row) => row.id === id)!;
    expect(of(calling.id)).toMatchObject({ state: 'calls', call: { id: expect.any(String) } });
    expect(of(station.id)).toMatchObject({ state: 'may-not-test' });
    expect(of(station.id).reasons.length).toBeGreaterThan(0);
    expect(of(waiting.id)).toMatchObject({
      state: 'waits-for-bin',
      rejectReason: 'release-too-high',
      serial: units[0]!.serial,
    });
    expect(of(waiting.id).lot).toMatchObject({ size: 2, tested: 1, rejected: 1, marks: 'R.' });
    expect(of(idle.id)).toMatchObject({ state: 'idle', reasons: [], lot: null });
    const order = [calling, station, waiting, idle].map((each) => rows.findIndex((row) => row.id === each.id));
    expect(order).toEqual([...order].sort((a, b) => a - b));
    expect(await readStationPage('nowhere')).toBeNull();
  });
});
