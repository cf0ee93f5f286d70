import { findSequence, getSpecification, listRevisions } from '@/db/queries/sequence-revisions';
import { actorMay, type Actor } from '@/lib/access/actor';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';
import { listStationKinds } from './list-station-kinds';
import { mayRelease } from './may-release';
import { headsOf } from './revision-head';

/** What the editor opens with: the draft or the submitted revision, else the newest; null when there is no such sequence. */
export async function readDraftPage(actor: Actor, sequenceId: string): Promise<DraftPage | null> {
  const db = database();
  const sequence = await findSequence(db, sequenceId);
  if (!sequence) return null;
  const [revisions, boardType, stations] = await Promise.all([
    listRevisions(db, sequenceId),
    getSpecification(db, sequence.boardTypeId),
    listStationKinds(db),
  ]);
  const open = revisions.find(({ status }) => status === 'draft' || status === 'submitted') ?? revisions[0];
  if (!open) return null;
  const heads = await headsOf(db, revisions);
  const headOf = (id: string) => heads.find((head) => head.id === id)!;
  const released = revisions.find(({ status }) => status === 'released');
  return {
    sequenceId,
    sequenceName: sequence.name,
    boardType,
    head: headOf(open.id),
    sequence: open.data,
    released: released && released.id !== open.id ? { head: headOf(released.id), sequence: released.data } : null,
    stations,
    mayEdit: open.status === 'draft' && actorMay(actor, 'edit-sequences'),
    mayRelease: open.status === 'submitted' && mayRelease(actor, open),
  };
}
