import { words } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Say: ',
  words('text', 'Instruction'),
  ', show ',
  { field: 'pictureId', label: 'Picture', input: 'picture', whenNull: 'no picture' },
  ', supply off first ',
  { field: 'supplyOff', label: 'Supply off first', input: 'switch' },
];
