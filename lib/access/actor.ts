import { mayDo, type Right } from './permissions';
import type { Role } from './roles';
import type { SessionKind } from './session-kinds';

/** Whoever acts, as looked up for this request. Operations take it and name it in the trail. */
export interface Actor {
  sessionId: string;
  sessionKind: SessionKind;
  accountId: string;
  name: string;
  operatorNumber: string | null;
  roles: readonly Role[];
  locale: string;
  /** Null: at a desk. */
  stationId: string | null;
}

export function actorMay(actor: Pick<Actor, 'roles'>, right: Right): boolean {
  return mayDo(actor.roles, right);
}

/** Nobody approves what they made or changed, whatever roles they hold. `makers` are account ids. */
export function mayApprove(
  actor: Pick<Actor, 'accountId' | 'roles'>,
  right: Right,
  makers: readonly string[],
): boolean {
  return actorMay(actor, right) && !makers.includes(actor.accountId);
}
