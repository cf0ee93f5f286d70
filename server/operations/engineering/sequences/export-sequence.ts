import { findSequence, listRevisions } from '@/db/queries/sequence-revisions';
import { writeSequenceFile } from '@/lib/sequence/sequence-file';
import { database } from '@/server/postgres';

/** A revision as a file, with a name for it; null when there is no such revision. */
export async function exportSequence(
  sequenceId: string,
  number: number,
): Promise<{ fileName: string; text: string } | null> {
  const db = database();
  const [sequence, revisions] = await Promise.all([findSequence(db, sequenceId), listRevisions(db, sequenceId)]);
  const revision = revisions.find((each) => each.number === number);
  if (!sequence || !revision) return null;
  const { name, boardTypeCode: boardType } = sequence;
  return {
    fileName: `${name.replace(/[^A-Za-z0-9]+/g, '-').replace(/^-|-$/g, '')}-r${number}.json`,
    text: writeSequenceFile(revision.data, { boardType, name, revision: number }),
  };
}
