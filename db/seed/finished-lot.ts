import { randomUUID } from 'node:crypto';
import { eq, inArray } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { commissionings } from '@/db/schema/commissionings';
import { dispositions } from '@/db/schema/dispositions';
import { labels } from '@/db/schema/labels';
import { lotComponents } from '@/db/schema/lot-components';
import { lots } from '@/db/schema/lots';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { simulatedBoards } from '@/db/schema/simulated-boards';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import type { RunPlan } from '@/lib/run/types';
import { cb1210 } from './board-types';
import { daysFrom, yearAndWeek } from './days';
import { driftingBoards, drawDriftingBoards, type DemoAttempt, type DemoBoard } from './drifting-boards';
import { insertOwnBaselines } from './finished-lot-baselines';
import { boardsPerDay, endOfDay, hourMs, minuteMs, testedAt } from './finished-lot-times';
import type { SeededPeople } from './people';
import type { SeededProducts } from './products';

const firstNumber = 601;

/** A finished lot of yesterday and the day before, whose trip points rise from board 201 on; rejects wait for quality. */
export async function seedFinishedLot(
  tx: Transaction,
  people: SeededPeople,
  products: SeededProducts,
  now: Date,
): Promise<void> {
  const firstDay = daysFrom(new Date(Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), now.getUTCDate())), -2);
  const createdAt = new Date(firstDay.getTime() - 9 * hourMs);
  const week = yearAndWeek(now);
  const sequenceRevisionId = products.sequenceRevisionIds['CB1210 cutoff trim']!;
  const [lot] = await tx
    .insert(lots)
    .values({
      code: `${week}-00`,
      boardTypeRevisionId: products.boardTypeRevisionIds[cb1210.code]!,
      sequenceRevisionId,
      size: driftingBoards,
      createdBy: people.qualityId,
      createdAt,
    })
    .returning();
  const boards = drawDriftingBoards();
  const made = await tx
    .insert(units)
    .values(
      boards.map(({ place }) => ({
        serial: `${cb1210.code}${week}${String(firstNumber + place - 1).padStart(5, '0')}`,
        lotId: lot!.id,
        position: place,
      })),
    )
    .returning();
  await tx
    .insert(simulatedBoards)
    .values(made.map(({ serial, position }) => ({ serial, seed: position, defect: 'none' as const })));
  const batch = (component: string, name: string, fromAt: Date) => ({
    lotId: lot!.id,
    component,
    batch: name,
    fromAt,
    byAccountId: people.qualityId,
  });
  await tx
    .insert(lotComponents)
    .values([
      batch('D1 reference', 'Z-2207', createdAt),
      batch('RV1 trimmer', 'T-0411', createdAt),
      batch('RV1 trimmer', 'T-0418', new Date(firstDay.getTime() + 12 * hourMs)),
    ]);
  const bench = await benchesOf(tx, sequenceRevisionId);
  await insertRuns(tx, lot!.id, boards, made, bench, firstDay, people.qualityId);
  await insertOwnBaselines(tx, lot!.id, products.boardTypeIds[cb1210.code]!, boards, firstDay);
}

type Bench = Awaited<ReturnType<typeof benchesOf>>;

async function benchesOf(tx: Transaction, sequenceRevisionId: string) {
  const found = await tx
    .select()
    .from(stations)
    .where(inArray(stations.code, ['S1', 'S2']));
  const operators = await tx
    .select({ id: accounts.id })
    .from(accounts)
    .where(inArray(accounts.name, ['M. Adeyemi', 'P. Castellan', 'S. Novotna']))
    .orderBy(accounts.operatorNumber);
  const [sequence] = await tx.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, sequenceRevisionId));
  const [commissioning] = await tx.select().from(commissionings).limit(1);
  return {
    stations: new Map(found.map((row) => [row.code, row])),
    operators,
    sequence: sequence!,
    commissioning: commissioning!,
  };
}

