import { and, asc, count, desc, eq, inArray, ne, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { dryRuns } from '@/db/schema/dry-runs';
import { files } from '@/db/schema/files';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';

type Reader = Database | Transaction;

/** Every board type with its newest approved specification, or the newest where none is. */
export function listBoardTypesForSequences(db: Reader) {
  return db
    .selectDistinctOn([boardTypes.code], {
      id: boardTypes.id,
      code: boardTypes.code,
      name: boardTypes.name,
      specification: boardTypeRevisions.specification,
    })
    .from(boardTypes)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.boardTypeId, boardTypes.id))
    .orderBy(
      asc(boardTypes.code),
      sql`${boardTypeRevisions.status} = 'approved' desc`,
      desc(boardTypeRevisions.number),
    );
}

/** Every sequence, by board type and name. */
export function listSequences(db: Reader) {
  return db
    .select({
      id: sequences.id,
      name: sequences.name,
      boardTypeCode: boardTypes.code,
      boardTypeName: boardTypes.name,
    })
    .from(sequences)
    .innerJoin(boardTypes, eq(boardTypes.id, sequences.boardTypeId))
    .orderBy(asc(boardTypes.code), asc(sequences.name));
}

/** Revisions of every sequence without their steps, newest first. */
export function listRevisionStates(db: Reader) {
  return db
    .select({
      id: sequenceRevisions.id,
      sequenceId: sequenceRevisions.sequenceId,
      number: sequenceRevisions.number,
      status: sequenceRevisions.status,
      madeBy: sequenceRevisions.madeBy,
      savedAt: sequenceRevisions.savedAt,
      submittedBy: sequenceRevisions.submittedBy,
      submittedAt: sequenceRevisions.submittedAt,
      releasedBy: sequenceRevisions.releasedBy,
      releasedAt: sequenceRevisions.releasedAt,
      sentBackAt: sequenceRevisions.sentBackAt,
    })
    .from(sequenceRevisions)
    .orderBy(desc(sequenceRevisions.number));
}

/** How many lots that are not closed pin each revision. */
export async function countOpenLots(db: Reader): Promise<Map<string, number>> {
  const rows = await db
    .select({ revisionId: lots.sequenceRevisionId, lots: count() })
    .from(lots)
    .where(ne(lots.state, 'closed'))
    .groupBy(lots.sequenceRevisionId);
  return new Map(rows.map(({ revisionId, lots }) => [revisionId, lots]));
}

/** Lots that pin any revision of a sequence, newest first. */
export function listLotsOfSequence(db: Reader, sequenceId: string) {
  return db
    .select({ code: lots.code, state: lots.state, revisionId: lots.sequenceRevisionId })
    .from(lots)
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, lots.sequenceRevisionId))
    .where(eq(sequenceRevisions.sequenceId, sequenceId))
    .orderBy(desc(lots.createdAt));
}

export async function findSequenceNamed(db: Reader, boardTypeId: string, name: string): Promise<{ id: string } | null> {
  const [row] = await db
    .select({ id: sequences.id })
    .from(sequences)
    .where(and(eq(sequences.boardTypeId, boardTypeId), eq(sequences.name, name)));
  return row ?? null;
}

/** Of these ids of pictures, those of which no file is kept. */
export async function listMissingPictures(db: Reader, ids: readonly string[]): Promise<string[]> {
  if (ids.length === 0) return [];
  const kept = await db
    .select({ id: files.id })
    .from(files)
    .where(inArray(files.id, [...ids]));
  return ids.filter((id) => !kept.some((file) => file.id === id));
}

/** Dry runs that were kept with these revisions, newest first. */
export function listKeptDryRuns(db: Reader, revisionIds: readonly string[]) {
  return db
    .select({ id: dryRuns.id, revisionId: dryRuns.revisionId })
    .from(dryRuns)
    .where(and(inArray(dryRuns.revisionId, [...revisionIds]), eq(dryRuns.kept, true)))
    .orderBy(desc(dryRuns.askedAt));
}
