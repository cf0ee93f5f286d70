import type { SentenceField } from './step-kind';

type More = Partial<SentenceField>;

/** Blanks of a step's sentence in the units in which people speak: millivolts and milliamperes where values are small. */
export const volts = (field: string, label: string, more: More = {}): SentenceField => ({
  field,
  label,
  input: 'number',
  unit: 'V',
  decimals: 2,
  ...more,
});
export const millivolts = (field: string, label: string, more: More = {}): SentenceField => ({
  field,
  label,
  input: 'number',
  unit: 'mV',
  scale: 1000,
  decimals: 1,
  ...more,
});
export const amps = (field: string, label: string): SentenceField => ({
  field,
  label,
  input: 'number',
  unit: 'A',
  decimals: 3,
});
export const milliamps = (field: string, label: string): SentenceField => ({
  field,
  label,
  input: 'number',
  unit: 'mA',
  scale: 1000,
  decimals: 0,
});
export const milliseconds = (field: string, label: string): SentenceField => ({
  field,
  label,
  input: 'number',
  unit: 'ms',
  decimals: 0,
});
export const count = (field: string, label: string): SentenceField => ({ field, label, input: 'whole-number' });
export const words = (field: string, label: string): SentenceField => ({ field, label, input: 'text' });

export function choice(field: string, label: string, options: NonNullable<SentenceField['options']>): SentenceField {
  return { field, label, input: 'choice', options };
}

export const channel = choice('channel', 'Channel', [
  { value: 101, label: 'the supply (channel 101)' },
  { value: 102, label: 'the output (channel 102)' },
  { value: 103, label: 'the reference (channel 103)' },
  { value: 104, label: 'the wiper (channel 104)' },
]);
