import { asc, desc, eq, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { calibrations } from '@/db/schema/calibrations';
import { instruments } from '@/db/schema/instruments';
import { stations } from '@/db/schema/stations';
import type { InstrumentKind } from '@/lib/contracts/stored-states';

export interface InstrumentRow {
  id: string;
  code: string;
  kind: InstrumentKind;
  stationId: string | null;
  stationCode: string | null;
  expectedIdentity: string | null;
  retiredAt: Date | null;
  /** Of the newest certificate; null without one. Days as year-month-day. */
  calibratedOn: string | null;
  dueOn: string | null;
  certificateNumber: string | null;
}

/** All instruments with their newest certificate, those in use first. */
export async function listInstruments(db: Database | Transaction): Promise<InstrumentRow[]> {
  const newest = db
    .selectDistinctOn([calibrations.instrumentId])
    .from(calibrations)
    .orderBy(calibrations.instrumentId, desc(calibrations.calibratedOn), desc(calibrations.enteredAt))
    .as('newest');
  return db
    .select({
      id: instruments.id,
      code: instruments.code,
      kind: instruments.kind,
      stationId: instruments.stationId,
      stationCode: stations.code,
      expectedIdentity: instruments.expectedIdentity,
      retiredAt: instruments.retiredAt,
      calibratedOn: newest.calibratedOn,
      dueOn: newest.dueOn,
      certificateNumber: newest.certificateNumber,
    })
    .from(instruments)
    .leftJoin(stations, eq(stations.id, instruments.stationId))
    .leftJoin(newest, eq(newest.instrumentId, instruments.id))
    .orderBy(sql`${instruments.retiredAt} is not null`, asc(instruments.code));
}

export async function insertInstrument(tx: Transaction, row: typeof instruments.$inferInsert): Promise<{ id: string }> {
  const [made] = await tx.insert(instruments).values(row).returning({ id: instruments.id });
  return made!;
}

export async function findInstrumentForUpdate(tx: Transaction, id: string) {
  const [row] = await tx.select().from(instruments).where(eq(instruments.id, id)).for('update');
  return row ?? null;
}

export async function updateInstrument(
  tx: Transaction,
  id: string,
  change: Partial<typeof instruments.$inferInsert>,
): Promise<void> {
  await tx.update(instruments).set(change).where(eq(instruments.id, id));
}

export async function insertCalibration(
  tx: Transaction,
  row: typeof calibrations.$inferInsert,
): Promise<{ id: string }> {
  const [made] = await tx.insert(calibrations).values(row).returning({ id: calibrations.id });
  return made!;
}

/** Certificates of all instruments, newest first. */
export function listCertificates(db: Database | Transaction, most: number) {
  return db
    .select({
      id: calibrations.id,
      instrumentCode: instruments.code,
      calibratedOn: calibrations.calibratedOn,
      dueOn: calibrations.dueOn,
      certificateNumber: calibrations.certificateNumber,
      enteredByName: accounts.name,
      enteredAt: calibrations.enteredAt,
    })
    .from(calibrations)
    .innerJoin(instruments, eq(instruments.id, calibrations.instrumentId))
    .innerJoin(accounts, eq(accounts.id, calibrations.enteredBy))
    .orderBy(desc(calibrations.calibratedOn), asc(instruments.code))
    .limit(most);
}

export function listStationsInUse(db: Database | Transaction) {
  return db
    .select({ id: stations.id, code: stations.code, name: stations.name })
    .from(stations)
    .where(isNull(stations.retiredAt))
    .orderBy(asc(stations.code));
}
