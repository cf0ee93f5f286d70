import { listNames, type SequenceRevision } from '@/db/queries/sequence-revisions';
import type { Database, Transaction } from '@/db/client';
import type { RevisionHead } from '@/lib/contracts/sequence-draft';

/** Revisions with the names of their people, in the order given. `all` are the sequence's, to number what each is based on. */
export async function headsOf(
  db: Database | Transaction,
  revisions: readonly SequenceRevision[],
  all: readonly SequenceRevision[] = revisions,
): Promise<RevisionHead[]> {
  const people = revisions.flatMap((r) => [
    r.madeBy,
    r.savedBy,
    r.submittedBy,
    r.sentBackBy,
    r.releasedBy,
    r.withdrawnBy,
  ]);
  const names = await listNames(
    db,
    people.filter((id) => id !== null),
  );
  const nameOf = (id: string | null) => (id === null ? null : (names.get(id) ?? null));
  return revisions.map((r) => ({
    id: r.id,
    number: r.number,
    status: r.status,
    version: r.version,
    note: r.note,
    madeBy: nameOf(r.madeBy) ?? '',
    madeAtIso: r.madeAt.toISOString(),
    savedBy: nameOf(r.savedBy),
    savedAtIso: r.savedAt.toISOString(),
    basedOnNumber: all.find(({ id }) => id === r.basedOnId)?.number ?? null,
    submittedBy: nameOf(r.submittedBy),
    submittedAtIso: r.submittedAt?.toISOString() ?? null,
    sentBackBy: nameOf(r.sentBackBy),
    sentBackAtIso: r.sentBackAt?.toISOString() ?? null,
    sentBackReason: r.sentBackReason,
    releasedBy: nameOf(r.releasedBy),
    releasedAtIso: r.releasedAt?.toISOString() ?? null,
    releaseMeaning: r.releaseMeaning,
    supersededAtIso: r.supersededAt?.toISOString() ?? null,
    withdrawnBy: nameOf(r.withdrawnBy),
    withdrawnAtIso: r.withdrawnAt?.toISOString() ?? null,
    withdrawnReason: r.withdrawnReason,
    warningReasons: r.warningReasons,
  }));
}
