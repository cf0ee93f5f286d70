import { faultCodes } from '../../run/fault-codes';
import {
  measuring,
  stay,
  type Answer,
  type StepContext,
  type StepEvent,
  type StepMachine,
  type StepTurn,
} from '../../run/machine';
import { advanceContactCheck, beginContactCheck, type ContactCheck } from '../../run/procedures/contact-check';
import { advancePowerUp, beginPowerUp, type PowerUp } from '../../run/procedures/power-up';
import type { Measurement } from '../../run/types';
import { contactLost, contactMeasurement } from '../../run/procedures/contact-result';
import type { SealStep } from './schema';

export type SealMachine =
  | { stage: 'switching-off' }
  | { stage: 'open-lid' }
  | { stage: 'seal-screw' }
  | { stage: 'close-lid' }
  | { stage: 'contact'; check: ContactCheck }
  | { stage: 'power-up'; powerUp: PowerUp; measurements: Measurement[] };
type SealTurn = StepTurn<SealMachine>;

/**
 * Supply off and below 2 V, lid open, screw sealed, lid closed, contact check, supply on again. Closing the lid says that
 * the screw is sealed; a board taken out meanwhile may come back as another one, so that ends the run.
 */
export const machine: StepMachine<SealStep, SealMachine> = {
  begin: () => ({ machine: { stage: 'switching-off' }, ask: { kind: 'supply-off' } }),

  advance(machine, event, _step, context) {
    if (machine.stage === 'contact' || machine.stage === 'power-up') {
      return 'id' in event ? advancePowering(machine, event, context) : stay(machine);
    }
    if (machine.stage === 'switching-off') {
      return stay(event.kind === 'supply-is-off' ? { stage: 'open-lid' } : machine);
    }
    if (event.kind === 'board' && !event.present) return { ending: boardRemoved };
    return handle(machine, event, context);
  },

  view(machine) {
    switch (machine.stage) {
      case 'switching-off':
        return { kind: 'seal', wants: 'supply-off' };
      case 'contact':
        return measuring({ code: 'run.contact-check' });
      case 'power-up':
        return measuring({ code: 'run.power-up' });
      default:
        return { kind: 'seal', wants: machine.stage };
    }
  },
};

const boardRemoved = {
  kind: 'no-verdict',
  reason: 'board-removed',
  code: faultCodes.boardRemoved,
  detail: { code: 'run.board-removed' },
  fault: null,
} as const;

/** Lid and screw, by the switches of a controller or by the operator's word. */
function handle(machine: SealMachine, event: StepEvent, context: StepContext): SealTurn {
  const { hasController } = context.plan;
  const opened = hasController
    ? event.kind === 'lid' && !event.closed
    : event.kind === 'confirm' && event.what === 'lid-open';
  const closed = hasController
    ? event.kind === 'lid' && event.closed
    : event.kind === 'confirm' && event.what === 'lid-closed';
  if (machine.stage === 'open-lid') return stay(opened ? { stage: 'seal-screw' } : machine);
  if (closed) return contact(context);
  if (machine.stage === 'seal-screw' && event.kind === 'confirm' && event.what === 'sealed') {
    return stay({ stage: 'close-lid' });
  }
  return stay(machine);
}

function contact(context: StepContext): SealTurn {
  const seatStep = context.plan.sequence.steps.find((s) => s.kind === 'seat');
  if (seatStep?.kind !== 'seat') return power([], context);
  const { machine, ask } = beginContactCheck(seatStep.contactCheck);
  return { machine: { stage: 'contact', check: machine }, ask };
}

function power(measurements: Measurement[], { plan }: StepContext): SealTurn {
  const powerStep = plan.sequence.steps.find((s) => s.kind === 'power-up');
  if (powerStep?.kind !== 'power-up') return { done: true, measurements };
  const { machine, ask } = beginPowerUp(powerStep);
  return { machine: { stage: 'power-up', powerUp: machine, measurements }, ask };
}

function advancePowering(
  machine: Extract<SealMachine, { stage: 'contact' | 'power-up' }>,
  answer: Answer,
  context: StepContext,
): SealTurn {
  if (machine.stage === 'power-up') {
    const turn = advancePowerUp(machine.powerUp, answer, context);
    if (!turn) return stay(machine);
    if ('ask' in turn) return { machine: { ...machine, powerUp: turn.machine }, ask: turn.ask };
    const measurements = [...machine.measurements, ...(turn.result.measurements ?? [])];
    return turn.result.ending ? { ending: turn.result.ending, measurements } : { done: true, measurements };
  }
  const turn = advanceContactCheck(machine.check, answer, context);
  if (!turn) return stay(machine);
  if ('ask' in turn) return { machine: { stage: 'contact', check: turn.machine }, ask: turn.ask };
  const measurements = [contactMeasurement(turn.result, machine.check.settings, context)];
  return turn.result.holds ? power(measurements, context) : { ending: contactLost(turn.result), measurements };
}
