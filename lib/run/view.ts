import type { RailsView, RunView, SupplyView } from '../contracts/bench-view';
import type { BoardType } from '../contracts/board-type';
import { kindOf } from '../steps/step-kinds';
import { stepGroups, type Sequence, type StepGroup } from '../sequence/step';
import type { SupplyFact } from './facts';
import type { StepContext } from './machine';
import { printedRails, railsOf } from './rails';
import type { RunState } from './state';

/** The words of the step line that a sequence has, in their order. */
export function groupsOf(sequence: Sequence): StepGroup[] {
  const present = new Set(sequence.steps.filter(({ enabled }) => enabled).map((step) => kindOf(step).group));
  return stepGroups.filter((group) => present.has(group));
}

/** What the next run of a lot will be: shown while idle. */
export function viewNextRun(boardType: BoardType, sequence: Sequence): { stepGroups: StepGroup[]; rails: RailsView } {
  return { stepGroups: groupsOf(sequence), rails: printedRails(boardType, sequence) };
}

/** What the bench shows of a run. */
export function viewRun(state: RunState): RunView {
  const { plan, facts } = state;
  return {
    serial: plan.serial,
    attempt: plan.attempt,
    stepGroups: stepLine(state),
    rails: railsOf(state),
    supply: supplyView(facts.supply),
    startedAtMs: state.startedAtMs,
    screen: screenOf(state),
  };
}

function stepLine({ plan, stepIndex, phase }: RunState): RunView['stepGroups'] {
  const { steps } = plan.sequence;
  const passed = phase.kind === 'over' && 'verdict' in phase.decision;
  const current = steps[Math.min(stepIndex, steps.length - 1)];
  return groupsOf(plan.sequence).map((group) => {
    if (passed) return { group, state: 'done' };
    if (current && kindOf(current).group === group) return { group, state: 'current' };
    const ahead = steps.some((step, index) => step.enabled && kindOf(step).group === group && index > stepIndex);
    return { group, state: ahead ? 'ahead' : 'done' };
  });
}

/** The part of the step line that an event now belongs to. */
export function currentGroup({ stepGroups: line }: RunView): StepGroup {
  return line.find((each) => each.state === 'current')?.group ?? 'record';
}

/** Off is said only after the read-back, or while nothing was ever switched on. */
function supplyView(supply: SupplyFact): SupplyView {
  switch (supply.state) {
    case 'off':
      return { state: 'off', volts: supply.volts ?? 0 };
    case 'on':
      return { state: 'on', volts: supply.volts };
    case 'maybe-on':
      return { state: 'maybe-on' };
  }
}

/** The part of the view that asks something of a person. */
export function screenOf(state: RunState): RunView['screen'] {
  const { phase, plan, stepIndex, facts, atMs } = state;
  if (phase.kind === 'steps') {
    const step = plan.sequence.steps[stepIndex]!;
    const context: StepContext = { plan, facts, stepIndex, atMs };
    return kindOf(step).machine.view(state.machine, step, context);
  }
  const { decision } = phase;
  if ('verdict' in decision) return { kind: 'pass', seconds: (atMs - state.startedAtMs) / 1000 };
  if (decision.kind === 'reject') {
    return { kind: 'reject', reason: decision.reason, cause: decision.cause, measured: decision.measured };
  }
  return {
    kind: 'no-verdict',
    reason: decision.reason,
    code: decision.code,
    detail: decision.detail,
    failingWhenStopped: state.failingWhenStopped,
    stoppedAtVolts: state.stoppedAtVolts,
  };
}
