import { findBoardTypeRevisionForUpdate, updateBoardTypeRevision } from '@/db/queries/board-type-revisions';
import { findFile } from '@/db/queries/files';
import { insertTrail } from '@/db/queries/trail';
import type { Transaction } from '@/db/client';
import type { Actor } from '@/lib/access/actor';
import { compareBoardTypes } from '@/lib/board-type/compare-board-types';
import type { BoardType } from '@/lib/contracts/board-type';
import type { SaveBoardType } from '@/lib/contracts/board-type-revision';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/**
 * Saves a draft as it stands, with findings or without. A save made from an older version is refused, so that nobody writes over
 * somebody else's. Codes: revision-unknown, not-a-draft, draft-changed, code-fixed, file-unknown.
 */
export async function saveBoardTypeDraft(
  actor: Actor,
  { revisionId, version, specification }: SaveBoardType,
  at = new Date(),
): Promise<Outcome<{ version: number }>> {
  return database().transaction(async (tx) => {
    const row = await findBoardTypeRevisionForUpdate(tx, revisionId);
    if (!row)
      return refusal('revision-unknown', 'This draft does not exist any more. Copy what you need, then load the page.');
    if (row.status !== 'draft')
      return refusal(
        'not-a-draft',
        `Draft ${row.number} is ${row.status} and cannot be changed. What you typed is still here.`,
      );
    if (row.version !== version)
      return refusal(
        'draft-changed',
        'Somebody saved this draft meanwhile. Copy what you need, then load the page again.',
      );
    if (row.specification.code !== specification.code)
      return refusal('code-fixed', 'The code of a board type stays. Begin a new board type for another code.');
    if (!(await filesFit(tx, specification, row.specification)))
      return refusal('file-unknown', 'The picture is not stored. Choose it again.');
    await updateBoardTypeRevision(tx, row.id, {
      specification,
      version: version + 1,
      savedAt: at,
      editedBy: [...new Set([...row.editedBy, actor.accountId])],
    });
    await insertTrail(tx, actor, {
      action: 'board-type.draft-saved',
      entity: 'board-type-revision',
      entityId: row.id,
      before: { version },
      after: { version: version + 1, changes: compareBoardTypes(row.specification, specification) },
    });
    return success({ version: version + 1 });
  });
}

/** Files that are newly referred to are stored, as what they are used for. */
async function filesFit(
  tx: Transaction,
  { trimmerPhoto, fixtureDrawing }: BoardType,
  before: BoardType,
): Promise<boolean> {
  const named = [
    [trimmerPhoto, before.trimmerPhoto, 'trimmer-photo'],
    [fixtureDrawing, before.fixtureDrawing, 'fixture-drawing'],
  ] as const;
  for (const [reference, earlier, kind] of named)
    if (reference && reference.fileId !== earlier?.fileId && (await findFile(tx, reference.fileId))?.kind !== kind)
      return false;
  return true;
}
