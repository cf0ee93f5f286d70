import type { Step } from '../sequence/step';

/** What a step is called inside a sentence of the rules: its own name, or its kind's in lower case. */
export const kindWords = ({ name, kind }: Pick<Step, 'name' | 'kind'>) => name || kind.replaceAll('-', ' ');
