import {
  countOpenLots,
  listBoardTypesForSequences,
  listRevisionStates,
  listSequences,
} from '@/db/queries/sequence-lists';
import { listNames } from '@/db/queries/sequence-revisions';
import type { SequenceListRow } from '@/lib/contracts/sequence-pages';
import { database } from '@/server/postgres';

/** Every sequence with the revision in use, what is in work, and the lots that use it; by board type and name. */
export async function listSequencesForDesk(): Promise<SequenceListRow[]> {
  const db = database();
  const [sequences, revisions, openLots] = await Promise.all([
    listSequences(db),
    listRevisionStates(db),
    countOpenLots(db),
  ]);
  const people = revisions.flatMap(({ madeBy, releasedBy, submittedBy }) => [madeBy, releasedBy, submittedBy]);
  const names = await listNames(
    db,
    people.filter((id) => id !== null),
  );
  const nameOf = (id: string | null) => names.get(id ?? '') ?? '';
  return sequences.map((sequence) => {
    const own = revisions.filter(({ sequenceId }) => sequenceId === sequence.id);
    const inUse = own.find(({ status }) => status === 'released');
    const work = own.find(({ status }) => status === 'draft' || status === 'submitted');
    const lotsOf = (of: typeof own) => of.reduce((sum, { id }) => sum + (openLots.get(id) ?? 0), 0);
    return {
      ...sequence,
      inUse: inUse
        ? { number: inUse.number, by: nameOf(inUse.releasedBy), atIso: inUse.releasedAt!.toISOString() }
        : null,
      draft: work
        ? {
            number: work.number,
            state: work.status === 'draft' ? 'draft' : 'submitted',
            by: nameOf(work.status === 'draft' ? work.madeBy : work.submittedBy),
            atIso: (work.status === 'draft' ? work.savedAt : work.submittedAt!).toISOString(),
            sentBack: work.sentBackAt !== null,
          }
        : null,
      openLots: lotsOf(own),
      openLotsOlder: lotsOf(own.filter(({ id }) => id !== inUse?.id)),
    };
  });
}

/** Board types that a sequence can be made for. */
export async function listBoardTypeChoices(): Promise<{ code: string; name: string }[]> {
  const types = await listBoardTypesForSequences(database());
  return types.map(({ code, name }) => ({ code, name }));
}
