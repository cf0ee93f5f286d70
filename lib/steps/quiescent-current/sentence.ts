import { milliseconds } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Read the current with the load off, between the points, settled ',
  milliseconds('settleMs', 'Settle time'),
];
