import type { SequenceFinding } from '../../sequence/finding';
import { guardBandOf } from '../../decision/judge-value';
import { combineContributions } from '../../uncertainty/combine';
import { readingBudget } from '../../uncertainty/point-budget';
import { settleRules, supplyRules } from '../common-rules';
import { failing, setTo } from '../failing';
import { millivoltsText, upTo, voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { MeasureChannelStep } from './schema';

export const rules = (step: MeasureChannelStep, context: RuleContext): SequenceFinding[] => [
  ...supplyRules(step, 'atVolts', step.atVolts, context),
  ...(step.atVolts === null ? [] : settleRules(step, context, 'error', step.integrationCycles)),
  ...failing(step.integrationCycles < 1, 'warning', step, {
    problem: 'integration-below-a-cycle',
    field: 'integrationCycles',
    sentence: `Over ${step.integrationCycles} of a power-line cycle a reading takes in mains hum. A whole cycle averages it out.`,
    mend: setTo(step, 'integrationCycles', 1, '1 cycle'),
  }),
  ...limitRules(step, context),
];

function limitRules(step: MeasureChannelStep, { decisionRule, station }: RuleContext): SequenceFinding[] {
  const { minVolts: min, maxVolts: max } = step;
  if (min === null && max === null) {
    return failing(true, 'warning', step, {
      problem: 'channel-without-limits',
      field: 'minVolts',
      sentence: 'Nothing is judged. The value is kept in the record, and every board passes it.',
    });
  }
  if (min === null || max === null) return [];
  if (min >= max) {
    const changes = [
      { stepId: step.id, field: 'minVolts', value: max },
      { stepId: step.id, field: 'maxVolts', value: min },
    ];
    return failing(true, 'error', step, {
      problem: 'channel-limits-crossed',
      field: 'maxVolts',
      sentence: `The upper limit ${voltsText(max)} is not above the lower limit ${voltsText(min)}.`,
      mend: min > max ? { label: 'Swap them', changes } : null,
    });
  }
  const { expanded } = combineContributions(readingBudget([(min + max) / 2], station.meter));
  return failing(2 * guardBandOf(decisionRule, expanded) >= max - min, 'error', step, {
    problem: 'guard-leaves-nothing',
    field: 'maxVolts',
    sentence: `Nothing passes. U is ${millivoltsText(upTo(expanded, 4))}, and the guard leaves nothing of ${voltsText(min)} to ${voltsText(max)}.`,
  });
}
