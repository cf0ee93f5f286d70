import { choice, count, millivolts, volts } from '../blanks';
import type { SentencePart } from '../step-kind';
import type { TrimStep } from './schema';

const procedures = [
  { value: 'two-beeps', label: 'between two beeps' },
  { value: 'prompted', label: 'turn by turn' },
  { value: 'wiper-probe', label: 'watching the wiper' },
];

/** With the procedure goes what a round of it is. */
const roundWords: Record<TrimStep['procedure'], string> = {
  'two-beeps': ' pairs of beeps',
  prompted: ' prompted turns',
  'wiper-probe': ' turns watched',
};

export const sentence = ({ procedure }: TrimStep): SentencePart[] => [
  'Trim ',
  choice('procedure', 'Procedure', procedures),
  ' until it trips at ',
  volts('targetVolts', 'Target', { tone: 'trip' }),
  ' within ',
  millivolts('toleranceVolts', 'Tolerance', { decimals: 0 }),
  ', at most ',
  count('mostRounds', 'Most rounds'),
  roundWords[procedure],
];
