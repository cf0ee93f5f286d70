import type { PowerUp } from '../../run/procedures/power-up';
import { middleOf } from '../fresh-values';
import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine } from './machine';
import { rules } from './rules';
import { schema, type PowerUpStep } from './schema';
import { sentence } from './sentence';

/** Midway between what switches every board on and what an overshoot may take to its maximum; four times the load's current. */
const fresh: StepKindDefinition<PowerUpStep>['fresh'] = ({ limits, design, absoluteMaximumVolts }) => {
  const volts = middleOf({ min: limits.releaseVolts.max, max: absoluteMaximumVolts / 1.085 });
  const amps = volts / design.loadOhms + design.quiescentAmps;
  return {
    kind: 'power-up',
    volts: Math.round(volts * 10) / 10,
    currentLimitAmps: Math.ceil(4 * amps * 20) / 20,
    overvoltageVolts: absoluteMaximumVolts,
    settleMs: 250,
  };
};

export const powerUp: StepKindDefinition<PowerUpStep, PowerUp> = {
  kind: 'power-up',
  word: 'Power up',
  purpose: 'Current limit and protection first, then the supply.',
  group: 'seat',
  schema,
  fresh,
  rules,
  needs: () => [],
  required: () => checks('supply-amps'),
  machine,
  typicalAct: () => null,
  sentence,
};
