import { insertTraining, listBoardTypes, listTrainings } from '@/db/queries/engineering-references';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { TrainingForm } from '@/lib/contracts/training';
import { database } from '@/server/postgres';

/** One row a person: the end of each training by board type, null where there is none. */
export async function readTrainings() {
  const db = database();
  const [{ people, latest }, boardTypes] = await Promise.all([listTrainings(db), listBoardTypes(db)]);
  return {
    boardTypes,
    people: people.map((person) => ({
      ...person,
      until: Object.fromEntries(
        latest
          .filter((row) => row.accountId === person.id)
          .map((row) => [row.boardTypeId, row.validUntil.toISOString()]),
      ),
    })),
  };
}

/** Codes: training-ended, training-own. */
export async function recordTraining(actor: Actor, form: TrainingForm, now = new Date()): Promise<Outcome> {
  if (form.accountId === actor.accountId)
    return refusal('training-own', 'Nobody records their own training. Ask another engineer or quality.', 'accountId');
  // Valid through the day, in the time of the place where the server stands.
  const validUntil = new Date(`${form.validUntil}T00:00:00`);
  validUntil.setDate(validUntil.getDate() + 1);
  if (validUntil <= now) return refusal('training-ended', 'The last day lies in the past. Check it.', 'validUntil');
  return database().transaction(async (tx) => {
    const { id } = await insertTraining(tx, {
      accountId: form.accountId,
      boardTypeId: form.boardTypeId,
      validUntil,
      recordedBy: actor.accountId,
    });
    await insertTrail(tx, actor, {
      action: 'person.trained',
      entity: 'account',
      entityId: form.accountId,
      after: { trainingId: id, boardTypeId: form.boardTypeId, validUntil: form.validUntil },
    });
    return done;
  });
}
