import type { SequenceFinding } from '../../sequence/finding';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { FindPointsStep } from './schema';

export function rules(step: FindPointsStep, { boardType }: RuleContext): SequenceFinding[] {
  const { limits, search, absoluteMaximumVolts } = boardType;
  return [
    ...failing(step.windowMaxVolts > absoluteMaximumVolts, 'error', step, {
      problem: 'window-above-maximum',
      field: 'windowMaxVolts',
      sentence: 'The window ends above the absolute maximum.',
    }),
    ...failing(
      step.windowMinVolts >= search.tripVolts.min || step.windowMaxVolts <= limits.releaseVolts.max,
      'error',
      step,
      { problem: 'window-too-narrow', field: 'windowMinVolts', sentence: 'The window does not hold the points.' },
    ),
  ];
}
