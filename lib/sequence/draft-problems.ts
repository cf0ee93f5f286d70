import { ruleFactorKey, type Draft } from './draft';
import { findingKey, type SequenceFinding } from './finding';

/** A place to go to: a step, or null for what concerns the whole sequence; the field within it where there is one. */
export interface ProblemPlace {
  stepId: string | null;
  field: string | null;
}

/** Every error of a draft in the order of its steps: what the rules say, and texts that cannot be read. */
export function errorsOf(draft: Draft, findings: readonly SequenceFinding[]): ProblemPlace[] {
  const unread = Object.keys(draft.unread).map((key) => {
    const at = key.indexOf('/');
    return { stepId: key === ruleFactorKey ? null : key.slice(0, at), field: key.slice(at + 1) };
  });
  const found = findings.filter(({ severity }) => severity === 'error');
  return inOrder(draft, [...unread, ...found.map(({ stepId, field }) => ({ stepId, field }))]);
}

/** Warnings without a reason that is long enough to be kept. */
export function unreasoned(draft: Draft, findings: readonly SequenceFinding[]): SequenceFinding[] {
  return findings.filter(
    (finding) => finding.severity === 'warning' && !isReason(draft.warningReasons[findingKey(finding)]),
  );
}

/** Five characters, as every recorded reason. */
export const isReason = (reason: string | undefined): boolean => (reason ?? '').trim().length >= 5;

function inOrder(draft: Draft, places: ProblemPlace[]): ProblemPlace[] {
  const rank = new Map(draft.sequence.steps.map(({ id }, place) => [id, place]));
  return places
    .map((place) => ({ place, at: place.stepId === null ? -1 : (rank.get(place.stepId) ?? -1) }))
    .sort((a, b) => a.at - b.at)
    .map(({ place }) => place);
}

const many = (count: number, one: string, more: string) => (count === 1 ? `1 ${one}` : `${count} ${more}`);

/** "1 error to fix"; null where there is none. */
export function errorCount(count: number): string | null {
  return count === 0 ? null : `${many(count, 'error', 'errors')} to fix`;
}

/** Why the draft cannot be submitted now; null: it can. */
export function submitBlocked(state: {
  errors: number;
  unreasoned: number;
  conflicts: number;
  unsaved: boolean;
}): string | null {
  if (state.conflicts > 0) return `${many(state.conflicts, 'choice', 'choices')} between two texts to make.`;
  if (state.errors > 0) return 'Errors first.';
  if (state.unreasoned > 0) return `${many(state.unreasoned, 'warning needs', 'warnings need')} a reason.`;
  return state.unsaved ? 'Not saved yet.' : null;
}
