import {
  measuring,
  stay,
  type ProcedureTurn,
  type StepContext,
  type StepEvent,
  type StepMachine,
  type StepTurn,
} from '../../run/machine';
import {
  advancePowerAgain,
  beginPowerAgain,
  boardRemoved,
  type PowerAgain,
  type PowerAgainResult,
} from '../../run/procedures/power-again';
import type { SealStep } from './schema';

export type SealMachine =
  | { stage: 'switching-off' }
  | { stage: 'open-lid' }
  | { stage: 'seal-screw' }
  | { stage: 'close-lid' }
  | { stage: 'powering'; again: PowerAgain };
type SealTurn = StepTurn<SealMachine>;

/**
 * Supply off and below 2 V, lid open, screw sealed, lid closed, contact check, supply on again. Closing the lid says that
 * the screw is sealed; a board taken out meanwhile may come back as another one, so that ends the run.
 */
export const machine: StepMachine<SealStep, SealMachine> = {
  begin: () => ({ machine: { stage: 'switching-off' }, ask: { kind: 'supply-off' } }),

  advance(machine, event, _step, context) {
    if (machine.stage === 'powering') {
      const turn = 'id' in event ? advancePowerAgain(machine.again, event, context) : null;
      return turn ? powering(turn) : stay(machine);
    }
    if (machine.stage === 'switching-off') {
      return stay(event.kind === 'supply-is-off' ? { stage: 'open-lid' } : machine);
    }
    if (event.kind === 'board' && !event.present) return { ending: boardRemoved };
    return handle(machine, event, context);
  },

  view(machine) {
    if (machine.stage === 'switching-off') return { kind: 'seal', wants: 'supply-off' };
    if (machine.stage !== 'powering') return { kind: 'seal', wants: machine.stage };
    return measuring({ code: machine.again.stage === 'contact' ? 'run.contact-check' : 'run.power-up' });
  },
};

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
  if (closed) return powering(beginPowerAgain(context));
  if (machine.stage === 'seal-screw' && event.kind === 'confirm' && event.what === 'sealed') {
    return stay({ stage: 'close-lid' });
  }
  return stay(machine);
}

function powering(turn: ProcedureTurn<PowerAgain, PowerAgainResult>): SealTurn {
  if ('ask' in turn) return { machine: { stage: 'powering', again: turn.machine }, ask: turn.ask };
  const { ending, measurements } = turn.result;
  return ending ? { ending, measurements } : { done: true, measurements };
}
