import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import type { Actor } from '@/lib/access/actor';
import type { ReasonCodeUse } from '@/lib/contracts/stored-states';
import { hashSecret } from '@/server/auth/secret-hash';
import { createLot } from '@/server/operations/lots/create-lot';
import { addReasonCode } from '@/server/operations/reason-codes/add-reason-code';
import { listReasonChoices } from '@/server/operations/reason-codes/list-reason-choices';
import { listReasonCodeRows } from '@/server/operations/reason-codes/list-reason-codes';
import { mergeReasonCode } from '@/server/operations/reason-codes/merge-reason-code';
import { retireReasonCode } from '@/server/operations/reason-codes/retire-reason-code';
import { readUnitPage } from '@/server/operations/units/read-unit-page';
import { signDispositions } from '@/server/operations/units/sign-dispositions';
import { insertAccount, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf, insertReleasedSequence } from './bases';
import { insertRun } from './runs';

const password = 'a password of quality';
let open: TemporaryDatabase;
let actor: Actor;
beforeAll(async () => {
  open = await temporaryDatabase();
  const account = await insertAccount(open.db, ['quality-manager']);
  const passwordHash = await hashSecret(password);
  await open.db.update(accounts).set({ passwordHash }).where(eq(accounts.id, account.id));
  actor = actorOf(account);
});
afterAll(() => open.close());

async function added(use: ReasonCodeUse, word: string): Promise<string> {
  expect(await addReasonCode(actor, { use, word })).toMatchObject({ ok: true });
  return (await listReasonCodeRows()).find((row) => row.use === use && row.word === word)!.id;
}
const rowOf = async (id: string) => (await listReasonCodeRows()).find((row) => row.id === id)!;
const offered = async (use: ReasonCodeUse) =>
  (await listReasonChoices()).filter((choice) => choice.use === use).map(({ word }) => word);

/** Signs a rework of a rejected board with a reason code. */
async function reworked(reasonCodeId: string) {
  const station = await insertStation(open.db);
  const basis = await insertReleasedSequence(open.db);
  const serial = 'CB1210264800001';
  await createLot(actor, {
    code: '2648-R',
    sequenceRevisionId: basis.sequenceRevision.id,
    serials: { kind: 'counted', firstSerial: serial, quantity: 1 },
  });
  const [unit] = await open.db.select().from(units).where(eq(units.serial, serial));
  const { id: runId } = await insertRun(open.db, {
    unit: unit!,
    stationId: station.id,
    operatorId: actor.accountId,
    attempt: 1,
    minute: 0,
    ending: { verdict: 'reject', reason: 'release-too-high' },
  });
  const sign = (codeId: string) =>
    signDispositions(actor, {
      boards: [{ unitId: unit!.id, runId }],
      kind: 'rework',
      action: 'R14 changed',
      reasonCodeId: codeId,
      reason: 'Reel 7',
      password,
    });
  return { sign, serial, first: await sign(reasonCodeId) };
}

describe('a reason code', () => {
  it('is offered from when it is added, and not twice in other letters', async () => {
    await added('scrap', 'Track damaged');
    expect(await offered('scrap')).toEqual(['Track damaged']);
    expect(await addReasonCode(actor, { use: 'scrap', word: 'TRACK damaged' })).toMatchObject({
      ok: false,
      code: 'word-taken',
      field: 'word',
    });
    expect(await addReasonCode(actor, { use: 'return', word: 'Track damaged' })).toMatchObject({ ok: true });
  });

  it('is offered no more once retired, and again when brought back', async () => {
    const id = await added('hold', 'Suspect batch');
    await retireReasonCode(actor, id, true);
    expect(await offered('hold')).toEqual([]);
    expect(await addReasonCode(actor, { use: 'hold', word: 'Suspect batch' })).toMatchObject({ code: 'word-retired' });
    await retireReasonCode(actor, id, false);
    expect(await offered('hold')).toEqual(['Suspect batch']);
    const entries = await open.db.select().from(trail).where(eq(trail.entityId, id));
    expect(entries.map(({ action }) => action)).toEqual([
      'reason-code.added',
      'reason-code.retired',
      'reason-code.brought-back',
    ]);
  });

  it('leaves its word in history when it is merged, and the other one counts from then on', async () => {
    const old = await added('rework', 'Wrong resistor');
    const kept = await added('rework', 'Part replaced');
    const { sign, serial, first } = await reworked(old);
    expect(first).toMatchObject({ ok: true });
    expect(await mergeReasonCode(actor, { id: old, intoId: kept })).toMatchObject({ ok: true });
    expect(await offered('rework')).toEqual(['Part replaced']);
    expect(await rowOf(old)).toMatchObject({ mergedInto: 'Part replaced', used: 1 });
    const [disposition] = (await readUnitPage(serial))!.dispositions;
    expect(disposition!.reason).toBe('Wrong resistor. Reel 7');
    const [stored] = await open.db.query.dispositions.findMany();
    expect(stored).toMatchObject({ reasonCodeId: old, reasonWord: 'Wrong resistor' });
    expect(await sign(old)).toMatchObject({ ok: false, code: 'reason-code-retired', field: 'reasonCodeId' });
  });

  it('merged into one that is merged later follows it', async () => {
    const [a, b, c] = [await added('concession', 'A'), await added('concession', 'B'), await added('concession', 'C')];
    await mergeReasonCode(actor, { id: a, intoId: b });
    await mergeReasonCode(actor, { id: b, intoId: c });
    expect(await rowOf(a)).toMatchObject({ mergedInto: 'C' });
    expect(await offered('concession')).toEqual(['C']);
  });

  it.each([
    ['itself', (id: string) => id],
    ['one of another kind', (_id: string, other: string) => other],
  ])('is not merged into %s', async (_what, target) => {
    const id = await added('hold-release', crypto.randomUUID());
    const other = await added('return', crypto.randomUUID());
    const refused = await mergeReasonCode(actor, { id, intoId: target(id, other) });
    expect(refused).toMatchObject({ ok: false, code: 'merge-not-possible', field: 'intoId' });
    expect(await rowOf(id)).toMatchObject({ retiredIso: null, mergedInto: null });
  });
});
