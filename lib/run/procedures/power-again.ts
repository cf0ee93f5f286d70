import type { Ending } from '../../decision/decide-verdict';
import { firstOf } from '../../sequence/enabled-steps';
import { faultCodes } from '../fault-codes';
import type { Answer, ProcedureTurn, StepContext } from '../machine';
import type { Measurement } from '../types';
import { advanceContactCheck, beginContactCheck, type ContactCheck } from './contact-check';
import { contactLost, contactMeasurement } from './contact-result';
import { advancePowerUp, beginPowerUp, type PowerUp } from './power-up';

export type PowerAgain =
  { stage: 'contact'; check: ContactCheck } | { stage: 'power-up'; powerUp: PowerUp; measurements: Measurement[] };
export interface PowerAgainResult {
  ending: Ending | null;
  measurements: Measurement[];
}
type Turn = ProcedureTurn<PowerAgain, PowerAgainResult>;

/** A board taken out while the lid was open may come back as another one. */
export const boardRemoved = {
  kind: 'no-verdict',
  reason: 'board-removed',
  code: faultCodes.boardRemoved,
  detail: { code: 'run.board-removed' },
  fault: null,
} as const;

/** After the lid was open: the contact check of the sequence once more, then its power-up. */
export function beginPowerAgain(context: StepContext): Turn {
  const seat = firstOf(context.plan.sequence, 'seat');
  if (!seat) return power([], context);
  const { machine, ask } = beginContactCheck(seat.contactCheck);
  return { machine: { stage: 'contact', check: machine }, ask };
}

function power(measurements: Measurement[], { plan }: StepContext): Turn {
  const step = firstOf(plan.sequence, 'power-up');
  if (!step) return { result: { ending: null, measurements } };
  const { machine, ask } = beginPowerUp(step);
  return { machine: { stage: 'power-up', powerUp: machine, measurements }, ask };
}

export function advancePowerAgain(machine: PowerAgain, answer: Answer, context: StepContext): Turn | null {
  if (machine.stage === 'power-up') {
    const turn = advancePowerUp(machine.powerUp, answer, context);
    if (!turn) return null;
    if ('ask' in turn) return { machine: { ...machine, powerUp: turn.machine }, ask: turn.ask };
    const measurements = [...machine.measurements, ...(turn.result.measurements ?? [])];
    return { result: { ending: turn.result.ending, measurements } };
  }
  const turn = advanceContactCheck(machine.check, answer, context);
  if (!turn) return null;
  if ('ask' in turn) return { machine: { stage: 'contact', check: turn.machine }, ask: turn.ask };
  const measurements = [contactMeasurement(turn.result, machine.check.settings, context)];
  return turn.result.holds
    ? power(measurements, context)
    : { result: { ending: contactLost(turn.result), measurements } };
}
