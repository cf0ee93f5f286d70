import { listKeptDryRuns, listLotsOfSequence } from '@/db/queries/sequence-lists';
import { findSequence, listRevisions } from '@/db/queries/sequence-revisions';
import type { Actor } from '@/lib/access/actor';
import type { SequenceHistory } from '@/lib/contracts/sequence-pages';
import { changeSentences } from '@/lib/sequence/change-sentences';
import { compareSequences } from '@/lib/sequence/compare-sequences';
import { database } from '@/server/postgres';
import { readDryRun } from '../dry-runs/read-dry-run';
import { mayRelease } from './may-release';
import { headsOf } from './revision-head';

/** Every revision of a sequence with who, when, why and what changed; null when there is no such sequence. */
export async function readHistory(actor: Actor, sequenceId: string): Promise<SequenceHistory | null> {
  const db = database();
  const [sequence, revisions, lots] = await Promise.all([
    findSequence(db, sequenceId),
    listRevisions(db, sequenceId),
    listLotsOfSequence(db, sequenceId),
  ]);
  if (!sequence) return null;
  const ids = revisions.map(({ id }) => id);
  const [heads, kept] = await Promise.all([headsOf(db, revisions), listKeptDryRuns(db, ids)]);
  const dryRuns = await Promise.all(kept.map(({ id }) => readDryRun(id)));
  const entries = revisions.map((revision, i) => {
    const before = revisions.find(({ id }) => id === revision.basedOnId) ?? revisions[i + 1];
    return {
      head: heads[i]!,
      comparedWith: before?.number ?? null,
      changes: before ? changeSentences(compareSequences(before.data, revision.data)) : [],
      lots: lots.filter(({ revisionId }) => revisionId === revision.id).map(({ code, state }) => ({ code, state })),
      keptDryRuns: kept.flatMap(({ revisionId }, k) => (revisionId === revision.id ? (dryRuns[k] ?? []) : [])),
      mayRelease: revision.status === 'submitted' && mayRelease(actor, revision),
    };
  });
  return { sequenceId, sequenceName: sequence.name, boardTypeCode: sequence.boardTypeCode, entries };
}
