import type { SequenceFinding } from '../../sequence/finding';
import { pointUncertainty, settleRules, settlesRules } from '../common-rules';
import { failing, setTo } from '../failing';
import { millivoltsText, upTo, voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { VerifyStep } from './schema';

/** Range of the repeats of one point that 1 board in 100 exceeds by chance, in standard deviations (studentized range, infinite degrees). */
const chanceRange = [0, 0, 3.64, 4.12, 4.4, 4.6, 4.76, 4.88, 4.99, 5.08, 5.16];

export const rules = (step: VerifyStep, context: RuleContext): SequenceFinding[] => [
  ...guardRules(step, context),
  ...spreadRules(step),
  ...settleRules(step, context, 'warning'),
  ...settlesRules(step),
];

/** Something has to be left of the limits when the guard is taken off on both sides. */
function guardRules(step: VerifyStep, context: RuleContext): SequenceFinding[] {
  const { tripVolts, releaseVolts } = context.boardType.limits;
  return [tripVolts, releaseVolts]
    .flatMap(({ min, max }) => {
      const { guard, expanded } = pointUncertainty((min + max) / 2, context);
      return failing(2 * guard >= max - min, 'error', step, {
        problem: 'guard-leaves-nothing',
        field: 'wantedUncertaintyVolts',
        sentence: `Nothing passes. U is ${millivoltsText(upTo(expanded, 4))}, and the guard leaves nothing of ${voltsText(min)} to ${voltsText(max)}.`,
      });
    })
    .slice(0, 1);
}

function spreadRules(step: VerifyStep): SequenceFinding[] {
  if (step.repeats < 2) return [];
  const chance = upTo(chanceRange[step.repeats]! * step.wantedUncertaintyVolts, 4);
  return failing(step.mostSpreadVolts < chance, 'warning', step, {
    problem: 'spread-below-scatter',
    field: 'mostSpreadVolts',
    sentence: `${millivoltsText(step.mostSpreadVolts)} is too little. ${step.repeats} searches may differ by ${millivoltsText(chance)} by chance.`,
    mend: setTo(step, 'mostSpreadVolts', chance, millivoltsText(chance)),
  });
}
