import {
  findBoardType,
  listBoardTypeRevisions,
  listOpenLotsOfBoardType,
  listReleasedSequences,
} from '@/db/queries/board-type-revisions';
import { findFile } from '@/db/queries/files';
import { actorMay, mayApprove, type Actor } from '@/lib/access/actor';
import type { BoardType } from '@/lib/contracts/board-type';
import type { BoardTypePage, BoardTypeRevisionHead, SequenceMisfit } from '@/lib/contracts/board-type-revision';
import type { FileFacts } from '@/lib/contracts/file-upload';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { database } from '@/server/postgres';
import { makersOf } from './approve';

/** A board type with its draft, history and what its limits would break, or null when there is none of that code. */
export async function readBoardType(actor: Actor, code: string): Promise<BoardTypePage | null> {
  const db = database();
  const type = await findBoardType(db, code);
  if (!type) return null;
  const [rows, openLots, released] = await Promise.all([
    listBoardTypeRevisions(db, type.id),
    listOpenLotsOfBoardType(db, type.id),
    listReleasedSequences(db, type.id),
  ]);
  const standing = rows.find(({ revision: { status } }) => status === 'draft' || status === 'submitted');
  const approved = rows.find(({ revision: { status } }) => status === 'approved');
  const shown = standing ?? approved ?? rows[0];
  if (!shown) return null;
  const { specification } = shown.revision;
  return {
    code,
    shown: headOf(shown),
    inUse: approved ? headOf(approved) : null,
    history: rows.map(headOf),
    misfits: standing ? misfitsOf(released, specification, approved?.revision.specification ?? null) : [],
    files: await filesOf(specification),
    openLots,
    mayEdit: actorMay(actor, 'edit-board-types'),
    mayApprove: shown.revision.status === 'submitted' && mayApprove(actor, 'approve-limits', makersOf(shown.revision)),
  };
}

type Row = Awaited<ReturnType<typeof listBoardTypeRevisions>>[number];

function headOf({ revision, madeByName, submittedByName, sentBackByName, approvedByName }: Row): BoardTypeRevisionHead {
  const { id, number, status, version, note, specification, sentBackReason } = revision;
  const iso = (at: Date | null) => at?.toISOString() ?? null;
  return {
    id,
    number,
    status,
    version,
    note,
    specification,
    madeBy: madeByName,
    savedAtIso: revision.savedAt.toISOString(),
    submittedBy: submittedByName,
    submittedAtIso: iso(revision.submittedAt),
    sentBackBy: sentBackByName,
    sentBackAtIso: iso(revision.sentBackAt),
    sentBackReason,
    approvedBy: approvedByName,
    approvedAtIso: iso(revision.approvedAt),
  };
}

/** Sequences in use that have errors with the limits asked for and had none of these before. */
function misfitsOf(
  released: Awaited<ReturnType<typeof listReleasedSequences>>,
  asked: BoardType,
  inUse: BoardType | null,
): SequenceMisfit[] {
  return released.flatMap(({ sequenceId, name, number, sequence }) => {
    const errors = (boardType: BoardType) =>
      checkSequence(sequence, boardType)
        .filter(({ severity }) => severity === 'error')
        .map(({ sentence }) => sentence);
    const before = new Set(inUse ? errors(inUse) : []);
    const sentences = [...new Set(errors(asked))].filter((sentence) => !before.has(sentence));
    return sentences.length > 0 ? [{ sequenceId, name, revision: `r${number}`, sentences }] : [];
  });
}

async function filesOf({ trimmerPhoto, fixtureDrawing }: BoardType): Promise<FileFacts[]> {
  const ids = [trimmerPhoto?.fileId, fixtureDrawing?.fileId].filter((id) => id !== undefined);
  const found = await Promise.all(ids.map((id) => findFile(database(), id)));
  return found
    .filter((file) => file !== null)
    .map(({ id, originalName: name, mediaType, bytes, width, height }) => ({
      id,
      name,
      mediaType,
      bytes,
      width,
      height,
    }));
}
