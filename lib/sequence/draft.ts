import type { DecisionRule, Sequence, Step } from './step';

/**
 * What another person saved where this draft was changed too. The draft keeps its own until one is chosen; `by` is their name.
 * `removed-there`: they removed the step; `removed-here`: it was removed here and stands again as they changed it; `place`:
 * `after` is the step that it follows there, null the beginning; `step`: it became another step there.
 */
export type Conflict = { by: string } & (
  | { kind: 'value'; stepId: string; field: string; theirs: unknown }
  | { kind: 'step'; stepId: string; theirs: Step }
  | { kind: 'removed-there'; stepId: string }
  | { kind: 'removed-here'; stepId: string }
  | { kind: 'place'; stepId: string; after: string | null }
  | { kind: 'rule'; theirs: DecisionRule }
  | { kind: 'reason'; key: string; theirs: string }
);

/** A draft in the editor, immutable. */
export interface Draft {
  sequence: Sequence;
  /** Reasons given for warnings, by `findingKey`. */
  warningReasons: Readonly<Record<string, string>>;
  /** Texts that cannot be read yet, by `blankKey`; the step keeps its last value meanwhile. */
  unread: Readonly<Record<string, string>>;
  conflicts: readonly Conflict[];
}

/** What is stored of a draft. */
export type StoredDraft = Pick<Draft, 'sequence' | 'warningReasons'>;

export const blankKey = (stepId: string, field: string): string => `${stepId}/${field}`;
/** Blank of the factor in the decision rule. */
export const ruleFactorKey = blankKey('rule', 'factor');

export function openDraft({ sequence, warningReasons }: StoredDraft): Draft {
  return { sequence, warningReasons, unread: {}, conflicts: [] };
}

/** Same content, whatever the order of keys in records. */
export function isSameDraft(a: StoredDraft, b: StoredDraft): boolean {
  return sameContent(a.sequence, b.sequence) && sameContent(a.warningReasons, b.warningReasons);
}

/** Equal as stored: keys that are absent and keys in another order make no difference. */
export function sameContent(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (a === null || b === null || typeof a !== 'object' || typeof b !== 'object') return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const [left, right] = [a as Record<string, unknown>, b as Record<string, unknown>];
  return [...new Set([...Object.keys(left), ...Object.keys(right)])].every((key) => sameContent(left[key], right[key]));
}

/** What names a conflict: one for each thing that both changed. */
export function conflictKey(conflict: Conflict): string {
  switch (conflict.kind) {
    case 'value':
      return `value:${blankKey(conflict.stepId, conflict.field)}`;
    case 'rule':
      return 'rule';
    case 'reason':
      return `reason:${conflict.key}`;
    case 'place':
      return `place:${conflict.stepId}`;
    default:
      return `step:${conflict.stepId}`;
  }
}
