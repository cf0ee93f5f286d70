import { milliamps, milliseconds } from '@/lib/steps/blanks';
import type { SentencePart } from '@/lib/steps/step-kind';

export const sentence = (): SentencePart[] => [
  'Read the current, settled ',
  milliseconds('settleMs', 'Settle time'),
  ', at most ',
  milliamps('mostAmps', 'Most current'),
];
