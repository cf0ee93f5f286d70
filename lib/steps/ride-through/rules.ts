import type { SequenceFinding } from '../../sequence/finding';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { RideThroughStep } from './schema';

export function rules(step: RideThroughStep, { boardType }: RuleContext): SequenceFinding[] {
  const { tripVolts, releaseVolts, rideThroughSeconds } = boardType.limits;
  return [
    ...failing(step.atVolts <= tripVolts.max || step.atVolts >= releaseVolts.min, 'error', step, {
      problem: 'ride-through-not-between-points',
      field: 'atVolts',
      sentence: 'The supply is not between the points.',
    }),
    ...failing(step.milliseconds / 1000 < rideThroughSeconds.min, 'error', step, {
      problem: 'ride-through-too-short',
      field: 'milliseconds',
      sentence: 'The interruption is shorter than the limit.',
    }),
  ];
}
