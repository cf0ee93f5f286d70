import type { SequenceFinding } from '../../sequence/finding';
import { firstOf } from '../../sequence/enabled-steps';
import { settleRules, settlesRules, supplyRules } from '../common-rules';
import { failing, setTo } from '../failing';
import { voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { FindPointsStep } from './schema';

/** The station settles for its own time where that is longer, so that a short one only misleads. */
export const rules = (step: FindPointsStep, context: RuleContext): SequenceFinding[] => [
  ...supplyRules(step, 'windowMaxVolts', step.windowMaxVolts, context),
  ...coverRules(step, context),
  ...settleRules(step, context, 'warning'),
  ...settlesRules(step),
];

/** The sweep has to cover the limits; below them, boards as they come in. */
function coverRules(step: FindPointsStep, context: RuleContext): SequenceFinding[] {
  const { limits, search, absoluteMaximumVolts } = context.boardType;
  const top = Math.min(absoluteMaximumVolts, firstOf(context, 'power-up')?.overvoltageVolts ?? absoluteMaximumVolts);
  const { windowMinVolts, windowMaxVolts } = step;
  const below = setTo(step, 'windowMinVolts', search.supplyMinVolts, voltsText(search.supplyMinVolts));
  const missesTrip = windowMinVolts >= limits.tripVolts.min;
  return [
    ...failing(missesTrip, 'error', step, {
      problem: 'window-misses-limits',
      field: 'windowMinVolts',
      sentence: `The window begins at ${voltsText(windowMinVolts)}. A board within its limits may trip at ${voltsText(limits.tripVolts.min)}.`,
      mend: below,
    }),
    ...failing(!missesTrip && windowMinVolts >= search.tripVolts.min, 'warning', step, {
      problem: 'window-too-narrow',
      field: 'windowMinVolts',
      sentence: `The window begins at ${voltsText(windowMinVolts)}. Boards come in tripping from ${voltsText(search.tripVolts.min)} on; those below it are rejected.`,
      mend: below,
    }),
    ...failing(windowMaxVolts <= limits.releaseVolts.max, 'error', step, {
      problem: 'window-misses-limits',
      field: 'windowMaxVolts',
      sentence: `The window ends at ${voltsText(windowMaxVolts)}. A board within its limits may release at ${voltsText(limits.releaseVolts.max)}.`,
      mend: top > limits.releaseVolts.max ? setTo(step, 'windowMaxVolts', top, voltsText(top)) : null,
    }),
  ];
}
