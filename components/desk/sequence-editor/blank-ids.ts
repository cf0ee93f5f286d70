import { blankKey } from '@/lib/sequence/draft';

export const editorId = 'sequence-editor';
/** Ids by which messages, problems and shortcuts find a blank and its row. */
export const blankId = (stepId: string | null, field: string) => `blank-${blankKey(stepId ?? 'rule', field)}`;
export const messagesId = (stepId: string | null, field: string) => `${blankId(stepId, field)}-messages`;
export const rowId = (stepId: string) => `step-${stepId}`;

/** Puts the focus on a blank, or on the first thing in its step's row. */
export function goTo({ stepId, field }: { stepId: string | null; field: string | null }): void {
  const row = stepId === null ? document.getElementById('rule') : document.getElementById(rowId(stepId));
  const blank = field === null ? null : document.getElementById(blankId(stepId, field));
  const target = blank ?? row?.querySelector<HTMLElement>('[data-blank]') ?? row?.querySelector<HTMLElement>('button');
  row?.scrollIntoView({ block: 'nearest' });
  target?.focus();
}
