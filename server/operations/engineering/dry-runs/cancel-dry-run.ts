import { cancelDryRun as cancelRow, findDryRun } from '@/db/queries/dry-runs';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Stops a dry run; what it found so far stays. One that is over stays as it is. Codes: dry-run-unknown. */
export async function cancelDryRun(actor: Actor, id: string): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const found = await findDryRun(tx, id);
    if (!found) return refusal('dry-run-unknown', 'This dry run does not exist any more.');
    if (await cancelRow(tx, id))
      await insertTrail(tx, actor, {
        action: 'dry-run.cancelled',
        entity: 'sequence-revision',
        entityId: found.run.revisionId,
      });
    return done;
  });
}
