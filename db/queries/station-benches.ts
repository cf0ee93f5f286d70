import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { instruments } from '@/db/schema/instruments';
import { stations } from '@/db/schema/stations';
import type { InstrumentKind, StationScheme } from '@/lib/contracts/stored-states';

export interface BenchInstrument {
  kind: InstrumentKind;
  code: string;
  commandSet: string;
  /** The whole answer to *IDN? that it must give. Null: any. */
  expectedIdentity: string | null;
}

export type BenchRow = typeof stations.$inferSelect & { instruments: BenchInstrument[] };

/** Every station in use with the instruments standing on it. */
export async function listBenches(db: Database | Transaction): Promise<BenchRow[]> {
  const rows = await db.select().from(stations).where(isNull(stations.retiredAt)).orderBy(asc(stations.code));
  const standing = await db.select().from(instruments).where(isNull(instruments.retiredAt));
  return rows.map((station) => ({
    ...station,
    instruments: standing.filter((each) => each.stationId === station.id),
  }));
}

export async function findBenchByCode(db: Database, code: string): Promise<typeof stations.$inferSelect | null> {
  const [row] = await db
    .select()
    .from(stations)
    .where(and(eq(stations.code, code), isNull(stations.retiredAt)));
  return row ?? null;
}

export async function updateStationScheme(db: Database, stationId: string, scheme: StationScheme): Promise<void> {
  await db.update(stations).set({ scheme }).where(eq(stations.id, stationId));
}

/** Null: no printer is chosen for the station. */
export async function findStationPrinter(tx: Transaction, stationId: string): Promise<string | null> {
  const [row] = await tx.select({ printerId: stations.printerId }).from(stations).where(eq(stations.id, stationId));
  return row?.printerId ?? null;
}
