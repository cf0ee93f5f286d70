import type { SequenceRevision } from '@/db/queries/sequence-revisions';
import { mayApprove, type Actor } from '@/lib/access/actor';

/** Everyone who made, changed or submitted a revision: none of them may release it. */
export function makersOf({ madeBy, editedBy, submittedBy }: SequenceRevision): string[] {
  return [madeBy, ...editedBy, ...(submittedBy ? [submittedBy] : [])];
}

export function mayRelease(actor: Pick<Actor, 'accountId' | 'roles'>, revision: SequenceRevision): boolean {
  return mayApprove(actor, 'release-sequences', makersOf(revision));
}
