import type { SequenceFinding } from '../../sequence/finding';

export const rules = (): SequenceFinding[] => [];
