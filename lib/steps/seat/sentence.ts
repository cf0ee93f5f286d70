import { milliamps, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Check contacts at ',
  volts('contactCheck.volts', 'Contact check voltage'),
  ', at most ',
  milliamps('contactCheck.currentLimitAmps', 'Contact check current limit'),
  ', no contact above ',
  {
    field: 'contactCheck.mostMilliohms',
    label: 'Most contact resistance',
    input: 'number',
    unit: 'Ω',
    scale: 0.001,
    decimals: 1,
  },
];
