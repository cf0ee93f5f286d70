import type { DraftPage } from '@/lib/contracts/sequence-draft';
import type { SequenceRevisionState } from '@/lib/contracts/stored-states';

/** Why nothing can be changed now; null: it can. `status` is the newest that was heard. */
export function lockOf(page: DraftPage, status: SequenceRevisionState, dryRunAtWork: boolean): string | null {
  const { head, mayEdit } = page;
  const name = `r${head.number}`;
  if (status === 'submitted')
    return `${name} waits for its release${head.submittedBy ? `, submitted by ${head.submittedBy}` : ''}. It can be changed once it is sent back.`;
  if (status !== 'draft') return `${name} is ${status} and cannot be changed. Begin a new draft from its history.`;
  if (!mayEdit) return 'A test engineer edits this draft. You may look at it.';
  return dryRunAtWork ? 'Fields are locked while the dry run runs.' : null;
}
