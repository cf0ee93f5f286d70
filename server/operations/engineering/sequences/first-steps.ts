import type { BoardType } from '@/lib/contracts/board-type';
import { numberSteps } from '@/lib/sequence/number-steps';
import type { Sequence } from '@/lib/sequence/step';
import { findPoints } from '@/lib/steps/find-points/kind';
import { powerUp } from '@/lib/steps/power-up/kind';
import { record } from '@/lib/steps/record/kind';
import { seal } from '@/lib/steps/seal/kind';
import { seat } from '@/lib/steps/seat/kind';
import { trim } from '@/lib/steps/trim/kind';
import { verify } from '@/lib/steps/verify/kind';

/** What a new sequence begins with: the shortest way from a board to a verdict, with values that suit the board type. */
export function firstSteps(boardType: BoardType): Sequence {
  return {
    decisionRule: { kind: 'guard-band', factor: 1 },
    steps: numberSteps([seat, powerUp, findPoints, trim, seal, verify, record].map((kind) => kind.fresh(boardType))),
  };
}
