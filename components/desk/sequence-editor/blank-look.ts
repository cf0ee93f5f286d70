import type { SentenceField } from '@/lib/steps/step-kind';

export interface BlankState {
  /** Red frame: it cannot be read or a rule forbids it. */
  error: boolean;
  /** Amber, ink frame. */
  warning: boolean;
}

const tones = { trip: 'border-b-trip', release: 'border-b-release' } as const;

/** The frame of a blank: a heavier base line, in the colour of its point; frames where something is to be looked at. */
export function blankFrame({ error, warning }: BlankState, tone?: SentenceField['tone']): string {
  const base = 'min-h-[30px] max-w-full leading-[26px] max-sm:min-h-[46px] max-sm:leading-[42px]';
  if (error) return `${base} border-2 border-reject bg-sheet px-2`;
  if (warning) return `${base} border-2 border-ink bg-attn-wash px-2`;
  return `${base} border-0 border-b-2 bg-sheet px-2.5 hover:border-b-accent ${tone ? tones[tone] : 'border-b-rule'} [[data-selected=true]_&]:bg-paper`;
}
