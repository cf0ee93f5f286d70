import type { Transaction } from '@/db/client';
import { insertHold } from '@/db/queries/lot-holds';
import { findLotForUpdate, updateLot } from '@/db/queries/lots';
import { insertTrail } from '@/db/queries/trail';
import type { HoldDetail } from '@/lib/contracts/lot-hold';
import { holdWords } from '@/lib/quality/hold-words';
import { rejectWords } from '@/lib/messages/reject-words';
import type { RejectReason } from '@/lib/run/types';

/** Puts a lot on hold by rule, unless it is already. Its benches hear of it as the transaction commits. */
export async function raiseHold(
  tx: Transaction,
  lotId: string,
  detail: HoldDetail,
  from: { runId: string | null; stationId: string | null },
  at = new Date(),
): Promise<boolean> {
  const lot = await findLotForUpdate(tx, lotId);
  if (!lot || lot.heldAt) return false;
  const reason = holdWords(detail, (code) => rejectWords[code as RejectReason] ?? code);
  await updateLot(tx, lotId, { heldAt: at, heldBy: null, holdReason: reason });
  await insertHold(tx, { lotId, cause: detail.cause, raisedAt: at, reason, detail, runId: from.runId });
  await insertTrail(
    tx,
    { accountId: null, stationId: from.stationId },
    { action: 'lot.held-by-rule', entity: 'lot', entityId: lotId, after: { code: lot.code, ...detail }, reason },
  );
  return true;
}
