import { findDispositionForUpdate, findUnitForUpdate, insertSecondSignature } from '@/db/queries/units-decisions';
import { insertTrail } from '@/db/queries/trail';
import { findUnitRecord, type UnitRecord } from '@/db/queries/unit-records';
import type { Actor } from '@/lib/access/actor';
import type { SecondSignatureForm } from '@/lib/contracts/disposition';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { secondSignerProblem, sidesOf, type ConcessionSide } from '@/lib/decision/concession-sides';
import { boardStanding } from '@/lib/decision/board-standing';
import { database } from '@/server/postgres';
import { confirmSignature } from '../signatures/confirm-signature';
import { recordSignature, signatureHolds } from '../signatures/record-signature';

const sentenceOf = {
  'same-person': 'You signed first. Somebody of the other side signs second.',
  'same-side': 'Quality and an engineer sign a concession. Somebody of the other side signs second.',
};

/**
 * The second signature under a concession, by another person of the other side, bound to what the first one signed. Codes:
 * wrong-password, too-many-tries, disposition-unknown, not-waiting, changed-meanwhile, same-person, same-side, nothing-to-decide.
 */
export async function completeConcession(actor: Actor, form: SecondSignatureForm, at = new Date()): Promise<Outcome> {
  const confirmed = await confirmSignature(actor, form.password);
  if (!confirmed.ok) return confirmed;
  return database().transaction(async (tx) => {
    const found = await findDispositionForUpdate(tx, form.dispositionId);
    if (!found) return refusal('disposition-unknown', 'This decision does not exist.');
    const { disposition, first, serial } = found;
    if (disposition.kind !== 'concession' || !first || disposition.secondSignatureId)
      return refusal('not-waiting', 'This decision waits for no second signature. Load the page again.');
    if (first.digest !== form.digest || !signatureHolds(first))
      return refusal('changed-meanwhile', 'This is not what was signed first. Load the page again and read it anew.');
    const sides = sidesOf(actor.roles);
    const problem = secondSignerProblem(
      { accountId: first.accountId, sides: first.content.sides as ConcessionSide[] },
      { accountId: actor.accountId, sides },
    );
    if (problem) return refusal(problem, sentenceOf[problem]);
    await findUnitForUpdate(tx, disposition.unitId);
    const record = await findUnitRecord(tx, disposition.unitId);
    if (!record || !stillWaits(record, disposition))
      return refusal('nothing-to-decide', 'This board was tested or decided otherwise meanwhile. Load the page again.');
    const { name, signedAt, digest, content } = first;
    const signature = await recordSignature(
      tx,
      actor,
      {
        subject: 'disposition',
        subjectId: disposition.id,
        meaning: 'I agree: the board is used as it is, by concession.',
        content: { ...content, sides, agreesWith: { name, signedAt: signedAt.toISOString(), digest } },
      },
      at,
    );
    await insertSecondSignature(tx, disposition.id, {
      secondSignedBy: actor.accountId,
      secondSignedAt: at,
      secondSignatureId: signature.id,
    });
    await insertTrail(tx, actor, {
      action: 'unit.concession-agreed',
      entity: 'unit',
      entityId: disposition.unitId,
      after: { dispositionId: disposition.id, serial, runId: disposition.runId, digest: signature.digest },
      reason: disposition.reason,
    });
    return done;
  });
}

/** Neither tested since nor decided otherwise. */
function stillWaits(record: UnitRecord, { runId, signedAt }: { runId: string; signedAt: Date }): boolean {
  const { kind } = boardStanding(record);
  const later = record.dispositions.some((each) => each.complete && each.signedAt > signedAt.toISOString());
  return record.runs.at(-1)?.id === runId && !later && (kind === 'needs-disposition' || kind === 'attempts-used');
}
