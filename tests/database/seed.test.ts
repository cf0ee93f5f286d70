import { eq, isNotNull } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { hasDemoAccounts, isEmpty, seedDemo } from '@/db/seed/demo';
import { demoAccounts, demoPassword } from '@/db/seed/demo-accounts';
import { yearAndWeek } from '@/db/seed/days';
import { accounts } from '@/db/schema/accounts';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { simulatedBoards } from '@/db/schema/simulated-boards';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import { boardTypeSchema } from '@/lib/contracts/board-type';
import { linkHasController, stationLinkSchema } from '@/lib/contracts/station-link';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { sequenceSchema } from '@/lib/sequence/step';
import { findBadge } from '@/server/operations/people/find-badge';
import { signInAtBench } from '@/server/operations/people/sign-in-bench';
import { signInAtDesk } from '@/server/operations/people/sign-in-desk';
import { drawBoard, makeReferenceBoard } from '@/stations/simulation/draw-board';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

const now = new Date();
let open: TemporaryDatabase;
beforeAll(async () => {
  open = await temporaryDatabase();
  expect(await isEmpty(open.db)).toBe(true);
  const both = await Promise.all([seedDemo(open.db, now), seedDemo(open.db, now)]);
  expect(both.sort()).toEqual([false, true]);
});
afterAll(() => open.close());

