import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { printers } from '@/db/schema/printers';
import { stationEnrolments } from '@/db/schema/station-enrolments';
import { stations } from '@/db/schema/stations';

/* What the administrator sets of stations and printers. What a running station reads is in station.ts. */

export type StationRow = typeof stations.$inferSelect;
export type PrinterRow = typeof printers.$inferSelect;

export async function listStationRows(db: Database) {
  const rows = await db.query.stations.findMany({ with: { printer: true }, orderBy: asc(stations.code) });
  const enrolled = await db
    .select({ stationId: stationEnrolments.stationId, enrolledAt: stationEnrolments.enrolledAt })
    .from(stationEnrolments)
    .where(isNull(stationEnrolments.revokedAt));
  return rows.map((row) => ({
    ...row,
    enrolledBrowsers: enrolled.filter((browser) => browser.stationId === row.id).length,
  }));
}

export async function findStationByCode(db: Database | Transaction, code: string): Promise<StationRow | null> {
  return (await db.query.stations.findFirst({ where: eq(stations.code, code) })) ?? null;
}

export async function insertStation(tx: Transaction, station: typeof stations.$inferInsert): Promise<StationRow> {
  const [row] = await tx.insert(stations).values(station).returning();
  return row!;
}

export async function updateStation(tx: Transaction, id: string, set: Partial<StationRow>): Promise<StationRow> {
  const [row] = await tx.update(stations).set(set).where(eq(stations.id, id)).returning();
  return row!;
}

export async function listPrinters(db: Database): Promise<PrinterRow[]> {
  return db.select().from(printers).orderBy(asc(printers.name));
}

export async function findPrinter(db: Database | Transaction, id: string): Promise<PrinterRow | null> {
  const [row] = await db.select().from(printers).where(eq(printers.id, id));
  return row ?? null;
}

export async function insertPrinter(tx: Transaction, printer: typeof printers.$inferInsert): Promise<PrinterRow> {
  const [row] = await tx.insert(printers).values(printer).returning();
  return row!;
}

export async function updatePrinter(tx: Transaction, id: string, set: Partial<PrinterRow>): Promise<PrinterRow> {
  const [row] = await tx.update(printers).set(set).where(eq(printers.id, id)).returning();
  return row!;
}

/** Codes of the working stations that print on it. */
export async function listStationsOfPrinter(tx: Transaction, printerId: string): Promise<string[]> {
  const rows = await tx
    .select({ code: stations.code })
    .from(stations)
    .where(and(eq(stations.printerId, printerId), isNull(stations.retiredAt)))
    .orderBy(asc(stations.code));
  return rows.map((row) => row.code);
}
