import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { listLabelsOfUnit } from '@/db/queries/labels';
import { printers } from '@/db/schema/printers';
import { startFakePrinter, type FakePrinter } from '@/server/files/fake-printer/fake-printer';
import { startLabelSender, type LabelSender } from '@/server/operations/labels/label-sender';
import { printLabel } from '@/server/operations/labels/print-label';
import { retryWaitMs } from '@/server/operations/labels/send-label';
import { insertAccount, insertLot, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { insertRun } from './runs';

let open: TemporaryDatabase;
beforeAll(async () => {
  open = await temporaryDatabase();
});
afterAll(() => open.close());

let folder: string;
let printer: FakePrinter;
let sender: LabelSender | null;
beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'label-sender-'));
  printer = await startFakePrinter({ folder, port: 0 });
  sender = null;
});
afterEach(async () => {
  await sender?.stop();
  await printer.close();
  rmSync(folder, { recursive: true });
});

const kept = () => readdirSync(folder).filter((file) => file.endsWith('.pdf'));
const silent = { warn: () => undefined };

async function passedBoards(count: number) {
  const { db } = open;
  const { units } = await insertLot(db, count);
  const station = await insertStation(db);
  const operator = await insertAccount(db, ['operator']);
  return Promise.all(
    units.map(async (unit, i) => ({
      unit,
      run: await insertRun(db, {
        unit,
        stationId: (await insertStation(db)).id,
        operatorId: operator.id,
        attempt: 1,
        minute: i,
        ending: { verdict: 'pass' },
      }),
      station,
    })),
  );
}

async function insertPrinter(uri: string) {
  const [row] = await open.db
    .insert(printers)
    .values({ name: `Printer at ${uri} ${Math.random()}`, uri })
    .returning();
  return row!;
}

async function until<T>(read: () => Promise<T>, wanted: (value: T) => boolean): Promise<T> {
  const end = Date.now() + 8_000;
  for (;;) {
    const value = await read();
    if (wanted(value) || Date.now() > end) return value;
    await new Promise((resolve) => setTimeout(resolve, 40));
  }
}

const newestLabel = async (unitId: string) => (await listLabelsOfUnit(open.db, unitId))[0]!;

describe('the label sender', () => {
  it('prints what a committed run asked for, in the order of the boards', async () => {
    const boards = await passedBoards(3);
    const { id: printerId } = await insertPrinter(printer.uri);
    for (const { unit, run } of boards)
      await open.db.transaction((tx) => printLabel(tx, { unitId: unit.id, runId: run.id, printerId }));
    sender = startLabelSender({ db: open.db, log: silent, pollMs: 20 });
    const last = await until(
      () => newestLabel(boards[2]!.unit.id),
      (label) => label.state === 'printed',
    );
    expect(last).toMatchObject({ state: 'printed', problem: null, printedAt: expect.any(Date) });
    expect(kept()).toEqual(boards.map(({ unit }, i) => `0000${i + 1}-Label_${unit.serial}.pdf`));
  });

  it('prints nothing for a run that was rolled back', async () => {
    const [board] = await passedBoards(1);
    const { id: printerId } = await insertPrinter(printer.uri);
    const rolledBack = open.db.transaction(async (tx) => {
      await printLabel(tx, { unitId: board!.unit.id, runId: board!.run.id, printerId });
      throw new Error('rolled back');
    });
    await expect(rolledBack).rejects.toThrow('rolled back');
    expect(await listLabelsOfUnit(open.db, board!.unit.id)).toEqual([]);
  });

  it('says that paper is out and prints once it is loaded, exactly once', async () => {
    const [board] = await passedBoards(1);
    const { id: printerId } = await insertPrinter(printer.uri);
    printer.setPaper(false);
    await open.db.transaction((tx) => printLabel(tx, { unitId: board!.unit.id, runId: board!.run.id, printerId }));
    sender = startLabelSender({ db: open.db, log: silent, pollMs: 20 });
    const failed = await until(
      () => newestLabel(board!.unit.id),
      (label) => label.state === 'failed',
    );
    expect(failed.problem).toBe('Label printer is out of paper. Testing goes on.');
    expect(kept()).toEqual([]);
    printer.setPaper(true);
    const printed = await until(
      () => newestLabel(board!.unit.id),
      (label) => label.state === 'printed',
    );
    expect(printed).toMatchObject({ state: 'printed', problem: null });
    expect(kept()).toHaveLength(1);
  });

  it('shared by two servers prints every label once', async () => {
    const boards = await passedBoards(4);
    const { id: printerId } = await insertPrinter(printer.uri);
    for (const { unit, run } of boards)
      await open.db.transaction((tx) => printLabel(tx, { unitId: unit.id, runId: run.id, printerId }));
    sender = startLabelSender({ db: open.db, log: silent, pollMs: 5 });
    const other = startLabelSender({ db: open.db, log: silent, pollMs: 5 });
    await until(
      () => Promise.all(boards.map(({ unit }) => newestLabel(unit.id))),
      (labels) => labels.every((label) => label.state === 'printed'),
    );
    await other.stop();
    expect(kept()).toHaveLength(4);
  });

  it('leaves a label waiting while its station has no printer', async () => {
    const [board] = await passedBoards(1);
    await open.db.transaction((tx) =>
      printLabel(tx, { unitId: board!.unit.id, runId: board!.run.id, printerId: null }),
    );
    sender = startLabelSender({ db: open.db, log: silent, pollMs: 5 });
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(await newestLabel(board!.unit.id)).toMatchObject({ state: 'waiting', problem: null });
  });
});

it('tries again after waits that grow to a minute', () => {
  expect([0, 1, 2, 5, 6, 50].map(retryWaitMs)).toEqual([1_000, 2_000, 4_000, 32_000, 60_000, 60_000]);
});
