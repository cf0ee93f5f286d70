import { count, milliseconds, millivolts, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Search from ',
  volts('windowMinVolts', 'Window from'),
  ' to ',
  volts('windowMaxVolts', 'Window to'),
  ' until the standard uncertainty is ',
  millivolts('wantedUncertaintyVolts', 'Wanted standard uncertainty', { decimals: 2 }),
  ', at most ',
  count('mostSettles', 'Most settles'),
  ' settles of ',
  milliseconds('settleMs', 'Settle time'),
];
