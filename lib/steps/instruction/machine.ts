import { nextEnabled } from '../../sequence/enabled-steps';
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
import type { InstructionStep } from './schema';

/** `powered`: the supply was on before, and comes on again afterwards. */
export type InstructionMachine =
  | { stage: 'switching-off'; powered: boolean }
  | { stage: 'asking'; powered: boolean }
  | { stage: 'close-lid'; powered: boolean }
  | { stage: 'powering'; again: PowerAgain };
type Turn = StepTurn<InstructionMachine>;

/**
 * Words and a picture, until the operator says that it is done. With the supply off, the lid may be opened meanwhile: it has to
 * be closed again, then contacts are checked and the supply comes on by the power-up of the sequence, unless only the record
 * is left.
 */
export const machine: StepMachine<InstructionStep, InstructionMachine> = {
  begin({ supplyOff }, { facts }) {
    const powered = facts.supply.state !== 'off';
    return supplyOff
      ? { machine: { stage: 'switching-off', powered }, ask: { kind: 'supply-off' } }
      : { machine: { stage: 'asking', powered }, ask: null };
  },

  advance(machine, event, { supplyOff }, context) {
    if (machine.stage === 'powering') {
      const turn = 'id' in event ? advancePowerAgain(machine.again, event, context) : null;
      return turn ? powering(turn) : stay(machine);
    }
    const { powered } = machine;
    if (machine.stage === 'switching-off') {
      return stay(event.kind === 'supply-is-off' ? { stage: 'asking', powered } : machine);
    }
    if (event.kind === 'board' && !event.present) return { ending: boardRemoved };
    if (machine.stage === 'close-lid') return closed(event, context) ? goOn(powered, context) : stay(machine);
    if (event.kind !== 'confirm' || event.what !== 'instruction-done') return stay(machine);
    if (!supplyOff) return { done: true };
    const isClosed = context.plan.hasController && context.facts.lidClosed !== false;
    return isClosed ? goOn(powered, context) : stay({ stage: 'close-lid', powered });
  },

  view(machine, { text, pictureId, supplyOff }, { plan }) {
    switch (machine.stage) {
      case 'switching-off':
        return measuring({ code: 'run.switching-off' });
      case 'asking':
        return { kind: 'instruction', text, pictureId, supplyOff };
      case 'close-lid':
        return { kind: 'seat', wants: plan.hasController ? 'close-lid' : 'confirm-lid-and-board' };
      case 'powering':
        return measuring({ code: machine.again.stage === 'contact' ? 'run.contact-check' : 'run.power-up' });
    }
  },
};

function closed(event: StepEvent, { plan }: StepContext): boolean {
  if (plan.hasController) return event.kind === 'lid' && event.closed;
  return event.kind === 'confirm' && event.what === 'lid-and-board';
}

function goOn(powered: boolean, context: StepContext): Turn {
  const { plan, stepIndex } = context;
  const next = plan.sequence.steps[nextEnabled(plan.sequence, stepIndex + 1)];
  return powered && next?.kind !== 'record' ? powering(beginPowerAgain(context)) : { done: true };
}

function powering(turn: ProcedureTurn<PowerAgain, PowerAgainResult>): Turn {
  if ('ask' in turn) return { machine: { stage: 'powering', again: turn.machine }, ask: turn.ask };
  const { ending, measurements } = turn.result;
  return ending ? { ending, measurements } : { done: true, measurements };
}
