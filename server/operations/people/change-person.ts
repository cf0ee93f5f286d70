import { findAccount, lockAdministrators, updateAccount } from '@/db/queries/accounts';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { ChangePerson } from '@/lib/contracts/people';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { isLastOf, lastAdministrator } from './last-administrator';
import { accountFieldsOf, fieldsProblem, takenRefusal, trailFieldsOf } from './person-fields';

const sameRoles = (a: readonly string[], b: readonly string[]) => [...a].sort().join() === [...b].sort().join();

/**
 * Changes an account; new roles sign the person out everywhere. Codes: account-unknown, own-roles, reason-missing,
 * last-administrator, and those of `addPerson`.
 */
export async function changePerson(actor: Actor, form: ChangePerson): Promise<Outcome> {
  const problem = fieldsProblem(form);
  if (problem) return problem;
  try {
    return await database().transaction(async (tx) => {
      const administrators = await lockAdministrators(tx);
      const before = await findAccount(tx, form.accountId);
      if (!before) return refusal('account-unknown', 'This account does not exist.');
      const newRoles = !sameRoles(before.roles, form.roles);
      if (newRoles && before.id === actor.accountId)
        return refusal('own-roles', 'Nobody changes their own roles. Ask another administrator.', 'roles');
      if (newRoles && form.reason.length < 3)
        return refusal('reason-missing', 'A change of roles needs its reason.', 'reason');
      if (!form.roles.includes('administrator') && isLastOf(administrators, before.id)) return lastAdministrator;
      const after = await updateAccount(tx, before.id, accountFieldsOf(form));
      await insertTrail(tx, actor, {
        action: newRoles ? 'account.roles-changed' : 'account.changed',
        entity: 'account',
        entityId: before.id,
        before: trailFieldsOf(before),
        after: trailFieldsOf(after!),
        reason: form.reason || null,
      });
      return done;
    });
  } catch (error) {
    const taken = takenRefusal(error);
    if (taken) return taken;
    throw error;
  }
}
