import { and, asc, desc, eq, inArray, isNull } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { dispositions } from '@/db/schema/dispositions';
import { retestOrders } from '@/db/schema/retest-orders';
import { runs } from '@/db/schema/runs';
import { signatures } from '@/db/schema/signatures';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';

/** The unit, locked until the transaction ends, so that two people cannot decide at once. */
export async function findUnitForUpdate(tx: Transaction, unitId: string): Promise<typeof units.$inferSelect | null> {
  const [row] = await tx.select().from(units).where(eq(units.id, unitId)).for('update');
  return row ?? null;
}

/** The units, locked in one order, so that two people who chose overlapping boards wait for each other. */
export function listUnitsForUpdate(
  tx: Transaction,
  unitIds: readonly string[],
): Promise<(typeof units.$inferSelect)[]> {
  return tx
    .select()
    .from(units)
    .where(inArray(units.id, [...unitIds]))
    .orderBy(asc(units.id))
    .for('update');
}

/** A decision with its first signature, null before signatures were bound to what they sign. Locked. */
export async function findDispositionForUpdate(tx: Transaction, id: string) {
  const [row] = await tx
    .select({ disposition: dispositions, serial: units.serial })
    .from(dispositions)
    .innerJoin(units, eq(units.id, dispositions.unitId))
    .where(eq(dispositions.id, id))
    .for('update');
  if (!row) return null;
  const { signatureId } = row.disposition;
  const [first] = signatureId ? await tx.select().from(signatures).where(eq(signatures.id, signatureId)) : [];
  return { ...row, first: first ?? null };
}

export async function insertSecondSignature(
  tx: Transaction,
  dispositionId: string,
  second: { secondSignedBy: string; secondSignedAt: Date; secondSignatureId: string },
): Promise<void> {
  await tx.update(dispositions).set(second).where(eq(dispositions.id, dispositionId));
}

export async function insertDisposition(
  tx: Transaction,
  disposition: typeof dispositions.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(dispositions).values(disposition).returning({ id: dispositions.id });
  return row!;
}

export async function insertRetestOrder(
  tx: Transaction,
  order: typeof retestOrders.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(retestOrders).values(order).returning({ id: retestOrders.id });
  return row!;
}

export async function markScrapped(tx: Transaction, unitId: string, at: Date): Promise<void> {
  await tx
    .update(units)
    .set({ scrappedAt: at })
    .where(and(eq(units.id, unitId), isNull(units.scrappedAt)));
}

/** The newest production run that passed, with the printer of its station now. */
export async function findNewestPass(
  db: Database | Transaction,
  unitId: string,
): Promise<{ runId: string; printerId: string | null } | null> {
  const [row] = await db
    .select({ runId: runs.id, printerId: stations.printerId })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(and(eq(runs.unitId, unitId), eq(runs.kind, 'production'), eq(runs.verdict, 'pass')))
    .orderBy(desc(runs.attempt))
    .limit(1);
  return row ?? null;
}
