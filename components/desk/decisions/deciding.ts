import type { ReasonChoice } from '@/lib/contracts/reason-code';
import type { DispositionKind } from '@/lib/contracts/stored-states';
import type { SignDispositions } from './disposition-dialog';

/** What somebody may sign, why, and how: given to whatever decides about boards. */
export interface Deciding {
  kinds: readonly DispositionKind[];
  reasons: readonly ReasonChoice[];
  signer: string;
  sign: SignDispositions;
}
