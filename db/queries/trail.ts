import type { Database, Transaction } from '@/db/client';
import { trail } from '@/db/schema/trail';
import type { Actor } from '@/lib/access/actor';

export interface TrailEntry {
  /** What was done, such as `account.disabled`. */
  action: string;
  entity: string;
  entityId: string;
  before?: Record<string, unknown> | null;
  after?: Record<string, unknown> | null;
  reason?: string | null;
}

/** Adds to the trail, inside the transaction of the change it tells of. `actor` null: the program itself. */
export async function insertTrail(
  tx: Transaction | Database,
  actor: { accountId: Actor['accountId'] | null; stationId: Actor['stationId'] } | null,
  entry: TrailEntry,
): Promise<void> {
  await tx.insert(trail).values({ ...entry, accountId: actor?.accountId ?? null, stationId: actor?.stationId ?? null });
}
