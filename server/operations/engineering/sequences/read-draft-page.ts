import { findSequence, listRevisions } from '@/db/queries/sequence-revisions';
import { actorMay, type Actor } from '@/lib/access/actor';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';
import { listStationKinds } from './list-station-kinds';
import { mayRelease } from './may-release';
import { headsOf } from './revision-head';

/** The draft of a sequence or what waits for release, else its newest revision; null when there is no such sequence. */
export async function readDraftPage(actor: Actor, sequenceId: string): Promise<DraftPage | null> {
  const db = database();
  const [sequence, revisions] = await Promise.all([findSequence(db, sequenceId), listRevisions(db, sequenceId)]);
  const shown = revisions.find(({ status }) => status === 'draft' || status === 'submitted') ?? revisions[0];
  if (!sequence || !shown) return null;
  const released = revisions.find(({ status }) => status === 'released') ?? null;
  const [[head, releasedHead], stations] = await Promise.all([
    headsOf(db, released ? [shown, released] : [shown], revisions),
    listStationKinds(db),
  ]);
  return {
    sequenceId,
    sequenceName: sequence.name,
    boardType: sequence.boardType,
    head: head!,
    sequence: shown.data,
    released: released && { head: releasedHead!, sequence: released.data },
    stations,
    mayEdit: shown.status === 'draft' && actorMay(actor, 'edit-sequences'),
    mayRelease: shown.status === 'submitted' && mayRelease(actor, shown),
  };
}
