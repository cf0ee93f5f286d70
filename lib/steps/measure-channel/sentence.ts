import { channel, milliseconds, volts } from '../blanks';
import type { SentenceField, SentencePart } from '../step-kind';

const cycles: SentenceField = {
  field: 'integrationCycles',
  label: 'Integration',
  input: 'number',
  unit: 'power-line cycles',
  decimals: 2,
};

export const sentence = (): SentencePart[] => [
  'Measure ',
  channel,
  ' at ',
  volts('atVolts', 'Supply', { whenNull: 'the standing supply' }),
  ', settled ',
  milliseconds('settleMs', 'Settle time'),
  ', integrated over ',
  cycles,
  ', from ',
  volts('minVolts', 'Lower limit', { decimals: 3, whenNull: 'no limit' }),
  ' to ',
  volts('maxVolts', 'Upper limit', { decimals: 3, whenNull: 'no limit' }),
];
