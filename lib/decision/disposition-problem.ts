import { dispositionKinds, type DispositionKind } from '../contracts/stored-states';
import { boardStanding, type BoardRecord } from './board-standing';

export type DispositionProblem =
  'nothing-to-decide' | 'changed-meanwhile' | 'attempts-used' | 'no-verdict-to-concede' | 'concession-waits';

/**
 * Why this cannot be decided about a board now; null when it can. `runId` is the run that the decision answers, as its signer saw
 * it: the board must not have been tested since.
 */
export function dispositionProblem(
  kind: DispositionKind,
  record: BoardRecord,
  runId: string,
): DispositionProblem | null {
  const standing = boardStanding(record).kind;
  const run = record.runs.at(-1);
  const waits = standing === 'needs-disposition' || standing === 'waits-for-quality' || standing === 'attempts-used';
  if (!run || !waits) return 'nothing-to-decide';
  if (run.id !== runId) return 'changed-meanwhile';
  if (kind === 'rework' && attemptsUsed(record)) return 'attempts-used';
  if (kind !== 'concession') return null;
  if (run.verdict !== 'reject') return 'no-verdict-to-concede';
  return record.dispositions.some((each) => each.runId === runId && !each.complete) ? 'concession-waits' : null;
}

/** Whether no attempt is left, so that a rework would lead nowhere. */
export function attemptsUsed({ runs, mostAttempts }: Pick<BoardRecord, 'runs' | 'mostAttempts'>): boolean {
  return runs.filter(({ verdict }) => verdict === 'pass' || verdict === 'reject').length >= mostAttempts;
}

/** What can be decided about a board now, the likeliest first. */
export function decidableKinds(record: BoardRecord): DispositionKind[] {
  const newest = record.runs.at(-1)?.id ?? '';
  return dispositionKinds.filter((kind) => dispositionProblem(kind, record, newest) === null);
}
