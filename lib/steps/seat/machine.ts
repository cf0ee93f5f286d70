import { measuring, stay, type StepContext, type StepEvent, type StepMachine, type StepTurn } from '../../run/machine';
import { advanceContactCheck, beginContactCheck, type ContactCheck } from '../../run/procedures/contact-check';
import { contactLost, contactMeasurement } from '../../run/procedures/contact-result';
import type { SeatStep } from './schema';

export type SeatMachine =
  /** `stale`: a switch moved after the fixture was asked, so its answer may be older. */
  { stage: 'reading'; stale: boolean } | { stage: 'waiting' } | { stage: 'contact'; check: ContactCheck };

/** Lid closed over a board, by the fixture's switches or by the operator's word, then the contact check. */
export const machine: StepMachine<SeatStep, SeatMachine> = {
  begin: (_step, { plan }) => (plan.hasController ? read : { machine: { stage: 'waiting' }, ask: null }),

  advance(machine, event, step, context) {
    if (machine.stage === 'contact') return advanceContact(machine, event, context);
    if (event.kind === 'confirm' && event.what === 'lid-and-board' && !context.plan.hasController) {
      return contact(step);
    }
    if (machine.stage === 'reading') {
      if (isFixtureAct(event)) return stay({ ...machine, stale: true });
      if (machine.stale) return read;
    }
    if (event.kind === 'fixture-read' || isFixtureAct(event)) {
      return seated(context) ? contact(step) : { machine: { stage: 'waiting' }, ask: null };
    }
    return stay(machine);
  },

  view(machine, _step, { plan, facts }) {
    if (machine.stage === 'contact') return measuring({ code: 'run.contact-check' });
    if (machine.stage === 'reading') return { kind: 'seat', wants: 'nothing' };
    if (!plan.hasController) return { kind: 'seat', wants: 'confirm-lid-and-board' };
    return { kind: 'seat', wants: facts.boardPresent ? 'close-lid' : 'place-board' };
  },
};

const read: StepTurn<SeatMachine> = { machine: { stage: 'reading', stale: false }, ask: { kind: 'read-fixture' } };
const isFixtureAct = (event: StepEvent) => event.kind === 'lid' || event.kind === 'board';
const seated = ({ facts }: StepContext) => facts.lidClosed === true && facts.boardPresent === true;

function contact(step: SeatStep): StepTurn<SeatMachine> {
  const { machine, ask } = beginContactCheck(step.contactCheck);
  return { machine: { stage: 'contact', check: machine }, ask };
}

function advanceContact(
  machine: { stage: 'contact'; check: ContactCheck },
  event: StepEvent,
  context: StepContext,
): StepTurn<SeatMachine> {
  if (!('id' in event)) return stay(machine);
  const turn = advanceContactCheck(machine.check, event, context);
  if (!turn) return stay(machine);
  if ('ask' in turn) return { machine: { stage: 'contact', check: turn.machine }, ask: turn.ask };
  const measurements = [contactMeasurement(turn.result, machine.check.settings, context)];
  return turn.result.holds ? { done: true, measurements } : { ending: contactLost(turn.result), measurements };
}
