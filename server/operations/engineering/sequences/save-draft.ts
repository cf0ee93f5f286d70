import { updateRevision } from '@/db/queries/sequence-drafts';
import { findRevisionForUpdate, listNames } from '@/db/queries/sequence-revisions';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { SaveDraft, SavedDraft } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';

/**
 * Saves a draft as it was typed, right or not. A save made from an older version changes nothing and is answered with what stands
 * there, which the editor merges. Codes: revision-unknown, not-a-draft.
 */
export async function saveDraft(actor: Actor, form: SaveDraft, at = new Date()): Promise<Outcome<SavedDraft>> {
  return database().transaction(async (tx) => {
    const revision = await findRevisionForUpdate(tx, form.revisionId);
    if (!revision)
      return refusal('revision-unknown', 'This draft was discarded. Copy what you need, then begin a new draft.');
    const { number, status, version, savedAt } = revision;
    if (status !== 'draft')
      return refusal('not-a-draft', `r${number} is ${status} and cannot be changed. Your text is kept here.`);
    const savedBy = revision.savedBy ?? revision.madeBy;
    if (form.version !== version) {
      return success({
        saved: false as const,
        version,
        savedAtIso: savedAt.toISOString(),
        savedBy: (await listNames(tx, [savedBy])).get(savedBy) ?? '',
        sequence: revision.data,
        warningReasons: revision.warningReasons,
      });
    }
    const editedBy = [...new Set([...revision.editedBy, actor.accountId])];
    await updateRevision(tx, revision.id, {
      data: form.sequence,
      warningReasons: form.warningReasons,
      version: version + 1,
      savedAt: at,
      savedBy: actor.accountId,
      editedBy,
    });
    return success({ saved: true as const, version: version + 1, savedAtIso: at.toISOString() });
  });
}
