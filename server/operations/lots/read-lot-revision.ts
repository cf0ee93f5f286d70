import { getLotRevision, listLotMoves } from '@/db/queries/lot-moves';
import type { LotRevision } from '@/lib/contracts/lot-page';
import { database } from '@/server/postgres';

/** The revision that a lot pins, a newer one that it could move to, and how it came to it. */
export async function readLotRevision(lotId: string, sequenceRevisionId: string): Promise<LotRevision> {
  const db = database();
  const [revision, moves] = await Promise.all([getLotRevision(db, sequenceRevisionId), listLotMoves(db, lotId)]);
  const { sequenceId, status, withdrawnReason, newerId, newerNumber } = revision;
  return {
    sequenceId,
    status,
    withdrawnReason,
    newer: newerId && newerNumber ? { id: newerId, number: newerNumber } : null,
    moves: moves.map(({ movedAt, movedByName, ...move }) => ({
      ...move,
      byName: movedByName,
      atIso: movedAt.toISOString(),
    })),
  };
}
