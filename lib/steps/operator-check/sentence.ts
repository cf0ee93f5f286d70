import { words } from '../blanks';
import type { SentencePart } from '../step-kind';

export const sentence = (): SentencePart[] => ['Ask: ', words('question', 'Question')];
