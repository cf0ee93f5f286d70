import type { Database } from '@/db/client';
import {
  findFirstVerdictAt,
  findLastGoodCheck,
  findOpenHold,
  listPassedSince,
  listPassingStations,
} from '@/db/queries/lot-holds';
import type { HoldDetail } from '@/lib/contracts/lot-hold';
import type { SuspectBoards } from '@/lib/contracts/lot-holds-page';

/**
 * Boards of the lot on hold that passed since the rule's run began, or else since the last good daily check of the station that
 * passed them. Null: the lot is not on hold.
 */
export async function suspectBoards(db: Database, lotId: string): Promise<SuspectBoards | null> {
  const hold = await findOpenHold(db, lotId);
  if (!hold) return null;
  const { detail } = hold;
  const stations = (await listPassingStations(db, lotId)).filter(({ code }) => concerns(detail, code));
  const runFrom = detail?.cause === 'run-rule' ? await findFirstVerdictAt(db, lotId, detail.fromBoard) : null;
  const each = await Promise.all(
    stations.map(async ({ id, code }) => {
      // The board that began the run is suspect itself.
      const from = runFrom ? new Date(runFrom.getTime() - 1) : await findLastGoodCheck(db, id, hold.raisedAt);
      const passed = await listPassedSince(db, { lotId, stationId: id }, from ?? new Date(0));
      return { code, from: runFrom ?? from, passed };
    }),
  );
  return {
    since: runFrom ? 'run' : 'good-check',
    stations: each.map(({ code, from }) => ({ code, fromIso: from?.toISOString() ?? null })),
    boards: each
      .flatMap(({ passed }) => passed)
      .sort((a, b) => a.endedAt.getTime() - b.endedAt.getTime())
      .map(({ serial, stationCode, endedAt }) => ({ serial, stationCode, passedIso: endedAt.toISOString() })),
  };
}

/** A rule that saw boards of one station alone makes only that station's boards suspect. */
function concerns(detail: HoldDetail | null, stationCode: string): boolean {
  const seenAt = detail && 'stationCode' in detail ? detail.stationCode : null;
  return seenAt === null || seenAt === stationCode;
}
