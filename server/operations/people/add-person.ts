import { insertAccount } from '@/db/queries/accounts';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { AddPerson } from '@/lib/contracts/people';
import { success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { accountFieldsOf, fieldsProblem, takenRefusal, trailFieldsOf } from './person-fields';

/** Makes an account without password or PIN. Codes: badge-, number-, email-missing and -taken. */
export async function addPerson(actor: Actor, form: AddPerson): Promise<Outcome<{ accountId: string }>> {
  const problem = fieldsProblem(form);
  if (problem) return problem;
  try {
    return await database().transaction(async (tx) => {
      const account = await insertAccount(tx, accountFieldsOf(form));
      await insertTrail(tx, actor, {
        action: 'account.added',
        entity: 'account',
        entityId: account.id,
        after: trailFieldsOf(account),
      });
      return success({ accountId: account.id });
    });
  } catch (error) {
    const taken = takenRefusal(error);
    if (taken) return taken;
    throw error;
  }
}
