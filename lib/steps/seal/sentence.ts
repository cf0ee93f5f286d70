import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => [
  'Supply off, seal the screw, close the lid, check contacts, supply on again',
];
