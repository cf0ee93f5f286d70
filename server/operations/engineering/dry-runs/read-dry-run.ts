import { findDryRun, findNewestDryRun, type DryRunHead } from '@/db/queries/dry-runs';
import type { DryRunPage, DryRunView } from '@/lib/contracts/dry-run';
import { viewDryRun } from '@/lib/dry-run/view';
import { database } from '@/server/postgres';

const view = ({ run, ...beside }: DryRunHead): DryRunView => viewDryRun(run, beside);

export async function readDryRun(id: string): Promise<DryRunView | null> {
  const found = await findDryRun(database(), id);
  return found && view(found);
}

/** The newest of a revision, for its editor; null: none yet. */
export async function readNewestDryRun(revisionId: string): Promise<DryRunView | null> {
  const found = await findNewestDryRun(database(), revisionId);
  return found && view(found);
}

/** A dry run with what it ran on. */
export async function readDryRunPage(id: string): Promise<DryRunPage | null> {
  const found = await findDryRun(database(), id);
  if (!found) return null;
  const { run, sequenceId, sequenceName, releasedSequence } = found;
  return {
    view: view(found),
    revisionId: run.revisionId,
    sequenceId,
    sequenceName,
    sequence: run.sequence,
    releasedSequence,
    boardType: run.boardType,
  };
}
