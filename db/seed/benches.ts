import { eq } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { calibrations } from '@/db/schema/calibrations';
import { commissionings } from '@/db/schema/commissionings';
import { dailyChecks } from '@/db/schema/daily-checks';
import { instruments } from '@/db/schema/instruments';
import { printers } from '@/db/schema/printers';
import { referenceBoards } from '@/db/schema/reference-boards';
import { stations } from '@/db/schema/stations';
import { printCode } from '@/lib/bench/scan-code';
import type { InstrumentKind } from '@/lib/contracts/stored-states';
import { boardTypes } from './board-types';
import { dayOf, daysFrom } from './days';
import type { SeededPeople } from './people';
import type { SeededProducts } from './products';
import { referencePoints } from './reference-points';

export const demoPrinterName = 'Labels, line 1';

interface DemoStation {
  code: string;
  name: string;
  fixture: string;
  /** Also gives the serial number in the simulated instruments' answer to *IDN?. */
  seed: number;
  baudRate: 9_600 | 115_200;
  hasController: boolean;
  hasWiperProbe: boolean;
  calibrationDueInDays: number;
}

const demoStations: readonly DemoStation[] = [
  {
    code: 'S1',
    name: 'Station 1',
    fixture: 'Fixture 12-A',
    seed: 101,
    baudRate: 115_200,
    hasController: true,
    hasWiperProbe: false,
    calibrationDueInDays: 165,
  },
  {
    code: 'S2',
    name: 'Station 2',
    fixture: 'Fixture 12-B, wiper probe',
    seed: 202,
    baudRate: 115_200,
    hasController: true,
    hasWiperProbe: true,
    calibrationDueInDays: 140,
  },
  {
    code: 'S3',
    name: 'Station 3',
    fixture: 'Fixture 12-C, no controller',
    seed: 303,
    baudRate: 9_600,
    hasController: false,
    hasWiperProbe: false,
    calibrationDueInDays: 12,
  },
];

/** Measured on the simulated supply as commissioning would: 5 % overshoot, its peak at 30 ms, within 3 % after 40 ms. */
const commissioned = { overshoot: 0.05, settleMs: 40, waypointMs: 30, noiseVolts: 0.001 };

const instrumentModels: Record<InstrumentKind, { prefix: string; model: string }> = {
  supply: { prefix: 'PS', model: 'SIM-SUPPLY' },
  multimeter: { prefix: 'DM', model: 'SIM-METER' },
  'fixture-controller': { prefix: 'FC', model: 'SIM-FIXTURE' },
};

export async function seedBenches(
  tx: Transaction,
  people: SeededPeople,
  products: SeededProducts,
  now: Date,
): Promise<Record<string, string>> {
  const [printer] = await tx
    .insert(printers)
    .values({ name: demoPrinterName, uri: 'ipp://127.0.0.1:8631/ipp/print' })
    .returning();
  const references = await tx
    .insert(referenceBoards)
    .values(
      boardTypes.map((boardType) => ({
        code: `REF-${boardType.code}-1`,
        boardTypeId: products.boardTypeIds[boardType.code]!,
        ...referencePoints(boardType),
        toleranceVolts: 0.02,
      })),
    )
    .returning();
  const reference = references[0]!;

  const stationIds: Record<string, string> = {};
  for (const demo of demoStations) {
    const { code, name, fixture, seed, baudRate, hasController, hasWiperProbe } = demo;
    const [station] = await tx
      .insert(stations)
      .values({
        code,
        name,
        fixture,
        hasWiperProbe,
        link: { kind: 'simulated', seed, baudRate, hasController },
        binCode: printCode('bin', code),
        printerId: printer!.id,
      })
      .returning();
    stationIds[code] = station!.id;
    await seedInstruments(tx, demo, station!.id, people, now);
    await tx.insert(commissionings).values({
      stationId: station!.id,
      referenceBoardId: reference.id,
      ...commissioned,
      at: daysFrom(now, -20),
      validUntil: daysFrom(now, 70),
      byAccountId: people.engineerId,
    });
    await tx.insert(dailyChecks).values({
      stationId: station!.id,
      referenceBoardId: reference.id,
      tripVolts: reference.tripVolts + 0.001,
      releaseVolts: reference.releaseVolts - 0.001,
      passed: true,
      at: new Date(now.getTime() - 40 * 60_000),
      validHours: 12,
      byAccountId: people.engineerId,
    });
  }
  return stationIds;
}

async function seedInstruments(
  tx: Transaction,
  { code, seed, hasController, calibrationDueInDays }: DemoStation,
  stationId: string,
  people: SeededPeople,
  now: Date,
): Promise<void> {
  const kinds: InstrumentKind[] = hasController
    ? ['supply', 'multimeter', 'fixture-controller']
    : ['supply', 'multimeter'];
  const rows = await tx
    .insert(instruments)
    .values(
      kinds.map((kind) => ({
        code: `${instrumentModels[kind].prefix}-${code.slice(1).padStart(3, '0')}`,
        kind,
        stationId,
        expectedIdentity: `SILLWRIGHT,${instrumentModels[kind].model},${100_000 + seed},1.0`,
      })),
    )
    .returning();
  await tx.insert(calibrations).values(
    rows
      .filter((row) => row.kind !== 'fixture-controller')
      .map((row) => ({
        instrumentId: row.id,
        calibratedOn: dayOf(daysFrom(now, calibrationDueInDays - 365)),
        dueOn: dayOf(daysFrom(now, calibrationDueInDays)),
        certificateNumber: `HM-${row.code}-${dayOf(now).slice(2, 4)}`,
        enteredBy: people.engineerId,
      })),
  );
}

/** Where the demo's own label printer listens this time. Does nothing without it. */
export async function setDemoPrinterAddress(db: Database, uri: string): Promise<void> {
  await db.update(printers).set({ uri }).where(eq(printers.name, demoPrinterName));
}
