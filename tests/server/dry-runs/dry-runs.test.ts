import { eq } from 'drizzle-orm';
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { dryRuns } from '@/db/schema/dry-runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { seedDemo } from '@/db/seed/demo';
import type { Actor } from '@/lib/access/actor';
import { usualDryRun } from '@/lib/contracts/dry-run';
import type { Sequence } from '@/lib/sequence/step';
import { startDryRuns, type DryRuns } from '@/server/dry-runs/start-dry-runs';
import { askDryRun } from '@/server/operations/engineering/dry-runs/ask-dry-run';
import { cancelDryRun } from '@/server/operations/engineering/dry-runs/cancel-dry-run';
import { keepDryRun } from '@/server/operations/engineering/dry-runs/keep-dry-run';
import { readDryRun, readDryRunPage, readNewestDryRun } from '@/server/operations/engineering/dry-runs/read-dry-run';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';

let open: TemporaryDatabase;
let actor: Actor;
let released: typeof sequenceRevisions.$inferSelect;
let draftId: string;
let dryRunner: DryRuns | null = null;

beforeAll(async () => {
  open = await temporaryDatabase();
  await seedDemo(open.db);
  const [engineer] = await open.db.select().from(accounts).where(eq(accounts.name, 'T. Marsden'));
  actor = { accountId: engineer!.id, name: engineer!.name, roles: ['test-engineer'], stationId: null } as never;
  const rows = await open.db.select().from(sequenceRevisions).where(eq(sequenceRevisions.status, 'released'));
  released = rows[0]!;
  await open.db
    .delete(sequenceRevisions)
    .where(eq(sequenceRevisions.status, 'draft'))
    .catch(() => undefined);
  const [draft] = await open.db
    .insert(sequenceRevisions)
    .values({
      sequenceId: released.sequenceId,
      number: 99,
      data: changed(released.data),
      madeBy: actor.accountId,
      version: 4,
    })
    .returning();
  draftId = draft!.id;
}, 60_000);
afterAll(() => open.close());

beforeEach(() => open.db.delete(dryRuns));
afterEach(async () => {
  await dryRunner?.stop();
  dryRunner = null;
});

/** A tighter trim and one repeat less: two changes. */
function changed(sequence: Sequence): Sequence {
  return {
    ...sequence,
    steps: sequence.steps.map((step) =>
      step.kind === 'trim'
        ? { ...step, mostRounds: 5 }
        : step.kind === 'verify'
          ? { ...step, repeats: step.repeats - 1 }
          : step,
    ),
  };
}

const log = { warn: () => undefined };
const start = async () => (dryRunner = await startDryRuns({ db: open.db, log }));
const ask = async (boards: number) => {
  const asked = await askDryRun(actor, draftId, { ...usualDryRun, boards });
  if (!asked.ok) throw new Error(asked.sentence);
  return asked.value;
};

async function until(id: string, fits: (state: string, done: number) => boolean, withinMs = 150_000) {
  const giveUp = Date.now() + withinMs;
  for (;;) {
    const view = (await readDryRun(id))!;
    if (fits(view.state, view.done)) return view;
    if (Date.now() > giveUp) throw new Error(`${view.state} ${view.done} of ${view.of}: ${view.problem}`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

test('draft, released revision and each change alone run on the same boards; the event loop of the server stays free', async () => {
  await start();
  const asked = await ask(20);
  expect(asked).toMatchObject({ state: 'waiting', of: 4 * 20, draftVersion: 4, kept: false });
  const delay = monitorEventLoopDelay({ resolution: 10 });
  delay.enable();
  const view = await until(asked.id, (state) => state === 'done');
  delay.disable();
  // A simulation in this process would hold it for a board at a time, without a pause, for all of the boards.
  expect(delay.percentile(90) / 1e6).toBeLessThan(100);
  const { draft, released: old, pair, changesAlone } = view.result!;
  expect(view.done).toBe(80);
  expect(draft.firstPass.of + draft.noVerdict).toBe(20);
  expect(old!.firstPass.of + old!.noVerdict).toBe(20);
  expect(pair!.difference.value).toBeCloseTo((pair!.onlyDraft - pair!.onlyReleased) / 20, 12);
  expect(changesAlone.map(({ words }) => words)).toEqual(['Most rounds 8 → 5', 'Repeats 3 → 2']);
  expect(draft.boardSeconds).toBeLessThan(old!.boardSeconds);
}, 200_000);

test('a cancelled one ends within a second and keeps what it found; another may be asked for', async () => {
  await start();
  const asked = await ask(20_000);
  await until(asked.id, (state, done) => state === 'running' && done > 0);
  expect(await askDryRun(actor, draftId, usualDryRun)).toMatchObject({ ok: false, code: 'dry-run-at-work' });
  const before = Date.now();
  expect(await cancelDryRun(actor, asked.id)).toMatchObject({ ok: true });
  const next = await ask(20);
  expect(await readDryRun(asked.id)).toBeNull();
  await until(next.id, (state) => state === 'running', 10_000);
  expect(Date.now() - before).toBeLessThan(5_000);
}, 200_000);

test('what a server leaves running begins again with the next one; one that waits is taken up', async () => {
  const asked = await ask(20);
  await start();
  await until(asked.id, (state) => state === 'running');
  await dryRunner!.stop();
  expect(await readDryRun(asked.id)).toMatchObject({ state: 'waiting', done: 0, result: null });
  // As after a crash, which puts nothing back.
  await open.db.update(dryRuns).set({ state: 'running' }).where(eq(dryRuns.id, asked.id));
  await start();
  await until(asked.id, (_, done) => done > 0);
}, 200_000);

test('only one that is done is kept; it outlives the next, which replaces the ones that are not', async () => {
  const first = await ask(20);
  expect(await keepDryRun(actor, first.id, true)).toMatchObject({ ok: false, code: 'dry-run-not-done' });
  await open.db.update(dryRuns).set({ state: 'done' }).where(eq(dryRuns.id, first.id));
  expect(await keepDryRun(actor, first.id, true)).toMatchObject({ ok: true });
  const second = await ask(20);
  await cancelDryRun(actor, second.id);
  const third = await ask(20);
  const left = await open.db.select({ id: dryRuns.id }).from(dryRuns);
  expect(new Set(left.map(({ id }) => id))).toEqual(new Set([first.id, third.id]));
  expect(await readNewestDryRun(draftId)).toMatchObject({ id: third.id });
  expect(await readDryRunPage(first.id)).toMatchObject({ revisionId: draftId, view: { kept: true } });
});

test('a draft with errors is not simulated', async () => {
  const steps = released.data.steps.map((step) => (step.kind === 'power-up' ? { ...step, volts: 30 } : step));
  const [saved] = await open.db.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, draftId));
  await open.db
    .update(sequenceRevisions)
    .set({ data: { ...saved!.data, steps } })
    .where(eq(sequenceRevisions.id, draftId));
  expect(await askDryRun(actor, draftId, usualDryRun)).toMatchObject({ ok: false, code: 'sequence-has-errors' });
  await open.db.update(sequenceRevisions).set({ data: saved!.data }).where(eq(sequenceRevisions.id, draftId));
});
