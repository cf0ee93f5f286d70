import { milliseconds, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'At ',
  volts('atVolts', 'Supply'),
  ', settled ',
  milliseconds('settleMs', 'Settle time'),
  ', read the reference against its limits',
];
