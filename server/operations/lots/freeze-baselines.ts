import type { Database, Transaction } from '@/db/client';
import { hasVerdicts, listFirstValues } from '@/db/queries/baseline-values';
import { getLotBoardType, insertBaselines, listOwnBaselines } from '@/db/queries/chart-baselines';
import { chartQuantities } from '@/lib/contracts/lot-review';
import { boardsOfBaseline, firstBoardsBaseline } from '@/lib/quality/frozen-baseline';

/**
 * Freezes a lot's own limits with its thirtieth first-attempt value, each quantity once; called again it does nothing. In the
 * transaction that closes a run, and when an older lot is read.
 */
export async function freezeBaselines(db: Transaction | Database, lotId: string): Promise<void> {
  const frozen = await listOwnBaselines(db, lotId);
  const missing = chartQuantities.filter((quantity) => !frozen.includes(quantity));
  if (missing.length === 0 || !(await hasVerdicts(db, lotId, boardsOfBaseline))) return;
  const { boardTypeId } = await getLotBoardType(db, lotId);
  const rows: Parameters<typeof insertBaselines>[1][number][] = [];
  for (const quantity of missing) {
    const figures = firstBoardsBaseline(await listFirstValues(db, lotId, quantity, boardsOfBaseline));
    if (figures) rows.push({ quantity, lotId, boardTypeId, ...figures });
  }
  await insertBaselines(db, rows);
}
