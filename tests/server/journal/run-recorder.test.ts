import { randomUUID } from 'node:crypto';
import { appendFile, mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { eq, like } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { openDatabase, type OpenDatabase } from '@/db/client';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import { accounts } from '@/db/schema/accounts';
import { labels } from '@/db/schema/labels';
import { lots } from '@/db/schema/lots';
import { runEvents } from '@/db/schema/run-events';
import { runs } from '@/db/schema/runs';
import { units } from '@/db/schema/units';
import { seedDemo } from '@/db/seed/demo';
import type { RunPlan } from '@/lib/run/types';
import { Journal } from '@/server/journal/journal';
import { RunRecorder } from '@/server/journal/run-recorder';
import { openRun } from '@/server/operations/runs/open-run';
import { recoverOpenRuns } from '@/server/operations/runs/recover-open-runs';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { playBoard } from '../../lib/run/play-board';

let open: TemporaryDatabase;
/** A database that nobody can reach. */
let away: OpenDatabase;
let bench: BenchRow;
let folder: string;
let journal: Journal;
let used = 0;
const log = { warn() {} };

beforeAll(async () => {
  open = await temporaryDatabase();
  away = openDatabase('postgres://nobody@127.0.0.1:1/none');
  await seedDemo(open.db);
  [bench] = (await listBenches(open.db)) as [BenchRow];
});
afterAll(async () => {
  await away.pool.end();
  await open.close();
});
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'sillwright-journal-'));
  journal = new Journal(folder);
  return () => rm(folder, { recursive: true, force: true });
});

async function opened(): Promise<RunPlan> {
  const [operator] = await open.db.select().from(accounts).where(eq(accounts.operatorNumber, '14'));
  const [lot] = await open.db.select().from(lots).where(like(lots.code, '%-02'));
  const boards = await open.db.select().from(units).where(eq(units.lotId, lot!.id)).orderBy(units.position);
  const who = { accountId: operator!.id, sessionId: null, lotId: lot!.id, offerId: null, serial: null };
  const ask = { kind: 'board', serial: boards[used++]!.serial, lotId: lot!.id, offerId: null, byHand: false } as const;
  const answer = await openRun(open.db, bench, ask, who);
  if (!answer.ok) throw new Error(answer.refusal.code);
  return answer.value.plan;
}

const stored = async ({ runId }: RunPlan) => {
  const [run] = await open.db.select().from(runs).where(eq(runs.id, runId));
  const rows = await open.db.select().from(runEvents).where(eq(runEvents.runId, runId)).orderBy(runEvents.n);
  const printed = await open.db.select().from(labels).where(eq(labels.runId, runId));
  return { run: run!, events: rows.flatMap((row) => row.batch), labels: printed.length };
};

/** Writes a played board's events in three gatherings, with a change of mind about the database between them. */
async function keep(recorder: RunRecorder, plan: RunPlan) {
  const board = playBoard(plan, { seed: 3 });
  const kept = recorder.begin(plan);
  const third = Math.ceil(board.events.length / 3);
  for (let from = 0; from < board.events.length; from += third) {
    board.events.slice(from, from + third).forEach((event) => kept.record(event, 'find'));
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  return { board, kept };
}

test('events reach the database while the run goes on, and the file is gone once the run is stored', async () => {
  const plan = await opened();
  const { board, kept } = await keep(new RunRecorder(open.db, journal, log), plan);
  await expect.poll(async () => (await stored(plan)).events.length).toBe(board.events.length);
  expect(await readdir(folder)).toHaveLength(1);
  expect(await kept.close(board.result, 40)).toMatchObject({ stored: true });
  expect(await readdir(folder)).toEqual([]);
  expect((await stored(plan)).run).toMatchObject({ verdict: 'pass', closedBy: 'station' });
});

test('while the database is away the run finishes into the journal, and is stored exactly once when it is back', async () => {
  const plan = await opened();
  const { board, kept } = await keep(new RunRecorder(away.db, journal, log), plan);
  expect(await kept.close(board.result, 40)).toEqual({ stored: false, validUntilIso: null });
  await expect(new RunRecorder(away.db, journal, log).storeEnded()).rejects.toThrow();
  expect((await stored(plan)).run.verdict).toBeNull();

  const back = new RunRecorder(open.db, journal, log);
  await Promise.all([back.storeEnded(), back.storeEnded()]);
  expect(await back.storeEnded()).toBe(0);
  const { run, events, labels: printed } = await stored(plan);
  expect(run).toMatchObject({ verdict: 'pass', closedBy: 'journal', seconds: 40, supplyOffConfirmed: true });
  expect(events).toEqual(board.events);
  expect(printed).toBe(1);
  expect(await readdir(folder)).toEqual([]);
});

test('a program killed in the middle leaves its events in the journal: recovery stores them and closes the run', async () => {
  const plan = await opened();
  const { board, kept } = await keep(new RunRecorder(away.db, journal, log), plan);
  await expect.poll(async () => (await journal.read(plan.runId)).batches.length).toBe(3);
  // A power cut in the middle of a line.
  await appendFile(join(folder, `${plan.runId}.jsonl`), '{"batch":{"n":3,"eve');

  const restarted = new RunRecorder(open.db, new Journal(folder), log);
  expect(await restarted.storeEnded()).toBe(0);
  await restarted.handOverBroken();
  await recoverOpenRuns(open.db, () => ({ confirmed: true, volts: 0.1, by: 'meter' }), log);
  const { run, events } = await stored(plan);
  expect(run).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'interrupted', closedBy: 'recovery' });
  expect(events).toEqual(board.events);
  expect(await readdir(folder)).toEqual([]);
  await kept.close(board.result, 40);
});

test('a program killed between the end of a run and its storing loses neither the verdict nor the label', async () => {
  const plan = await opened();
  const { board, kept } = await keep(new RunRecorder(away.db, journal, log), plan);
  await kept.close(board.result, 40);
  const restarted = new RunRecorder(open.db, new Journal(folder), log);
  expect(await restarted.storeEnded()).toBe(1);
  await restarted.handOverBroken();
  expect(await recoverOpenRuns(open.db, () => ({ confirmed: false }), log)).toBe(0);
  expect(await stored(plan)).toMatchObject({ run: { verdict: 'pass', closedBy: 'journal' }, labels: 1 });
});

test('a database that hangs delays neither the journal nor the bench for long', async () => {
  const plan = await opened();
  const { pool, db } = openDatabase(open.url, 1);
  const holder = await pool.connect();
  const { board, kept } = await keep(new RunRecorder(db, journal, log), plan);
  expect((await journal.read(plan.runId)).batches.flatMap((batch) => batch.events)).toHaveLength(board.events.length);
  expect(await kept.close(board.result, 40)).toMatchObject({ stored: false });
  expect((await journal.read(plan.runId)).ending).toMatchObject({ seconds: 40 });
  holder.release();
  await new RunRecorder(open.db, journal, log).storeEnded();
  expect(await stored(plan)).toMatchObject({ run: { verdict: 'pass' }, labels: 1 });
  await pool.end();
});

test('a run that the database does not know is set aside and holds nobody up', async () => {
  const plan = await opened();
  const { board, kept } = await keep(new RunRecorder(away.db, journal, log), { ...plan, runId: randomUUID() });
  await kept.close(board.result, 40);
  const recorder = new RunRecorder(open.db, journal, log);
  expect(await recorder.storeEnded()).toBe(0);
  expect(await readdir(folder)).toEqual([expect.stringMatching(/\.unclaimed$/)]);
  await recoverOpenRuns(open.db, () => ({ confirmed: false }), log);
});
