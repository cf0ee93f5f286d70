import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => ['Supply off with read-back, verdict, label or red bin'];
