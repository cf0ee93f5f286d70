import type { SequenceFinding } from '../../sequence/finding';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { PowerUpStep } from './schema';

/** Rise of the supply above a step from zero that must stay below the absolute maximum: the largest overshoot considered. */
const largestOvershoot = 0.085;

export function rules(step: PowerUpStep, { boardType }: RuleContext): SequenceFinding[] {
  const { limits, absoluteMaximumVolts } = boardType;
  return [
    ...failing(step.overvoltageVolts > absoluteMaximumVolts, 'error', step, {
      problem: 'overvoltage-above-maximum',
      field: 'overvoltageVolts',
      sentence: 'The protection is above the absolute maximum.',
    }),
    ...failing(step.volts <= limits.releaseVolts.max, 'error', step, {
      problem: 'working-volts-too-low',
      field: 'volts',
      sentence: 'The board may not switch on.',
    }),
    ...failing(
      step.volts * (1 + largestOvershoot) > Math.min(step.overvoltageVolts, absoluteMaximumVolts),
      'error',
      step,
      {
        problem: 'working-volts-too-high',
        field: 'volts',
        sentence: 'The supply overshoots past the maximum.',
      },
    ),
  ];
}
