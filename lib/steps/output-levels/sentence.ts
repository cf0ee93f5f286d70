import { milliseconds } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Read the high output at the working supply and the low one at the lowest, settled ',
  milliseconds('settleMs', 'Settle time'),
];
