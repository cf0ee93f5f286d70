import { channel, count, milliseconds, millivolts, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Read ',
  channel,
  ' at ',
  volts('atVolts', 'Supply', { whenNull: 'the standing supply' }),
  ', ',
  count('readings', 'Readings'),
  ' times, every ',
  milliseconds('everyMs', 'Interval'),
  '; drift at most ',
  millivolts('mostDriftVolts', 'Most drift'),
];
