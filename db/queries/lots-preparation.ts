import { and, asc, eq, gt, isNull, sql } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { commissionings } from '@/db/schema/commissionings';
import { lots } from '@/db/schema/lots';
import { stations } from '@/db/schema/stations';

/** What a first lot needs, as far as it is there. */
export async function findLotPreparation(
  db: Database,
): Promise<{ anyLot: boolean; boardType: string | null; station: string | null }> {
  const [[lot], [type], [station]] = await Promise.all([
    db.select({ id: lots.id }).from(lots).limit(1),
    db
      .select({ code: boardTypes.code })
      .from(boardTypeRevisions)
      .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
      .where(eq(boardTypeRevisions.status, 'approved'))
      .orderBy(asc(boardTypes.code))
      .limit(1),
    db
      .select({ code: stations.code })
      .from(commissionings)
      .innerJoin(stations, eq(stations.id, commissionings.stationId))
      .where(and(gt(commissionings.validUntil, sql`now()`), isNull(stations.retiredAt)))
      .orderBy(asc(stations.code))
      .limit(1),
  ]);
  return { anyLot: lot !== undefined, boardType: type?.code ?? null, station: station?.code ?? null };
}
