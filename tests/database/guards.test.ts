import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { isUniqueViolation, postgresErrorOf } from '@/db/errors';
import { accounts } from '@/db/schema/accounts';
import { dispositions } from '@/db/schema/dispositions';
import { measurements } from '@/db/schema/measurements';
import { runEvents } from '@/db/schema/run-events';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sessions } from '@/db/schema/sessions';
import { stations } from '@/db/schema/stations';
import { traces } from '@/db/schema/traces';
import { trail } from '@/db/schema/trail';
import type { RunPlan } from '@/lib/run/types';
import { listen } from '@/server/postgres';
import { insertAccount, insertLot, insertStation } from './records';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

let open: TemporaryDatabase;
beforeAll(async () => {
  open = await temporaryDatabase();
});
afterAll(() => open.close());

/** The SQLSTATE with which PostgreSQL refused, or null when it did not. */
async function refusal(query: Promise<unknown>): Promise<string | null> {
  try {
    await query;
    return null;
  } catch (error) {
    return postgresErrorOf(error)?.code ?? `not from PostgreSQL: ${String(error)}`;
  }
}

async function startedRun(over: Partial<typeof runs.$inferInsert> = {}) {
  const { lot, units } = await insertLot(open.db);
  const station = await insertStation(open.db);
  const operator = await insertAccount(open.db, ['operator']);
  const [run] = await open.db
    .insert(runs)
    .values({
      kind: 'production',
      unitId: units[0]!.id,
      lotId: lot.id,
      stationId: station.id,
      operatorId: operator.id,
      attempt: 1,
      plan: {} as RunPlan,
      ...over,
    })
    .returning();
  return { run: run!, lot, units, station, operator };
}

const rejected = {
  endedAt: new Date(),
  verdict: 'reject',
  rejectReason: 'release-too-high',
  closedBy: 'station',
  supplyOffConfirmed: true,
} as const;

async function closedRun() {
  const started = await startedRun();
  const { id } = started.run;
  await open.db.insert(runEvents).values({ runId: id, n: 0, batch: [] });
  await open.db.insert(traces).values({ runId: id, n: 0, kind: 'trim', atMs: [0], volts: [9], output: [1] });
  await open.db
    .insert(measurements)
    .values({ runId: id, n: 0, quantity: 'trip-volts', phase: 'verified', value: 9, stepIndex: 3 });
  await open.db.update(runs).set(rejected).where(eq(runs.id, id));
  return started;
}

describe('a run', () => {
  test('is the only open one of its station', async () => {
    const { station, operator } = await startedRun();
    const other = await insertLot(open.db);
    const second = open.db.insert(runs).values({
      kind: 'production',
      unitId: other.units[0]!.id,
      lotId: other.lot.id,
      stationId: station.id,
      operatorId: operator.id,
      attempt: 1,
      plan: {} as RunPlan,
    });
    await expect(second).rejects.toSatisfy((e) => isUniqueViolation(e, 'runs_one_open_per_station'));
  });

  test('is the only open one of its unit, and the next may start once it ended', async () => {
    const { run, units, lot, operator } = await startedRun();
    const elsewhere = await insertStation(open.db);
    const again = () =>
      open.db.insert(runs).values({
        kind: 'production',
        unitId: units[0]!.id,
        lotId: lot.id,
        stationId: elsewhere.id,
        operatorId: operator.id,
        attempt: 2,
        plan: {} as RunPlan,
      });
    await expect(again()).rejects.toSatisfy((e) => isUniqueViolation(e, 'runs_one_open_per_unit'));
    await open.db.update(runs).set(rejected).where(eq(runs.id, run.id));
    await again();
  });

  test('ends with a verdict and, when rejected, with a reason', async () => {
    const { run } = await startedRun();
    const end = (set: Partial<typeof runs.$inferInsert>) =>
      refusal(open.db.update(runs).set(set).where(eq(runs.id, run.id)));
    expect(await end({ endedAt: new Date() })).toBe('23514');
    expect(await end({ ...rejected, rejectReason: null })).toBe('23514');
    expect(await end({ ...rejected, verdict: 'pass' })).toBe('23514');
    expect(await end(rejected)).toBeNull();
  });

  test('takes the scan of the red bin once after it closed, and nothing else', async () => {
    const { run } = await closedRun();
    const change = (set: Partial<typeof runs.$inferInsert>) =>
      refusal(open.db.update(runs).set(set).where(eq(runs.id, run.id)));
    expect(await change({ verdict: 'pass', rejectReason: null })).toBe('SW001');
    expect(await change({ binCode: 'BIN', binScannedAt: new Date(), seconds: 1 })).toBe('SW001');
    expect(await change({ binCode: 'BIN', binScannedAt: new Date() })).toBeNull();
    expect(await change({ binCode: 'OTHER', binScannedAt: new Date() })).toBe('SW001');
    expect(await change({ binCode: null, binScannedAt: null })).toBe('SW001');
    expect(await refusal(open.db.delete(runs).where(eq(runs.id, run.id)))).toBe('SW001');
  });

  test.each([
    ['events', runEvents, { runId: '', n: 1, batch: [] }],
    ['traces', traces, { runId: '', n: 1, kind: 'trim', atMs: [], volts: [], output: [] }],
    ['measurements', measurements, { runId: '', n: 1, quantity: 'trip-volts', phase: 'found', value: 1, stepIndex: 0 }],
  ] as const)('keeps its %s as they were when it closed', async (_, table, row) => {
    const { run } = await closedRun();
    expect(await refusal(open.db.insert(table).values({ ...row, runId: run.id } as never))).toBe('SW001');
    expect(await refusal(open.db.update(table).set({ n: 7 }).where(eq(table.runId, run.id)))).toBe('SW001');
    expect(await refusal(open.db.delete(table).where(eq(table.runId, run.id)))).toBe('SW001');
    expect(await refusal(open.db.execute(sql`truncate ${table}`))).toBe('SW002');
    expect(await open.db.$count(table, eq(table.runId, run.id))).toBe(1);
  });

  test('refuses a trace whose arrays differ in length', async () => {
    const { run } = await startedRun();
    const uneven = { runId: run.id, n: 0, kind: 'trim', atMs: [0, 1], volts: [9], output: [1] };
    expect(await refusal(open.db.insert(traces).values(uneven))).toBe('23514');
  });
});

