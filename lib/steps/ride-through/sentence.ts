import { milliseconds, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Interrupt the supply for ',
  milliseconds('milliseconds', 'Interruption'),
  ' at ',
  volts('atVolts', 'Supply'),
  '; the output must stay on',
];
