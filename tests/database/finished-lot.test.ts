import { like } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { lots } from '@/db/schema/lots';
import { units } from '@/db/schema/units';
import { seedBenches } from '@/db/seed/benches';
import { seedFinishedLot } from '@/db/seed/finished-lot';
import { seedPeople } from '@/db/seed/people';
import { seedProducts } from '@/db/seed/products';
import { readLotPage } from '@/server/operations/lots/read-lot-page';
import { readLotReview } from '@/server/operations/lots/read-lot-review';
import { lotViewSchema } from '@/lib/contracts/lot-view';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

const now = new Date('2026-12-03T00:20:00Z');
let open: TemporaryDatabase;
let code: string;
let milliseconds: number;
beforeAll(async () => {
  open = await temporaryDatabase();
  await open.db.transaction(async (tx) => {
    const people = await seedPeople(tx);
    const products = await seedProducts(tx, people, now);
    await seedBenches(tx, people, products, now);
    const started = performance.now();
    await seedFinishedLot(tx, people, products, now);
    milliseconds = performance.now() - started;
  });
  const [lot] = await open.db.select().from(lots).where(like(lots.code, '%-00'));
  code = lot!.code;
});
afterAll(() => open.close());

describe('the finished lot of the demo', () => {
  it('is written in seconds, ended before today and leaves no run open', async () => {
    expect(milliseconds).toBeLessThan(10_000);
    const made = await open.db.query.runs.findMany({ columns: { endedAt: true, seconds: true } });
    expect(made.every((run) => run.endedAt !== null && run.endedAt < new Date('2026-12-03T00:00:00Z'))).toBe(true);
  });

  it('has eleven rejects, seven of them to decide, and second attempts that passed', async () => {
    const { summary } = (await readLotPage(code))!;
    expect(summary).toMatchObject({
      size: 240,
      tested: 240,
      passedFirst: 217,
      passedLater: 12,
      rejected: 11,
      undecided: 7,
    });
    expect(await open.db.$count(units)).toBe(240);
  });

  it('has passes that meet their guarded limits only', async () => {
    const made = await open.db.query.runs.findMany({ with: { measurements: true } });
    for (const run of made.filter(({ verdict }) => verdict === 'pass'))
      expect(run.measurements.every((measurement) => measurement.passed !== false)).toBe(true);
  });

  it('drifts: rule 2 is quiet up to board 200 and broken from board 201 on', async () => {
    const review = (await readLotReview(code, lotViewSchema.parse({ rules: '2' })))!;
    expect(review.stretches[0]).toMatchObject({ rule: 2, from: 201, side: 'above' });
    expect(review.baseline).toMatchObject({
      kind: 'frozen',
      boards: 30,
      frozenIso: expect.stringMatching(/^2026-12-01T/),
    });
    expect(review.quoted.trip).toMatchObject({ stable: false });
    expect(review.comparison.result).toMatchObject({ kind: 'found' });
  });
});
