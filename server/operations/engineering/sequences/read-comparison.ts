import { listKeptDryRuns } from '@/db/queries/sequence-lists';
import { findSequence, listRevisions } from '@/db/queries/sequence-revisions';
import { actorMay, type Actor } from '@/lib/access/actor';
import type { ComparisonPage, ComparisonView } from '@/lib/contracts/sequence-pages';
import { database } from '@/server/postgres';
import { readDryRun } from '../dry-runs/read-dry-run';
import { makersOf, mayRelease } from './may-release';
import { headsOf } from './revision-head';

/**
 * Two revisions side by side: those that the address names, else the one in use and the draft, or the newest; null when there is no
 * such sequence or revision.
 */
export async function readComparison(
  actor: Actor,
  sequenceId: string,
  view: Pick<ComparisonView, 'a' | 'b'>,
): Promise<ComparisonPage | null> {
  const db = database();
  const [sequence, revisions] = await Promise.all([findSequence(db, sequenceId), listRevisions(db, sequenceId)]);
  const newest = revisions[0];
  if (!sequence || !newest) return null;
  const later = revisions.find(({ status }) => status === 'draft' || status === 'submitted') ?? newest;
  const earlier =
    revisions.find(({ status, id }) => status === 'released' && id !== later.id) ??
    revisions.find(({ number }) => number < later.number) ??
    later;
  const named = (text: string | null, usual: typeof later) =>
    text === null ? usual : revisions.find(({ number }) => `r${number}` === text);
  const [a, b] = [named(view.a, earlier), named(view.b, later)];
  if (!a || !b) return null;
  const heads = await headsOf(db, revisions);
  const [kept] = await listKeptDryRuns(db, [b.id]);
  const headOf = (id: string) => heads.find((head) => head.id === id)!;
  const waits = b.status === 'submitted';
  return {
    sequenceId,
    sequenceName: sequence.name,
    boardType: sequence.boardType,
    heads,
    a: { head: headOf(a.id), sequence: a.data },
    b: { head: headOf(b.id), sequence: b.data },
    usual: { a: earlier.number, b: later.number },
    keptDryRun: kept ? await readDryRun(kept.id) : null,
    mayRelease: waits && mayRelease(actor, b),
    mayTakeBack: waits && actorMay(actor, 'release-sequences') && makersOf(b).includes(actor.accountId),
  };
}
