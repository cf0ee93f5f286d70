import { findSequence, type SequenceRevision } from '@/db/queries/sequence-revisions';
import type { Transaction } from '@/db/client';
import { refusal, type Refusal } from '@/lib/contracts/outcome';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { findingKey, type SequenceFinding } from '@/lib/sequence/finding';

/**
 * What keeps a revision from being submitted or released, by the rules that stations enforce: an error, or a warning without a
 * reason; null when nothing does. Codes: sequence-has-errors, warning-needs-reason.
 */
export async function releaseBlock(tx: Transaction, revision: SequenceRevision): Promise<Refusal | null> {
  const findings = await findingsOf(tx, revision);
  const errors = findings.filter(({ severity }) => severity === 'error');
  if (errors.length > 0) return refusal('sequence-has-errors', `Errors keep it from release. ${first(errors)}`);
  const open = findings.filter((finding) => !revision.warningReasons[findingKey(finding)]?.trim());
  return open.length > 0 ? refusal('warning-needs-reason', `A warning needs a reason. ${first(open)}`) : null;
}

/** The reasons given for warnings that still stand; those of warnings that are gone are dropped. */
export async function standingReasons(tx: Transaction, revision: SequenceRevision): Promise<Record<string, string>> {
  const keys = (await findingsOf(tx, revision)).map(findingKey);
  return Object.fromEntries(Object.entries(revision.warningReasons).filter(([key]) => keys.includes(key)));
}

async function findingsOf(tx: Transaction, { sequenceId, data }: SequenceRevision): Promise<SequenceFinding[]> {
  const sequence = await findSequence(tx, sequenceId);
  return checkSequence(data, sequence!.boardType);
}

const first = ([finding, ...more]: { sentence: string }[]) =>
  `${finding!.sentence}${more.length === 0 ? '' : ` And ${more.length} more.`}`;
