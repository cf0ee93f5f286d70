import { z } from 'zod';
import { listOtherEditors, renewEditor } from '@/db/queries/sequence-drafts';
import { findRevision, listNames } from '@/db/queries/sequence-revisions';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { OtherEditor } from '@/lib/contracts/sequence-draft';
import type { SequenceRevisionState } from '@/lib/contracts/stored-states';
import { database } from '@/server/postgres';

export const presenceSchema = z.object({ tabId: z.string().min(8).max(60), stepId: z.string().max(40).nullable() });

export interface DraftPresence {
  others: OtherEditor[];
  version: number;
  savedAtIso: string;
  savedBy: string | null;
  status: SequenceRevisionState;
}

/** Says that this tab has the draft open, and who else has. Code: revision-unknown. */
export async function renewPresence(
  actor: Actor,
  { revisionId, tabId, stepId }: { revisionId: string; tabId: string; stepId: string | null },
): Promise<Outcome<DraftPresence>> {
  const db = database();
  const revision = await findRevision(db, revisionId);
  if (!revision) return refusal('revision-unknown', 'This draft was discarded.');
  const { accountId } = actor;
  await db.transaction((tx) => renewEditor(tx, { revisionId, tabId, stepId, accountId }));
  const { version, savedAt, status } = revision;
  return success({
    others: await listOtherEditors(db, revisionId, tabId, accountId),
    version,
    savedAtIso: savedAt.toISOString(),
    savedBy: revision.savedBy ? ((await listNames(db, [revision.savedBy])).get(revision.savedBy) ?? null) : null,
    status,
  });
}
