import { listHolds } from '@/db/queries/lot-holds';
import { findLotByCode } from '@/db/queries/lots';
import type { LotHoldsPage } from '@/lib/contracts/lot-holds-page';
import { database } from '@/server/postgres';
import { shownSignature } from '../signatures/shown-signature';
import { suspectBoards } from './suspect-boards';

/** Every hold of a lot with its release, and the boards that are suspect now; null when there is no such lot. */
export async function readLotHolds(code: string): Promise<LotHoldsPage | null> {
  const db = database();
  const lot = await findLotByCode(db, code.toUpperCase());
  if (!lot) return null;
  const [rows, suspects] = await Promise.all([listHolds(db, lot.id), suspectBoards(db, lot.id)]);
  return {
    code: lot.code,
    boardTypeCode: lot.boardTypeCode,
    suspects,
    holds: rows.map(({ hold, raisedByName, signature }) => ({
      id: hold.id,
      cause: hold.cause,
      detail: hold.detail,
      raisedByName,
      raisedIso: hold.raisedAt.toISOString(),
      reason: hold.reason,
      release: hold.releasedAt && {
        reason: hold.releaseReason ?? '',
        iso: hold.releasedAt.toISOString(),
        byName: signature?.name ?? '',
        signature: signature && shownSignature(signature),
      },
    })),
  };
}
