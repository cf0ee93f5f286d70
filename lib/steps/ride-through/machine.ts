import { reasonFor } from '../../decision/reject-reason';
import type { Ending } from '../../decision/decide-verdict';
import { faultCodes } from '../../run/fault-codes';
import { measuring, stay, type StepContext, type StepMachine, type StepTurn } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import type { OutputState } from '../../search/types';
import type { Measurement } from '../../run/types';
import { pathOnThenDown } from '../../run/procedures/supply-moves';
import type { RideThroughStep } from './schema';

export type RideThroughMachine =
  { stage: 'moving'; path: FollowPath } | { stage: 'pulsing' } | { stage: 'looking'; seconds: number };
type Turn = StepTurn<RideThroughMachine>;

/** Asked for beyond the step's own, so that a switch a little early does not fall short of what has to be shown. */
const longer = 1.01;

/** Interrupts the board's supply for the milliseconds given; the output must stay on. Needs a fixture controller. */
export const machine: StepMachine<RideThroughStep, RideThroughMachine> = {
  begin(step, context) {
    const { plan } = context;
    if (!plan.hasController) return { ending: noController };
    const { waypointMs, settleMs } = plan.commissioning;
    const floorVolts = (step.atVolts + plan.boardType.limits.tripVolts.max) / 2;
    const { machine, ask } = beginPath(pathOnThenDown(step.atVolts, floorVolts, context), { waypointMs, settleMs });
    return { machine: { stage: 'moving', path: machine }, ask };
  },

  advance(machine, event, step, context) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'moving') {
      const turn = advancePath(machine.path, event);
      if (!turn) return stay(machine);
      if ('ask' in turn) return { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask };
      if (turn.result.output === 'off') return { ending: offBeforehand };
      return { machine: { stage: 'pulsing' }, ask: { kind: 'pulse', seconds: (step.milliseconds / 1000) * longer } };
    }
    if (machine.stage === 'pulsing') {
      if (event.kind !== 'pulsed') return stay(machine);
      const neededMs = Math.max(step.milliseconds, context.plan.boardType.limits.rideThroughSeconds.min * 1000);
      // A shorter one proves nothing about the board: that is the fixture's fault.
      if (event.seconds * 1000 < neededMs) return { ending: tooShort(event.seconds * 1000, neededMs) };
      return { machine: { stage: 'looking', seconds: event.seconds }, ask: { kind: 'sense' } };
    }
    return event.kind === 'sensed' ? conclude(machine.seconds, event.output, context) : stay(machine);
  },

  view: () => measuring({ code: 'run.ride-through' }),
};

const noController: Ending = {
  kind: 'no-verdict',
  reason: 'fixture-fault',
  code: faultCodes.noController,
  detail: { code: 'run.no-controller' },
  fault: null,
};

/** Verified inside its limits, the board holds here; when it does not, its point has moved since. */
const offBeforehand: Ending = {
  kind: 'reject',
  reason: 'not-repeatable',
  cause: 'noisy-wiper-or-contact',
  measured: null,
};

const tooShort = (milliseconds: number, wanted: number): Ending => ({
  kind: 'no-verdict',
  reason: 'fixture-fault',
  code: faultCodes.pulseWidth,
  detail: { code: 'run.pulse-too-short', params: { milliseconds: Number(milliseconds.toPrecision(3)), wanted } },
  fault: null,
});

/** `value` is the interruption that was made; it passes only when the output stayed on. */
function conclude(seconds: number, output: OutputState, context: StepContext): Turn {
  const limits = context.plan.boardType.limits.rideThroughSeconds;
  const measurement: Measurement = judged(
    { quantity: 'ride-through-seconds', phase: 'check', value: seconds, limits, budget: null },
    context,
  );
  if (output === 'on') return { done: true, measurements: [measurement] };
  const failed = { ...measurement, passed: false };
  return {
    ending: { kind: 'reject', cause: 'reservoir-missing', ...reasonFor(failed) },
    measurements: [failed],
  };
}
