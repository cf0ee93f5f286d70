import type { Database, Transaction } from '@/db/client';
import { listFirstValues } from '@/db/queries/baseline-values';
import { getLotBoardType, listEarlierLots } from '@/db/queries/chart-baselines';
import { findLotByCode } from '@/db/queries/lots';
import type { BaselineCandidate, ChartQuantity } from '@/lib/contracts/lot-review';
import { baselineCandidate } from '@/lib/quality/baseline-candidate';
import { database } from '@/server/postgres';

/** Values of one lot that a baseline takes at most; more tell nothing new. */
const mostValues = 1_000;

export const listBaselineValues = (db: Database | Transaction, lotId: string, quantity: ChartQuantity) =>
  listFirstValues(db, lotId, quantity, mostValues);

/** Earlier lots of the board type with enough values, the newest first, each with whether it was stable. Empty for an unknown lot. */
export async function listBaselineCandidates(code: string, quantity: ChartQuantity): Promise<BaselineCandidate[]> {
  const db = database();
  const lot = await findLotByCode(db, code.toUpperCase());
  if (!lot) return [];
  const earlier = await listEarlierLots(db, await getLotBoardType(db, lot.id));
  const candidates = await Promise.all(
    earlier.map(async ({ id, code }) => {
      const found = baselineCandidate(await listBaselineValues(db, id, quantity));
      return found && { lotId: id, code, ...found };
    }),
  );
  return candidates.filter((each) => each !== null);
}
