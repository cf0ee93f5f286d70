import type { z } from 'zod';
import { isUniqueViolation } from '@/db/errors';
import { insertDraft, insertSequence } from '@/db/queries/sequence-drafts';
import { findSequenceNamed, listBoardTypesForSequences, listMissingPictures } from '@/db/queries/sequence-lists';
import { findSequence } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Transaction } from '@/db/client';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { ImportedSequence, importSequenceSchema } from '@/lib/contracts/sequence-draft';
import { readSequenceFile, sequenceOf, type FileProblem, type ReadSequenceFile } from '@/lib/sequence/sequence-file';
import { database } from '@/server/postgres';
import { draftStands } from './begin-draft';

/**
 * Makes a draft of a file: in the sequence given, else in the one of its board type and name, which is made where there is none. A
 * bad file stores nothing and is answered with all its problems. Codes: sequence-unknown, draft-exists.
 */
export async function importSequence(
  actor: Actor,
  { text, sequenceId }: z.infer<typeof importSequenceSchema>,
): Promise<Outcome<ImportedSequence>> {
  const read = readSequenceFile(text);
  if (!read.ok) return success({ made: false, problems: read.problems });
  const { name, boardType, revision } = read.file;
  try {
    return await database().transaction(async (tx) => {
      const problems = await problemsHere(tx, read, sequenceId);
      if (problems.length > 0) return success<ImportedSequence>({ made: false, problems });
      const types = await listBoardTypesForSequences(tx);
      const boardTypeId = types.find(({ code }) => code === boardType)!.id;
      const into = sequenceId
        ? await findSequence(tx, sequenceId)
        : ((await findSequenceNamed(tx, boardTypeId, name)) ?? (await insertSequence(tx, { boardTypeId, name })));
      if (!into) return refusal('sequence-unknown', 'This sequence does not exist.');
      const standing = await draftStands(tx, into.id);
      if (standing) return standing;
      const draft = await insertDraft(tx, {
        sequenceId: into.id,
        data: sequenceOf(read.file),
        madeBy: actor.accountId,
        note: `From a file of ${name} r${revision}.`,
      });
      await insertTrail(tx, actor, {
        action: 'sequence.imported',
        entity: 'sequence-revision',
        entityId: draft.id,
        after: {
          sequenceId: into.id,
          number: draft.number,
          name,
          revision: `r${revision}`,
          steps: draft.data.steps.length,
        },
      });
      return success<ImportedSequence>({ made: true, sequenceId: into.id, number: draft.number });
    });
  } catch (error) {
    if (!isUniqueViolation(error)) throw error;
    return refusal('draft-exists', 'Somebody made a draft a moment ago. Load the page again.');
  }
}

/** What only this server can tell: board types and pictures that it has. */
async function problemsHere(
  tx: Transaction,
  { file, lineOf }: Extract<ReadSequenceFile, { ok: true }>,
  sequenceId: string | null,
): Promise<FileProblem[]> {
  const problems: FileProblem[] = [];
  const types = await listBoardTypesForSequences(tx);
  const wanted = sequenceId ? (await findSequence(tx, sequenceId))?.boardTypeCode : undefined;
  const line = lineOf(['boardType']);
  if (wanted && file.boardType !== wanted)
    problems.push({
      line,
      field: 'boardType',
      reason: `This sequence is for ${wanted}, the file for ${file.boardType}.`,
    });
  else if (!types.some(({ code }) => code === file.boardType))
    problems.push({ line, field: 'boardType', reason: `There is no board type ${file.boardType} here.` });
  const pictures = file.steps.map((step) => ('pictureId' in step ? step.pictureId : null));
  const missing = await listMissingPictures(
    tx,
    pictures.filter((id) => id !== null),
  );
  pictures.forEach((id, i) => {
    if (id && missing.includes(id))
      problems.push({
        line: lineOf(['steps', i, 'pictureId']),
        field: `step ${i + 1}, pictureId`,
        reason: 'This picture is not kept here. Write null, then add the picture in the draft.',
      });
  });
  return problems;
}
