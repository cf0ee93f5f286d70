import { dispositionKinds, type DispositionKind } from '../contracts/stored-states';
import { mayDo, type Right } from './permissions';
import type { Role } from './roles';

/** A concession may begin with quality or with an engineer; everything else is signed by quality. */
export const rightToSign = (kind: DispositionKind): Right =>
  kind === 'concession' ? 'sign-concessions' : 'sign-dispositions';

/** What these roles may sign. */
export function kindsSignedBy(roles: readonly Role[]): DispositionKind[] {
  return dispositionKinds.filter((kind) => mayDo(roles, rightToSign(kind)));
}
