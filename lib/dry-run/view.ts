import type { DryRunResult, DryRunSettings, DryRunView } from '../contracts/dry-run';
import type { DryRunState } from '../contracts/stored-states';

interface Told {
  id: string;
  state: DryRunState;
  settings: DryRunSettings;
  draftVersion: number;
  done: number;
  of: number;
  result: DryRunResult | null;
  problem: string | null;
  kept: boolean;
  askedAt: Date;
}

/** A stored dry run as the page shows it; the time left follows from what was done so far. */
export function viewDryRun(
  run: Told,
  beside: { revisionNumber: number; releasedNumber: number | null; askedByName: string },
): DryRunView {
  const { done, of, result } = run;
  return {
    id: run.id,
    state: run.state,
    settings: run.settings,
    revisionNumber: beside.revisionNumber,
    draftVersion: run.draftVersion,
    releasedNumber: beside.releasedNumber,
    done,
    of,
    leftMs: run.state === 'running' && result && done > 0 ? (result.elapsedMs * (of - done)) / done : null,
    result,
    problem: run.problem,
    kept: run.kept,
    askedBy: beside.askedByName,
    askedAtIso: run.askedAt.toISOString(),
  };
}
