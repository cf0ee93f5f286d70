import type { Transaction } from '@/db/client';
import { findReasonCode } from '@/db/queries/reason-codes';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { ReasonCodeUse } from '@/lib/contracts/stored-states';

export interface ChosenReason {
  reasonCodeId: string | null;
  /** The word as it is now; records keep it. */
  reasonWord: string | null;
  /** Word and free words in one sentence, as people read it. */
  reason: string;
}

/** The reason given by a code, by free words, or both. Code: reason-code-retired. */
export async function chosenReason(
  tx: Transaction,
  use: ReasonCodeUse,
  given: { reasonCodeId: string | null; reason: string },
): Promise<Outcome<ChosenReason>> {
  const code = given.reasonCodeId ? await findReasonCode(tx, given.reasonCodeId) : null;
  if (given.reasonCodeId && (!code || code.retiredAt || code.use !== use))
    return refusal('reason-code-retired', 'This reason is not used any more. Choose another.', 'reasonCodeId');
  const reason = [code?.word, given.reason].filter(Boolean).join('. ');
  return success({ reasonCodeId: code?.id ?? null, reasonWord: code?.word ?? null, reason });
}