describe('the demo', () => {
  test('is seeded once, and told apart from an empty database', async () => {
    expect(await isEmpty(open.db)).toBe(false);
    expect(await hasDemoAccounts(open.db)).toBe(true);
    expect(await seedDemo(open.db, now)).toBe(false);
    expect(await open.db.$count(accounts)).toBe(demoAccounts.length);
  });

  test.each(demoAccounts)('lets $name sign in as printed at start', async (person) => {
    if (person.email)
      expect(await signInAtDesk({ email: person.email, password: demoPassword })).toMatchObject({ ok: true });
    if (!person.badgeNumber || !person.pin) return;
    const badge = await findBadge({ badgeCode: `SWB-${person.badgeNumber}`, byHand: false });
    if (!badge.ok) throw new Error(badge.code);
    const station = await open.db.query.stations.findFirst();
    const signedIn = await signInAtBench({
      stationId: station!.id,
      accountId: badge.value.accountId,
      digits: person.pin,
    });
    expect(signedIn).toMatchObject({ ok: true, value: { name: person.name } });
  });

  test('has a lot of 24 boards with seven different defects, all of which can be drawn', async () => {
    const boards = await open.db
      .select({ serial: units.serial, seed: simulatedBoards.seed, defect: simulatedBoards.defect })
      .from(units)
      .innerJoin(lots, eq(lots.id, units.lotId))
      .innerJoin(simulatedBoards, eq(simulatedBoards.serial, units.serial))
      .where(eq(lots.code, `${yearAndWeek(now)}-01`));
    expect(boards).toHaveLength(24);
    const defective = boards.filter((board) => board.defect !== 'none');
    expect(defective).toHaveLength(7);
    expect(new Set(defective.map((board) => board.defect)).size).toBe(7);
    for (const { seed, defect } of boards) expect(drawBoard(boardTypes[0]!, seed, defect).defect).toBe(defect);
  });

  test('numbers every board as its type asks', async () => {
    const rows = await open.db.query.units.findMany({ with: { lot: { with: { boardTypeRevision: true } } } });
    expect(rows.length).toBeGreaterThan(300);
    for (const { serial, lot } of rows)
      expect(serial).toMatch(new RegExp(lot.boardTypeRevision.specification.serialPattern));
  });

  test('has specifications and sequences that their schemas take, released by another than their maker', async () => {
    const specifications = await open.db.query.boardTypeRevisions.findMany();
    expect(specifications).toHaveLength(3);
    for (const row of specifications) expect(boardTypeSchema.parse(row.specification)).toEqual(row.specification);
    const revisions = await open.db.query.sequenceRevisions.findMany();
    for (const row of revisions) {
      expect(sequenceSchema.parse(row.data)).toEqual(row.data);
      const released = row.status === 'released' || row.status === 'superseded';
      expect(row.releasedBy !== null).toBe(released);
      expect(row.releasedBy).not.toBe(row.madeBy);
    }
  });

  test('has a sequence with a history: superseded, in use by its lots, and a draft with one warning', async () => {
    const sequence = await open.db.query.sequences.findFirst({ where: eq(sequences.name, 'CB1210 cutoff trim') });
    const revisions = await open.db.query.sequenceRevisions.findMany({
      where: eq(sequenceRevisions.sequenceId, sequence!.id),
      orderBy: sequenceRevisions.number,
    });
    expect(revisions.map(({ status }) => status)).toEqual(['superseded', 'released', 'draft']);
    const findings = checkSequence(revisions[2]!.data, boardTypes[0]!);
    expect(findings.map(({ severity }) => severity)).toEqual(['warning']);
    const pinned = await open.db.query.lots.findMany({ where: eq(lots.sequenceRevisionId, revisions[1]!.id) });
    expect(pinned.length).toBeGreaterThan(0);
  });

  test('has a revision that waits for its release, in which the rules find nothing', async () => {
    const [row] = await open.db.query.sequenceRevisions.findMany({
      where: eq(sequenceRevisions.status, 'submitted'),
      with: { sequence: { with: { boardType: true } } },
    });
    const boardType = boardTypes.find(({ code }) => code === row!.sequence.boardType.code)!;
    expect(checkSequence(row!.data, boardType)).toEqual([]);
  });

  test('has three simulated stations, one of them without controller, and a sequence that it can run', async () => {
    const rows = await open.db.query.stations.findMany({ orderBy: stations.code });
    for (const row of rows) expect(stationLinkSchema.parse(row.link)).toEqual(row.link);
    expect(rows.map((row) => linkHasController(row.link))).toEqual([true, true, false]);
    const revisions = await open.db.query.sequenceRevisions.findMany();
    const kinds = revisions.map((row) => row.data.steps.map((step) => step.kind));
    expect(kinds.some((steps) => !steps.includes('ride-through'))).toBe(true);
  });

  test('has every supply and meter in calibration, every station commissioned and checked today', async () => {
    const instruments = await open.db.query.instruments.findMany({ with: { calibrations: true } });
    const calibrated = instruments.filter((row) => row.kind !== 'fixture-controller');
    expect(calibrated).toHaveLength(6);
    for (const { calibrations } of calibrated)
      expect(calibrations[0]!.dueOn > now.toISOString().slice(0, 10)).toBe(true);
    for (const row of await open.db.query.commissionings.findMany())
      expect(row.validUntil.getTime()).toBeGreaterThan(now.getTime());
    for (const row of await open.db.query.dailyChecks.findMany())
      expect(row.at.getTime() + row.validHours * 3_600_000).toBeGreaterThan(now.getTime());
  });

  test('has reference boards that can be made with their known points', async () => {
    const rows = await open.db.query.referenceBoards.findMany({ with: { boardType: true } });
    expect(rows).toHaveLength(3);
    for (const { boardType, tripVolts, releaseVolts } of rows) {
      const specification = boardTypes.find((type) => type.code === boardType.code)!;
      expect(makeReferenceBoard(specification, { tripVolts, releaseVolts }).defect).toBe('none');
      expect(tripVolts).toBeGreaterThanOrEqual(specification.limits.tripVolts.min);
      expect(tripVolts).toBeLessThanOrEqual(specification.limits.tripVolts.max);
    }
  });

  test('counts as holding demo accounts while one of them still works, at a desk or at a bench', async () => {
    await open.db.update(accounts).set({ disabledAt: now }).where(isNotNull(accounts.email));
    expect(await hasDemoAccounts(open.db)).toBe(true);
    await open.db.update(accounts).set({ disabledAt: now });
    expect(await hasDemoAccounts(open.db)).toBe(false);
  });
});
