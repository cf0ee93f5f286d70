import { randomUUID } from 'node:crypto';
import type { Transaction } from '@/db/client';
import { insertTrail } from '@/db/queries/trail';
import { listUnitRecordsById, type UnitRecord } from '@/db/queries/unit-records';
import { insertDisposition, listUnitsForUpdate, markScrapped } from '@/db/queries/units-decisions';
import { actorMay, type Actor } from '@/lib/access/actor';
import { rightToSign } from '@/lib/access/disposition-kinds';
import type { DispositionForm } from '@/lib/contracts/disposition';
import { refusal, success, type Outcome, type Refusal } from '@/lib/contracts/outcome';
import { sidesOf } from '@/lib/decision/concession-sides';
import { dispositionProblem, type DispositionProblem } from '@/lib/decision/disposition-problem';
import { database } from '@/server/postgres';
import { chosenReason, type ChosenReason } from '../reason-codes/chosen-reason';
import { confirmSignature } from '../signatures/confirm-signature';
import { recordSignature } from '../signatures/record-signature';

const meaningOf: Record<DispositionForm['kind'], string> = {
  rework: 'The board is reworked as said, then tested once more.',
  scrap: 'The board is scrapped and leaves the lot.',
  concession: 'The board is used as it is, by concession, once the other side has signed too.',
  return: 'The board is returned to its supplier and leaves the lot.',
};

const sentenceOf: Record<DispositionProblem, string> = {
  'nothing-to-decide': 'needs no decision now. Load the page again.',
  'changed-meanwhile': 'was tested again meanwhile. Load the page again and look at its newest run.',
  'attempts-used': 'has no attempt left. Rework would lead nowhere: decide otherwise.',
  'no-verdict-to-concede': 'ended without a verdict. A concession needs a measured reject: order a retest first.',
  'concession-waits': 'has a concession that waits for its second signature.',
};

/**
 * What is done with boards that were rejected or wait for quality: one or many, for one reason, with one password and a signature a
 * board. All of them or none. Codes: not-allowed, wrong-password, too-many-tries, reason-code-retired, unit-unknown, and those of
 * `DispositionProblem`.
 */
export async function signDispositions(
  actor: Actor,
  form: DispositionForm,
  at = new Date(),
): Promise<Outcome<{ boards: number }>> {
  if (!actorMay(actor, rightToSign(form.kind)))
    return refusal('not-allowed', 'Quality signs this. An engineer may sign for a concession.', 'kind');
  const signed = await confirmSignature(actor, form.password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const reason = await chosenReason(tx, form.kind, form);
    if (!reason.ok) return reason;
    const runOf = new Map(form.boards.map(({ unitId, runId }) => [unitId, runId]));
    const units = await listUnitsForUpdate(tx, [...runOf.keys()]);
    if (units.length < runOf.size) return refusal('unit-unknown', 'A board does not exist. Load the page again.');
    const records = await listUnitRecordsById(tx, [...runOf.keys()]);
    records.sort((a, b) => a.serial.localeCompare(b.serial));
    const refused = refuse(form.kind, records, runOf);
    if (refused) return refused;
    for (const record of records) await signOne(tx, actor, form, reason.value, record, records, at);
    return success({ boards: records.length });
  });
}

/** Refuses all when one cannot be decided so. */
function refuse(
  kind: DispositionForm['kind'],
  records: readonly UnitRecord[],
  runOf: Map<string, string>,
): Refusal | null {
  const problems = records.flatMap((record) => {
    const code = dispositionProblem(kind, record, runOf.get(record.unitId)!);
    return code ? [{ code, serial: record.serial }] : [];
  });
  const [first, ...more] = problems;
  if (!first) return null;
  if (records.length === 1) return refusal(first.code, `This board ${sentenceOf[first.code]}`);
  const others = more.length === 0 ? '' : ` The same or the like holds for ${more.length} more.`;
  return refusal(first.code, `Nothing was signed. Board ${first.serial} ${sentenceOf[first.code]}${others}`);
}

async function signOne(
  tx: Transaction,
  actor: Actor,
  form: DispositionForm,
  reason: ChosenReason,
  { unitId, serial, runs }: UnitRecord,
  all: readonly UnitRecord[],
  at: Date,
): Promise<void> {
  const run = runs.at(-1)!;
  const { kind } = form;
  const action = kind === 'rework' ? form.action : '';
  const id = randomUUID();
  const content = {
    kind,
    serial,
    runId: run.id,
    rejectReason: run.rejectReason,
    action,
    reason: reason.reason,
    serials: all.map((each) => each.serial),
    ...(kind === 'concession' && { sides: sidesOf(actor.roles) }),
  };
  const signed = { subject: 'disposition', subjectId: id, meaning: meaningOf[kind], content };
  const signature = await recordSignature(tx, actor, signed, at);
  await insertDisposition(tx, {
    ...reason,
    id,
    unitId,
    runId: run.id,
    kind,
    action,
    signedBy: actor.accountId,
    signedAt: at,
    signatureId: signature.id,
  });
  if (kind === 'scrap') await markScrapped(tx, unitId, at);
  await insertTrail(tx, actor, {
    action: `unit.${kind}`,
    entity: 'unit',
    entityId: unitId,
    after: { dispositionId: id, serial, runId: run.id, action, digest: signature.digest },
    reason: reason.reason,
  });
}
