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
  const base = 'min-h-[30px] max-w-full border-2 max-sm:min-h-[46px]';
  if (error) return `${base} border-reject bg-sheet`;
  if (warning) return `${base} border-ink bg-attn-wash`;
  return `${base} border-transparent bg-sheet hover:border-b-accent ${tone ? tones[tone] : 'border-b-rule'} [[data-selected=true]_&]:bg-paper`;
}
