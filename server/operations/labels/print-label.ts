import type { Transaction } from '@/db/client';
import { insertLabel, type NewLabel } from '@/db/queries/labels';

/**
 * Asks for a label after a pass, in the transaction that records the run. Nothing is sent here: the label sender takes the
 * row once it is committed, so that a printer never holds up a board.
 */
export function printLabel(tx: Transaction, label: NewLabel): Promise<{ id: string }> {
  return insertLabel(tx, label);
}
