import { asc, eq } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { lotComponents } from '@/db/schema/lot-components';
import { stations } from '@/db/schema/stations';

export interface ComponentBatch {
  id: string;
  component: string;
  batch: string;
  fromAt: Date;
  byName: string;
  /** Null: entered at a desk. */
  stationCode: string | null;
}

/** Every batch of the lot in the order in which they came into use. */
export function listComponentBatches(db: Database | Transaction, lotId: string): Promise<ComponentBatch[]> {
  return db
    .select({
      id: lotComponents.id,
      component: lotComponents.component,
      batch: lotComponents.batch,
      fromAt: lotComponents.fromAt,
      byName: accounts.name,
      stationCode: stations.code,
    })
    .from(lotComponents)
    .innerJoin(accounts, eq(accounts.id, lotComponents.byAccountId))
    .leftJoin(stations, eq(stations.id, lotComponents.stationId))
    .where(eq(lotComponents.lotId, lotId))
    .orderBy(asc(lotComponents.fromAt), asc(lotComponents.id));
}

export async function insertComponentBatch(
  tx: Transaction,
  batch: typeof lotComponents.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(lotComponents).values(batch).returning({ id: lotComponents.id });
  return row!;
}