describe('the record', () => {
  test('trail refuses update, delete and truncate', async () => {
    await open.db.insert(trail).values({ action: 'station.retired', entity: 'station', entityId: 'x' });
    expect(await refusal(open.db.update(trail).set({ reason: 'other' }))).toBe('SW002');
    expect(await refusal(open.db.delete(trail))).toBe('SW002');
    expect(await refusal(open.db.execute(sql`truncate trail`))).toBe('SW002');
  });

  test('a disposition gains one second signature, of another person, and never changes', async () => {
    const { run, units, operator } = await closedRun();
    const quality = await insertAccount(open.db, ['quality-manager']);
    const engineer = await insertAccount(open.db, ['test-engineer']);
    const [signed] = await open.db
      .insert(dispositions)
      .values({ unitId: units[0]!.id, runId: run.id, kind: 'concession', reason: 'Within use', signedBy: quality.id })
      .returning();
    const change = (set: Partial<typeof dispositions.$inferInsert>) =>
      refusal(open.db.update(dispositions).set(set).where(eq(dispositions.id, signed!.id)));
    expect(await change({ reason: 'Other' })).toBe('SW002');
    expect(await change({ secondSignedBy: quality.id, secondSignedAt: new Date() })).toBe('23514');
    expect(await change({ secondSignedBy: engineer.id, secondSignedAt: new Date() })).toBeNull();
    expect(await change({ secondSignedBy: operator.id, secondSignedAt: new Date() })).toBe('SW002');
    expect(await refusal(open.db.delete(dispositions))).toBe('SW002');
  });

  test('a released sequence is only withdrawn, and nobody releases their own', async () => {
    const { sequenceRevision } = await insertLot(open.db);
    const change = (set: Partial<typeof sequenceRevisions.$inferInsert>) =>
      refusal(open.db.update(sequenceRevisions).set(set).where(eq(sequenceRevisions.id, sequenceRevision.id)));
    expect(await change({ note: 'rewritten' })).toBe('SW002');
    expect(await change({ status: 'draft' })).toBe('SW002');
    expect(await change({ status: 'withdrawn', withdrawnAt: new Date() })).toBeNull();
    const own = open.db.insert(sequenceRevisions).values({
      sequenceId: sequenceRevision.sequenceId,
      number: 2,
      data: sequenceRevision.data,
      status: 'released',
      madeBy: sequenceRevision.madeBy,
      releasedBy: sequenceRevision.madeBy,
      releasedAt: new Date(),
    });
    expect(await refusal(own)).toBe('23514');
  });
});

describe('sessions', () => {
  async function session(accountId: string, stationId: string | null = null) {
    const [row] = await open.db
      .insert(sessions)
      .values({
        accountId,
        stationId,
        kind: stationId ? 'bench' : 'desk',
        expiresAt: new Date(Date.now() + 3_600_000),
      })
      .returning();
    return row!.id;
  }

  /** Ids told on `session_ended` while `act` ran. */
  async function toldWhile(act: () => Promise<unknown>, expected: number): Promise<string[]> {
    const told: string[] = [];
    const listener = await listen('session_ended', (id) => told.push(id), undefined, open.url);
    try {
      await act();
      await expect.poll(() => told.length, { timeout: 5_000 }).toBe(expected);
      return told;
    } finally {
      await listener.close();
    }
  }

  test('end and are told when the account is disabled', async () => {
    const person = await insertAccount(open.db, ['operator']);
    const ids = [await session(person.id), await session(person.id)];
    const told = await toldWhile(
      () => open.db.update(accounts).set({ disabledAt: new Date() }).where(eq(accounts.id, person.id)),
      2,
    );
    expect(told.sort()).toEqual(ids.sort());
  });

  test('end and are told when roles change, and stay when only the name does', async () => {
    const person = await insertAccount(open.db, ['operator', 'test-engineer']);
    const id = await session(person.id);
    await open.db.update(accounts).set({ name: 'Renamed' }).where(eq(accounts.id, person.id));
    expect(await open.db.query.sessions.findFirst({ where: eq(sessions.id, id) })).toMatchObject({ endedAt: null });
    const change = open.db
      .update(accounts)
      .set({ roles: ['operator'] })
      .where(eq(accounts.id, person.id));
    expect(await toldWhile(() => change.then(), 1)).toEqual([id]);
  });

  test('end and are told when the station is retired', async () => {
    const person = await insertAccount(open.db, ['operator']);
    const station = await insertStation(open.db);
    const id = await session(person.id, station.id);
    const retire = open.db.update(stations).set({ retiredAt: new Date() }).where(eq(stations.id, station.id));
    expect(await toldWhile(() => retire.then(), 1)).toEqual([id]);
  });
});
