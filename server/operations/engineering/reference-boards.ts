import { isUniqueViolation } from '@/db/errors';
import {
  findReferenceBoardForUpdate,
  insertReferenceBoard,
  listBoardTypes,
  listReferenceBoards,
  updateReferenceBoard,
} from '@/db/queries/engineering-references';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { ChangeReferenceBoardForm, ReferenceBoardForm } from '@/lib/contracts/daily-check';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

export async function readReferenceBoards() {
  const db = database();
  const [boards, boardTypes] = await Promise.all([listReferenceBoards(db), listBoardTypes(db)]);
  return { boards, boardTypes };
}

/** Code: reference-exists. */
export async function addReferenceBoard(actor: Actor, form: ReferenceBoardForm): Promise<Outcome> {
  try {
    return await database().transaction(async (tx) => {
      const { id } = await insertReferenceBoard(tx, form);
      await insertTrail(tx, actor, { action: 'reference.added', entity: 'reference-board', entityId: id, after: form });
      return done;
    });
  } catch (error) {
    if (isUniqueViolation(error)) return refusal('reference-exists', `Reference board ${form.code} exists.`, 'code');
    throw error;
  }
}

/** Limits of the daily check: known points and how far a measurement may lie from them. Codes: reference-unknown, points-crossed. */
export async function changeReferenceBoard(
  actor: Actor,
  form: ChangeReferenceBoardForm,
  at = new Date(),
): Promise<Outcome> {
  if (form.releaseVolts <= form.tripVolts)
    return refusal('points-crossed', 'The release point must be above the trip point.', 'releaseVolts');
  return database().transaction(async (tx) => {
    const before = await findReferenceBoardForUpdate(tx, form.referenceBoardId);
    if (!before) return refusal('reference-unknown', 'This reference board does not exist.');
    const { tripVolts, releaseVolts, toleranceVolts } = form;
    const after = {
      tripVolts,
      releaseVolts,
      toleranceVolts,
      retiredAt: form.retired ? (before.retiredAt ?? at) : null,
    };
    await updateReferenceBoard(tx, before.id, after);
    await insertTrail(tx, actor, {
      action: 'reference.changed',
      entity: 'reference-board',
      entityId: before.id,
      before: {
        tripVolts: before.tripVolts,
        releaseVolts: before.releaseVolts,
        toleranceVolts: before.toleranceVolts,
        retiredAt: before.retiredAt,
      },
      after,
    });
    return done;
  });
}
