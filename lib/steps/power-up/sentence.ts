import { amps, milliseconds, volts } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Raise to ',
  volts('volts', 'Working supply'),
  ', current limit ',
  amps('currentLimitAmps', 'Current limit'),
  ', protection at ',
  volts('overvoltageVolts', 'Overvoltage protection'),
  ', settle ',
  milliseconds('settleMs', 'Settle time'),
];
