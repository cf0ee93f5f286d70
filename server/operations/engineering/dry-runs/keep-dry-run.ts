import { findDryRun, setDryRunKept } from '@/db/queries/dry-runs';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Keeps a dry run that is done with its revision, or lets it go with the next. Codes: dry-run-unknown, dry-run-not-done. */
export async function keepDryRun(actor: Actor, id: string, kept: boolean): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const found = await findDryRun(tx, id);
    if (!found) return refusal('dry-run-unknown', 'This dry run does not exist any more.');
    if (!(await setDryRunKept(tx, id, kept)))
      return refusal('dry-run-not-done', 'Only a dry run that went through can be kept.');
    await insertTrail(tx, actor, {
      action: kept ? 'dry-run.kept' : 'dry-run.let-go',
      entity: 'sequence-revision',
      entityId: found.run.revisionId,
      after: { dryRunId: id },
    });
    return done;
  });
}
