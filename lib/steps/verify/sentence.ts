import { count, milliseconds, millivolts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Measure ',
  count('repeats', 'Repeats'),
  ' times until the standard uncertainty is ',
  millivolts('wantedUncertaintyVolts', 'Wanted standard uncertainty', { decimals: 2 }),
  ', spread at most ',
  millivolts('mostSpreadVolts', 'Most spread'),
  ', at most ',
  count('mostSettles', 'Most settles'),
  ' settles of ',
  milliseconds('settleMs', 'Settle time'),
];
