import { afterAll, beforeAll, expect, test } from 'vitest';
import { listWaitingBoards } from '@/db/queries/rejects';
import { listUnitRecordsById } from '@/db/queries/unit-records';
import { dispositions } from '@/db/schema/dispositions';
import { retestOrders } from '@/db/schema/retest-orders';
import { runs } from '@/db/schema/runs';
import { units } from '@/db/schema/units';
import { rejectFilterSchema } from '@/lib/contracts/reject-list';
import { dispositionKinds } from '@/lib/contracts/stored-states';
import { boardStanding } from '@/lib/decision/board-standing';
import type { RunPlan } from '@/lib/run/types';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { eq } from 'drizzle-orm';
import { insertAccount, insertLot, insertStation } from './records';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

const size = 600;
let open: TemporaryDatabase;
beforeAll(async () => {
  open = await temporaryDatabase();
});
afterAll(() => open.close());

/** Histories of boards, sensible and not: runs with every ending, decisions and orders between them. */
async function insertHistories(): Promise<string[]> {
  const uniform = wichmannHill(20_261_201);
  const one = <T>(of: readonly T[]): T => of[Math.floor(uniform() * of.length)]!;
  const chance = (share: number) => uniform() < share;
  const signer = await insertAccount(open.db, ['quality-manager']);
  const second = await insertAccount(open.db, ['test-engineer']);
  const station = await insertStation(open.db);
  const made = await insertLot(open.db, size);
  const rows = { runs: [], decided: [], ordered: [] } as {
    runs: (typeof runs.$inferInsert)[];
    decided: (typeof dispositions.$inferInsert)[];
    ordered: (typeof retestOrders.$inferInsert)[];
  };
  let minute = 0;
  const now = () => new Date(Date.UTC(2026, 11, 1) + ++minute * 60_000);
  for (const unit of made.units) {
    const count = Math.floor(uniform() * 6);
    let waitingOrder: typeof retestOrders.$inferInsert | null = null;
    for (let attempt = 1; attempt <= count; attempt++) {
      const verdict = one(['pass', 'reject', 'reject', 'no-verdict', 'no-verdict'] as const);
      const id = crypto.randomUUID();
      rows.runs.push({
        id,
        kind: 'production',
        unitId: unit.id,
        lotId: unit.lotId,
        stationId: station.id,
        operatorId: signer.id,
        attempt,
        plan: {} as RunPlan,
        startedAt: now(),
        endedAt: now(),
        verdict,
        rejectReason: verdict === 'reject' ? 'release-too-high' : null,
        noVerdictReason: verdict === 'no-verdict' ? 'operator-stop' : null,
        failingWhenStopped: verdict === 'no-verdict' && chance(0.3),
        closedBy: 'station',
      });
      // An order serves the next run, and the ones after it until one gives a verdict.
      if (waitingOrder) {
        waitingOrder.usedByRunId = id;
        if (verdict !== 'no-verdict') waitingOrder = null;
      }
      if (chance(0.35)) {
        const kind = one(dispositionKinds);
        const complete = kind === 'concession' && chance(0.5);
        const signedAt = now();
        rows.decided.push({
          unitId: unit.id,
          runId: id,
          kind,
          action: 'R14 changed',
          reason: 'x',
          signedBy: signer.id,
          signedAt,
          secondSignedBy: complete ? second.id : null,
          secondSignedAt: complete ? signedAt : null,
        });
      }
      if (!waitingOrder && chance(0.15)) {
        waitingOrder = { unitId: unit.id, reason: 'x', signedBy: signer.id, signedAt: now(), usedByRunId: null };
        rows.ordered.push(waitingOrder);
      }
    }
  }
  await open.db.insert(runs).values(rows.runs);
  await open.db.insert(dispositions).values(rows.decided);
  await open.db.insert(retestOrders).values(rows.ordered);
  await open.db.update(units).set({ scrappedAt: now() }).where(eq(units.id, made.units[1]!.id));
  return made.units.map((unit) => unit.id);
}

test('the list of rejects holds exactly the boards whose record asks for a decision', async () => {
  const ids = await insertHistories();
  const records = await listUnitRecordsById(open.db, ids);
  const wanted = records.filter((record) =>
    ['needs-disposition', 'waits-for-quality'].includes(boardStanding(record).kind),
  );
  const filter = rejectFilterSchema.parse({ sort: 'serial', order: 'rising' });
  const { boards, total } = await listWaitingBoards(open.db, filter, size);
  const serials = (of: readonly { serial: string }[]) => of.map(({ serial }) => serial).sort();
  expect(serials(boards)).toEqual(serials(wanted));
  expect(total).toBe(wanted.length);
  // Both ways of waiting are among them, and boards that do not wait.
  expect(new Set(wanted.map((record) => boardStanding(record).kind)).size).toBe(2);
  expect(wanted.length).toBeGreaterThan(100);
  expect(wanted.length).toBeLessThan(size - 100);
  const pages = [1, 2, 3].map((page) => listWaitingBoards(open.db, { ...filter, page }, 40));
  const paged = (await Promise.all(pages)).flatMap((page) => page.boards);
  expect(paged.map(({ serial }) => serial)).toEqual(boards.slice(0, 120).map(({ serial }) => serial));
});
