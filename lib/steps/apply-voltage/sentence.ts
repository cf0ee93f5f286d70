import { milliseconds, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Bring the supply to ',
  volts('volts', 'Supply'),
  ' and wait ',
  milliseconds('waitMs', 'Wait'),
];
