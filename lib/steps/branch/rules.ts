import type { SequenceFinding } from '../../sequence/finding';
import type { Step } from '../../sequence/step';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { BranchStep } from './schema';
import { backwardRules, forwardRules } from './ways';

const measuredBy: Record<BranchStep['quantity'], { kinds: readonly Step['kind'][]; words: string }> = {
  'trip-volts': { kinds: ['find-points', 'trim', 'verify'], words: 'trip point' },
  'release-volts': { kinds: ['find-points', 'trim', 'verify'], words: 'release point' },
  'hysteresis-volts': { kinds: ['find-points', 'trim', 'verify'], words: 'hysteresis' },
  'reference-volts': { kinds: ['reference'], words: 'reference' },
  'channel-volts': { kinds: ['measure-channel'], words: 'channel' },
  'drift-volts': { kinds: ['soak'], words: 'drift' },
};

export function rules(step: BranchStep, context: RuleContext): SequenceFinding[] {
  const { steps, index } = context;
  const { kinds, words } = measuredBy[step.quantity];
  const unmeasured = !steps.slice(0, index).some(({ kind }) => kinds.includes(kind));
  return [
    ...failing(unmeasured, 'error', step, {
      problem: 'branch-never-measured',
      field: 'quantity',
      sentence: `Nothing before this step measures the ${words}, so the branch is never taken.`,
    }),
    ...targetRules(step, context),
  ];
}

function targetRules(step: BranchStep, context: RuleContext): SequenceFinding[] {
  const { steps, index, allSteps } = context;
  const at = { field: 'goTo' };
  if (step.goTo === step.id) {
    const sentence = 'The branch leads to itself. Choose another step.';
    return failing(true, 'error', step, { ...at, problem: 'branch-to-itself', sentence });
  }
  const target = allSteps.find(({ id }) => id === step.goTo);
  if (!target) {
    const sentence = 'The branch leads nowhere. Choose the step to go on at.';
    return failing(true, 'error', step, { ...at, problem: 'branch-target-missing', sentence });
  }
  if (!target.enabled) {
    return failing(true, 'error', step, {
      ...at,
      problem: 'branch-target-disabled',
      sentence: 'The step that the branch leads to is not run.',
      mend: { label: 'Run that step', changes: [{ stepId: target.id, field: 'enabled', value: true }] },
    });
  }
  const to = steps.indexOf(target);
  return to > index ? forwardRules(step, to, context) : backwardRules(step, to, context);
}
