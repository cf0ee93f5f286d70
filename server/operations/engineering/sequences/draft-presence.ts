import { listOtherEditors, renewEditor } from '@/db/queries/sequence-drafts';
import { findRevision, listNames } from '@/db/queries/sequence-revisions';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { OtherEditor, Presence } from '@/lib/contracts/sequence-draft';
import type { SequenceRevisionState } from '@/lib/contracts/stored-states';
import { database } from '@/server/postgres';

export interface DraftPresence {
  others: OtherEditor[];
  version: number;
  savedAtIso: string;
  /** Null: as it was begun. */
  savedBy: string | null;
  status: SequenceRevisionState;
}

/** Says that a tab still has the draft open, and hears who else has and what stands there. Code: revision-unknown. */
export async function renewPresence(
  { accountId }: Pick<Actor, 'accountId'>,
  { revisionId, tabId, stepId }: Presence & { revisionId: string },
): Promise<Outcome<DraftPresence>> {
  return database().transaction(async (tx) => {
    const row = await findRevision(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This draft does not exist.');
    const { version, status, savedAt, savedBy } = row;
    if (status === 'draft') await renewEditor(tx, { revisionId, tabId, accountId, stepId });
    const others = await listOtherEditors(tx, revisionId, tabId, accountId);
    const names = await listNames(tx, savedBy ? [savedBy] : []);
    const savedByName = savedBy && (names.get(savedBy) ?? null);
    return success({ others, version, savedAtIso: savedAt.toISOString(), savedBy: savedByName, status });
  });
}
