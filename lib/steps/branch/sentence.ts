import { choice, count } from '../blanks';
import type { SentencePart } from '../step-kind';

const quantities = [
  { value: 'trip-volts', label: 'the trip point' },
  { value: 'release-volts', label: 'the release point' },
  { value: 'hysteresis-volts', label: 'the hysteresis' },
  { value: 'reference-volts', label: 'the reference' },
  { value: 'channel-volts', label: 'the channel last measured' },
  { value: 'drift-volts', label: 'the drift last measured' },
];
const sides = [
  { value: 'below', label: 'below' },
  { value: 'above', label: 'above' },
];

export const sentence = (): SentencePart[] => [
  'If ',
  choice('quantity', 'Quantity', quantities),
  ' is ',
  choice('is', 'Comparison', sides),
  ' ',
  { field: 'value', label: 'Value', input: 'number', unit: 'V', decimals: 3 },
  ', go on at ',
  { field: 'goTo', label: 'Go on at', input: 'step' },
  ', at most ',
  count('mostTimes', 'Most times'),
  ' times',
];
