import {
  deleteDryRunsNotKept,
  findDryRun,
  findReleasedBeside,
  findRevisionToTry,
  insertDryRun,
} from '@/db/queries/dry-runs';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { DryRunSettings, DryRunView } from '@/lib/contracts/dry-run';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { singleChanges } from '@/lib/dry-run/single-changes';
import { viewDryRun } from '@/lib/dry-run/view';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { database } from '@/server/postgres';

/**
 * Asks for a dry run of a revision as it stands, beside the released one. It replaces those that were not kept.
 * Codes: revision-unknown, sequence-has-errors, dry-run-at-work.
 */
export async function askDryRun(
  actor: Actor,
  revisionId: string,
  settings: DryRunSettings,
): Promise<Outcome<DryRunView>> {
  return database().transaction(async (tx) => {
    const revision = await findRevisionToTry(tx, revisionId);
    if (!revision) return refusal('revision-unknown', 'This revision does not exist any more.');
    const { sequence, boardType } = revision;
    const errors = checkSequence(sequence, boardType).filter(({ severity }) => severity === 'error');
    if (errors.length > 0)
      return refusal('sequence-has-errors', `Mend this first: ${errors[0]!.sentence}`, errors[0]!.stepId ?? undefined);
    const released = await findReleasedBeside(tx, revision.sequenceId, revisionId);
    const passes = 1 + (released ? 1 + singleChanges(released.sequence, sequence).length : 0);
    await deleteDryRunsNotKept(tx, revisionId);
    const asked = await insertDryRun(tx, {
      revisionId,
      draftVersion: revision.version,
      sequence,
      boardType,
      releasedRevisionId: released?.id ?? null,
      settings,
      of: settings.boards * passes,
      askedBy: actor.accountId,
    });
    if (!asked) return refusal('dry-run-at-work', 'A dry run of this draft is at work. Stop it first.');
    await insertTrail(tx, actor, {
      action: 'dry-run.asked',
      entity: 'sequence-revision',
      entityId: revisionId,
      after: { ...settings },
    });
    const { run, ...beside } = (await findDryRun(tx, asked.id))!;
    return success(viewDryRun(run, beside));
  });
}
