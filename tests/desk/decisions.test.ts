import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { listSignatures } from '@/db/queries/signatures';
import { accounts } from '@/db/schema/accounts';
import { dispositions } from '@/db/schema/dispositions';
import type { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import type { Actor } from '@/lib/access/actor';
import type { Role } from '@/lib/access/roles';
import { hashSecret } from '@/server/auth/secret-hash';
import { createLot } from '@/server/operations/lots/create-lot';
import { signatureHolds } from '@/server/operations/signatures/record-signature';
import { completeConcession } from '@/server/operations/units/complete-concession';
import { readUnitPage } from '@/server/operations/units/read-unit-page';
import { signDispositions } from '@/server/operations/units/sign-dispositions';
import { insertAccount, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf, insertReleasedSequence } from './bases';
import { insertRun, type RunStory } from './runs';

const password = 'a password to sign with';
let open: TemporaryDatabase;
let quality: Actor;
let otherQuality: Actor;
let engineer: Actor;
let both: Actor;
let station: typeof stations.$inferSelect;
let boards: (typeof units.$inferSelect)[];
let nextBoard = 0;
let minute = 0;

async function signer(roles: Role[], passwordHash: string): Promise<Actor> {
  const account = await insertAccount(open.db, roles);
  await open.db.update(accounts).set({ passwordHash }).where(eq(accounts.id, account.id));
  return actorOf(account);
}

beforeAll(async () => {
  open = await temporaryDatabase();
  const hash = await hashSecret(password);
  quality = await signer(['quality-manager'], hash);
  otherQuality = await signer(['quality-manager'], hash);
  engineer = await signer(['test-engineer'], hash);
  both = await signer(['quality-manager', 'test-engineer'], hash);
  station = await insertStation(open.db);
  const basis = await insertReleasedSequence(open.db);
  await createLot(quality, {
    code: '2648-D',
    sequenceRevisionId: basis.sequenceRevision.id,
    serials: { kind: 'counted', firstSerial: 'CB1210264800001', quantity: 30 },
  });
  boards = await open.db.select().from(units).orderBy(asc(units.position));
});
afterAll(() => open.close());

const reject = { verdict: 'reject', reason: 'release-too-high' } as const;
const pass = { verdict: 'pass' } as const;
const failing = { verdict: 'no-verdict', reason: 'operator-stop', failing: true } as const;

async function tested(unit: (typeof boards)[number], attempt: number, ending: RunStory['ending']): Promise<string> {
  const story = { unit, stationId: station.id, operatorId: quality.accountId, attempt, minute: minute++, ending };
  return (await insertRun(open.db, story)).id;
}
async function board(ending: RunStory['ending'] = reject) {
  const unit = boards[nextBoard++]!;
  return { unit, unitId: unit.id, runId: await tested(unit, 1, ending) };
}
type Made = Awaited<ReturnType<typeof board>>;

const formOf = (made: Made[], over: object = {}) => ({
  boards: made.map(({ unitId, runId }) => ({ unitId, runId })),
  kind: 'concession' as const,
  action: '',
  reasonCodeId: null,
  reason: 'Release 20 mV high, agreed with the customer',
  password,
  ...over,
});
const pageOf = async ({ unit }: Made) => (await readUnitPage(unit.serial))!;
const standingOf = async (made: Made) => (await pageOf(made)).standing.kind;

/** A concession that waits, and what its second signer reads. */
async function conceded(made: Made, by: Actor) {
  expect(await signDispositions(by, formOf([made]))).toMatchObject({ ok: true });
  const [disposition] = (await pageOf(made)).dispositions;
  return { dispositionId: disposition!.id, digest: disposition!.signatures[0]!.digest, password };
}

describe('a concession', () => {
  it('is in force only once the other side has signed exactly what the first one signed', async () => {
    const made = await board();
    const second = await conceded(made, quality);
    expect(await standingOf(made)).toBe('needs-disposition');
    expect(await completeConcession(engineer, second)).toEqual({ ok: true, value: null });
    expect(await standingOf(made)).toBe('used-as-is');
    const signed = await listSignatures(open.db, 'disposition', second.dispositionId);
    expect(signed.map(({ name }) => name)).toEqual([quality.name, engineer.name]);
    expect(signed[1]!.content).toEqual({
      ...signed[0]!.content,
      sides: ['engineering'],
      agreesWith: { name: quality.name, signedAt: signed[0]!.signedAt.toISOString(), digest: second.digest },
    });
    expect(signed.every(signatureHolds)).toBe(true);
    const [entry] = await open.db.select().from(trail).where(eq(trail.action, 'unit.concession-agreed'));
    expect(entry).toMatchObject({ entityId: made.unitId, accountId: engineer.accountId });
  });

  it('may begin with an engineer, who signs nothing else', async () => {
    const made = await board();
    for (const kind of ['rework', 'scrap', 'return'] as const)
      expect(await signDispositions(engineer, formOf([made], { kind, action: 'R14' }))).toMatchObject({
        ok: false,
        code: 'not-allowed',
      });
    expect(await completeConcession(quality, await conceded(made, engineer))).toMatchObject({ ok: true });
  });

  it('is refused to the same person, whatever roles they hold', async () => {
    const made = await board();
    const refused = await completeConcession(both, await conceded(made, both));
    expect(refused).toMatchObject({ ok: false, code: 'same-person' });
    expect(await standingOf(made)).toBe('needs-disposition');
  });

  it('is refused to two people of the same side', async () => {
    const second = await conceded(await board(), quality);
    expect(await completeConcession(otherQuality, second)).toMatchObject({ ok: false, code: 'same-side' });
  });

  it('takes somebody of both sides for the one that is missing', async () => {
    expect(await completeConcession(both, await conceded(await board(), quality))).toMatchObject({ ok: true });
    expect(await completeConcession(quality, await conceded(await board(), both))).toMatchObject({ ok: true });
  });

  it('is refused when what was read is not what was signed first', async () => {
    const second = await conceded(await board(), quality);
    const refused = await completeConcession(engineer, { ...second, digest: '0'.repeat(64) });
    expect(refused).toMatchObject({ ok: false, code: 'changed-meanwhile' });
  });

  it('is signed a second time only once, and not begun twice', async () => {
    const made = await board();
    const second = await conceded(made, quality);
    expect(await signDispositions(engineer, formOf([made]))).toMatchObject({ ok: false, code: 'concession-waits' });
    expect(await completeConcession(engineer, second)).toMatchObject({ ok: true });
    expect(await completeConcession(both, second)).toMatchObject({ ok: false, code: 'not-waiting' });
  });

  it('lapses when quality decides otherwise meanwhile, or the board is tested again', async () => {
    const made = await board();
    const second = await conceded(made, quality);
    const rework = formOf([made], { kind: 'rework', action: 'R14 changed' });
    expect(await signDispositions(quality, rework)).toMatchObject({ ok: true });
    expect(await completeConcession(engineer, second)).toMatchObject({ ok: false, code: 'nothing-to-decide' });
    await tested(made.unit, 2, reject);
    expect(await completeConcession(engineer, second)).toMatchObject({ ok: false, code: 'nothing-to-decide' });
  });

  it('needs a measured reject', async () => {
    const refused = await signDispositions(quality, formOf([await board(failing)]));
    expect(refused).toMatchObject({ ok: false, code: 'no-verdict-to-concede' });
  });
});

describe('many boards at once', () => {
  it('get a signature each, whose content names all of them', async () => {
    const made = [await board(), await board(), await board()];
    const form = formOf(made, { kind: 'return', reason: 'Wrong zener in the whole reel' });
    expect(await signDispositions(quality, form)).toEqual({ ok: true, value: { boards: 3 } });
    const serials = made.map(({ unit }) => unit.serial);
    const digests = new Set<string>();
    for (const each of made) {
      const [disposition] = (await pageOf(each)).dispositions;
      expect(disposition).toMatchObject({ kind: 'return', signatures: [{ name: quality.name, serials, holds: true }] });
      digests.add(disposition!.signatures[0]!.digest);
      expect(await standingOf(each)).toBe('returned');
    }
    expect(digests.size).toBe(3);
  });

  it('are decided all or not at all: one that passed meanwhile stops the others', async () => {
    const made = [await board(), await board(pass), await board()];
    const before = await open.db.$count(dispositions);
    const refused = await signDispositions(quality, formOf(made, { kind: 'scrap' }));
    expect(refused).toMatchObject({ ok: false, code: 'nothing-to-decide' });
    expect(refused).toMatchObject({ sentence: expect.stringContaining(made[1]!.unit.serial) });
    expect(await open.db.$count(dispositions)).toBe(before);
    expect(await standingOf(made[0]!)).toBe('needs-disposition');
  });

  it('are not decided after a run that their signer has not seen', async () => {
    const made = await board(failing);
    await tested(made.unit, 2, reject);
    const refused = await signDispositions(quality, formOf([made], { kind: 'scrap' }));
    expect(refused).toMatchObject({ ok: false, code: 'changed-meanwhile' });
  });
});
