import { and, eq, gt, lt, ne, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { draftEditors } from '@/db/schema/draft-editors';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import type { NewSequenceRevision, SequenceRevision } from './sequence-revisions';

type Reader = Database | Transaction;

/** A row not renewed for so long means nothing. */
const presenceSeconds = 15;

export async function insertSequence(
  tx: Transaction,
  sequence: { boardTypeId: string; name: string },
): Promise<{ id: string }> {
  const [row] = await tx.insert(sequences).values(sequence).returning({ id: sequences.id });
  return row!;
}

/** A new draft with the next number of its sequence; the lock on the sequence keeps two from taking the same. */
export async function insertDraft(
  tx: Transaction,
  draft: Pick<NewSequenceRevision, 'sequenceId' | 'data' | 'madeBy' | 'basedOnId' | 'note'>,
): Promise<SequenceRevision> {
  await tx.select({ id: sequences.id }).from(sequences).where(eq(sequences.id, draft.sequenceId)).for('update');
  const [newest] = await tx
    .select({ number: sql<number>`coalesce(max(${sequenceRevisions.number}), 0)::int` })
    .from(sequenceRevisions)
    .where(eq(sequenceRevisions.sequenceId, draft.sequenceId));
  const [row] = await tx
    .insert(sequenceRevisions)
    .values({ ...draft, number: newest!.number + 1 })
    .returning();
  return row!;
}

export async function updateRevision(
  tx: Transaction,
  revisionId: string,
  change: Partial<NewSequenceRevision>,
): Promise<void> {
  await tx.update(sequenceRevisions).set(change).where(eq(sequenceRevisions.id, revisionId));
}

/** Who else has the draft open, one a person, with the step they are at. */
export async function listOtherEditors(db: Reader, revisionId: string, tabId: string, accountId: string) {
  const fresh = gt(draftEditors.seenAt, sql`now() - make_interval(secs => ${presenceSeconds})`);
  return db
    .selectDistinctOn([draftEditors.accountId], { name: accounts.name, stepId: draftEditors.stepId })
    .from(draftEditors)
    .innerJoin(accounts, eq(accounts.id, draftEditors.accountId))
    .where(
      and(
        eq(draftEditors.revisionId, revisionId),
        ne(draftEditors.tabId, tabId),
        ne(draftEditors.accountId, accountId),
        fresh,
      ),
    )
    .orderBy(draftEditors.accountId, sql`${draftEditors.seenAt} desc`);
}

/** Says that this tab still has the draft open; rows of tabs long gone are dropped by the way. */
export async function renewEditor(
  tx: Transaction,
  editor: { revisionId: string; tabId: string; accountId: string; stepId: string | null },
): Promise<void> {
  await tx
    .insert(draftEditors)
    .values(editor)
    .onConflictDoUpdate({
      target: [draftEditors.revisionId, draftEditors.tabId],
      set: { accountId: editor.accountId, stepId: editor.stepId, seenAt: sql`now()` },
    });
  const gone = lt(draftEditors.seenAt, sql`now() - make_interval(secs => ${presenceSeconds})`);
  await tx.delete(draftEditors).where(and(eq(draftEditors.revisionId, editor.revisionId), gone));
}
