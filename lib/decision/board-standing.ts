import type { DispositionKind } from '../contracts/stored-states';
import type { Verdict } from '../run/types';

/** Runs without a verdict after which a board waits for quality. */
export const mostRunsWithoutVerdict = 3;

/** What is on record of one board; production runs only, oldest first. Times are ISO. */
export interface BoardRecord {
  scrapped: boolean;
  runs: {
    id: string;
    endedAt: string | null;
    /** Null: the run is open. */
    verdict: Verdict | null;
    failingWhenStopped: boolean;
  }[];
  dispositions: {
    runId: string;
    kind: DispositionKind;
    signedAt: string;
    /** False while a concession lacks its second signature. */
    complete: boolean;
  }[];
  retestOrders: { id: string; usedByRunId: string | null }[];
  mostAttempts: number;
}

export type BoardStanding =
  /** `retestOrderId`: the order that the run would be made under. */
  | { kind: 'may-be-tested'; retestOrderId: string | null }
  | { kind: 'in-test' }
  | { kind: 'passed'; at: string }
  | { kind: 'scrapped' }
  | { kind: 'returned' }
  | { kind: 'used-as-is' }
  | { kind: 'needs-disposition' }
  | { kind: 'waits-for-quality'; because: 'failing-when-stopped' | 'three-without-verdict' }
  | { kind: 'attempts-used'; most: number };

/**
 * May this board be tested, and if not, why. A pass is final unless quality ordered a retest; a reject needs a rework, and
 * attempts with a verdict are limited; stopping a failing run, or three runs without a verdict, waits for quality.
 */
export function boardStanding(board: BoardRecord): BoardStanding {
  const { runs, dispositions } = board;
  if (board.scrapped) return { kind: 'scrapped' };
  if (runs.some((run) => run.verdict === null)) return { kind: 'in-test' };

  // An order serves until its run gives a verdict: a run that broke off decides nothing.
  const order = board.retestOrders.find(({ usedByRunId }) => {
    const run = runs.find(({ id }) => id === usedByRunId);
    return usedByRunId === null || (run?.verdict === 'no-verdict' && !run.failingWhenStopped);
  });
  const lastVerdict = runs.findLastIndex((run) => run.verdict !== 'no-verdict');
  const answered = (from: number) => runs.slice(from).flatMap((run) => dispositions.filter((d) => d.runId === run.id));
  if (order && !brokenOff(runs.slice(lastVerdict + 1), order.usedByRunId))
    return { kind: 'may-be-tested', retestOrderId: order.id };

  const decision = answered(Math.max(lastVerdict, 0))
    .filter((d) => d.complete)
    .sort((a, b) => a.signedAt.localeCompare(b.signedAt))
    .at(-1);
  if (decision?.kind === 'scrap') return { kind: 'scrapped' };
  if (decision?.kind === 'return') return { kind: 'returned' };
  if (decision?.kind === 'concession') return { kind: 'used-as-is' };

  const reworkedAt = decision ? runs.findIndex((run) => run.id === decision.runId) : -1;
  const since = runs.slice(Math.max(lastVerdict, reworkedAt) + 1);
  const waits = waitsBecause(since);
  if (waits) return { kind: 'waits-for-quality', because: waits };

  const verdict = runs[lastVerdict]?.verdict ?? null;
  if (verdict === 'pass' && !decision) return { kind: 'passed', at: runs[lastVerdict]!.endedAt ?? '' };
  if (verdict === 'reject' && !decision) return { kind: 'needs-disposition' };
  if (runs.filter((run) => run.verdict !== 'no-verdict').length >= board.mostAttempts)
    return { kind: 'attempts-used', most: board.mostAttempts };
  return { kind: 'may-be-tested', retestOrderId: null };
}

function waitsBecause(since: BoardRecord['runs']): 'failing-when-stopped' | 'three-without-verdict' | null {
  if (since.some((run) => run.failingWhenStopped)) return 'failing-when-stopped';
  return since.length >= mostRunsWithoutVerdict ? 'three-without-verdict' : null;
}

/** Whether the runs made under this order already ask for quality again. */
function brokenOff(since: BoardRecord['runs'], usedByRunId: string | null): boolean {
  if (usedByRunId === null) return false;
  const under = since.slice(since.findIndex((run) => run.id === usedByRunId));
  return waitsBecause(under) !== null;
}