async function insertRuns(
  tx: Transaction,
  lotId: string,
  boards: readonly DemoBoard[],
  made: readonly (typeof units.$inferSelect)[],
  bench: Bench,
  firstDay: Date,
  qualityId: string,
): Promise<void> {
  const unitOf = new Map(made.map((unit) => [unit.position, unit]));
  const decided: (typeof dispositions.$inferInsert)[] = [];
  const printed: (typeof labels.$inferInsert)[] = [];
  const scrapped: string[] = [];
  const insert = (board: DemoBoard, attempt: DemoAttempt, number: number, endedAt: Date) =>
    insertRun(tx, { lotId, unit: unitOf.get(board.place)!, board, attempt, number, bench, endedAt });
  for (const board of boards) {
    const unit = unitOf.get(board.place)!;
    const attempt = board.attempts[0]!;
    const endedAt = testedAt(firstDay, board.place);
    const runId = await insert(board, attempt, 1, endedAt);
    if (attempt.verdict === 'pass') printed.push(labelOf(unit.id, runId, bench, board, endedAt));
    const decision = decisionOn(board);
    if (!decision) continue;
    const signedAt = new Date(endOfDay(firstDay, board.place).getTime() + board.place * 5_000);
    decided.push({ unitId: unit.id, runId, ...decision, signedBy: qualityId, signedAt });
    if (decision.kind === 'scrap') scrapped.push(unit.id);
  }
  // Reworked boards come again at the end of their day.
  for (const [i, board] of boards.filter(({ attempts }) => attempts.length > 1).entries()) {
    const endedAt = new Date(endOfDay(firstDay, board.place).getTime() + hourMs + i * 2 * minuteMs);
    const runId = await insert(board, board.attempts[1]!, 2, endedAt);
    printed.push(labelOf(unitOf.get(board.place)!.id, runId, bench, board, endedAt));
  }
  await tx.insert(dispositions).values(decided);
  await tx.insert(labels).values(printed);
  if (scrapped.length > 0)
    await tx
      .update(units)
      .set({ scrappedAt: endOfDay(firstDay, driftingBoards) })
      .where(inArray(units.id, scrapped));
}

/** What quality decided so far: rework of everything that was tested again, and of three more; one board is scrap. */
function decisionOn({ place, attempts }: DemoBoard) {
  if (attempts.length > 1)
    return { kind: 'rework' as const, action: reworkOf(attempts[0]!), reason: 'Soldering fault, found by eye' };
  if (place === 22 || place === 38 || place === 65)
    return { kind: 'rework' as const, action: 'Feedback resistor checked and replaced', reason: 'Wrong part fitted' };
  if (place === 89) return { kind: 'scrap' as const, action: '', reason: 'Track lifted, cannot be repaired' };
  return null;
}

const reworkOf = ({ rejectReason }: DemoAttempt) =>
  rejectReason?.startsWith('trim-') ? 'Trimmer RV1 replaced' : 'Joints of U1 and D1 soldered again';

const labelOf = (unitId: string, runId: string, bench: Bench, { station }: DemoBoard, at: Date) => ({
  unitId,
  runId,
  printerId: bench.stations.get(station)!.printerId,
  state: 'printed' as const,
  tries: 1,
  createdAt: at,
  printedAt: new Date(at.getTime() + 2_000),
});

interface DemoRun {
  lotId: string;
  unit: typeof units.$inferSelect;
  board: DemoBoard;
  attempt: DemoAttempt;
  number: number;
  bench: Bench;
  endedAt: Date;
}

/** As a station records: opened, measured, closed. A closed run would take no measurement, and a station has one open run. */
async function insertRun(tx: Transaction, run: DemoRun): Promise<string> {
  const { unit, board, attempt, number, bench, endedAt } = run;
  const id = randomUUID();
  const operator = board.station === 'S1' ? 0 : board.place <= boardsPerDay ? 1 : 2;
  await tx.insert(runs).values({
    id,
    kind: 'production',
    unitId: unit.id,
    lotId: run.lotId,
    stationId: bench.stations.get(board.station)!.id,
    operatorId: bench.operators[operator]!.id,
    attempt: number,
    plan: planOf(id, run),
    startedAt: new Date(endedAt.getTime() - attempt.seconds * 1_000),
  });
  await tx.insert(measurements).values(attempt.measurements.map((each, n) => ({ ...each, runId: id, n })));
  await tx
    .update(runs)
    .set({
      endedAt,
      verdict: attempt.verdict,
      rejectReason: attempt.rejectReason,
      supplyOffConfirmed: true,
      supplyOffVolts: 0.2,
      supplyOffBy: 'meter',
      seconds: attempt.seconds,
      trimRounds: attempt.trimRounds,
      turnsAdvised: attempt.turnsAdvised,
      adjustments: [],
      binCode: attempt.verdict === 'reject' ? bench.stations.get(board.station)!.binCode : null,
      binScannedAt: attempt.verdict === 'reject' ? new Date(endedAt.getTime() + 5_000) : null,
      closedBy: 'station',
    })
    .where(eq(runs.id, id));
  return id;
}

function planOf(runId: string, { unit, number, bench, board }: DemoRun): RunPlan {
  const { overshoot, settleMs, waypointMs, noiseVolts } = bench.commissioning;
  return {
    runId,
    serial: unit.serial,
    attempt: number,
    boardType: cb1210,
    sequence: bench.sequence.data,
    sequenceRevision: `r${bench.sequence.number}`,
    commissioning: { overshoot, settleMs, waypointMs, noiseVolts },
    hasController: true,
    hasWiperProbe: board.station === 'S2',
    pollMs: 250,
    fastLink: true,
    prior: null,
    meter: { gain: 45e-6 / Math.sqrt(3), offsetVolts: (6e-6 * 100) / Math.sqrt(3), resolutionVolts: 1e-4 },
    seed: board.place,
  };
}
