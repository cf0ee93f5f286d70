import { settleRules } from '@/lib/steps/common-rules';
import { failing, setTo } from '@/lib/steps/failing';
import { ampsText } from '@/lib/steps/number-words';
import type { RuleContext } from '@/lib/steps/step-kind';
import type { SequenceFinding } from '@/lib/sequence/finding';
import type { LoadCurrentStep } from './schema';

export function rules(step: LoadCurrentStep, context: RuleContext): SequenceFinding[] {
  const least = context.boardType.limits.quiescentAmps.max;
  return [
    ...settleRules(step, context),
    ...failing(step.mostAmps < least, 'error', step, {
      problem: 'load-current-below-quiescent',
      field: 'mostAmps',
      sentence: `${ampsText(step.mostAmps)} is less than the ${ampsText(least)} that a board may draw at rest.`,
      mend: setTo(step, 'mostAmps', least, ampsText(least)),
    }),
  ];
}
