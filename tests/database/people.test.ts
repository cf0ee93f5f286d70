import { desc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { signInAttempts } from '@/db/schema/sign-in-attempts';
import { trail } from '@/db/schema/trail';
import { trainings } from '@/db/schema/trainings';
import type { Actor } from '@/lib/access/actor';
import { addPersonSchema, pinSchema, type AddPerson } from '@/lib/contracts/people';
import { addPerson } from '@/server/operations/people/add-person';
import { changePerson } from '@/server/operations/people/change-person';
import { choosePassword, makePasswordLink, passwordLinkWorks } from '@/server/operations/people/choose-password';
import { disablePerson, enablePerson } from '@/server/operations/people/disable-person';
import { firstAdministratorLink, makeFirstAdministrator } from '@/server/operations/people/first-administrator';
import { listPersons } from '@/server/operations/people/list-people';
import { setPin } from '@/server/operations/people/set-pin';
import { signInAtBench } from '@/server/operations/people/sign-in-bench';
import { signInAtDesk } from '@/server/operations/people/sign-in-desk';
import { insertLot, insertStation } from './records';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

let open: TemporaryDatabase;
let admin: Actor;
const password = 'seven grey washers';

const actorOf = (account: typeof accounts.$inferSelect): Actor => ({
  ...account,
  accountId: account.id,
  sessionId: '',
  sessionKind: 'desk',
  stationId: null,
});

beforeAll(async () => {
  open = await temporaryDatabase();
});
afterAll(() => open.close());

const operatorForm = (number: string, over: Partial<AddPerson> = {}): AddPerson => ({
  name: `Operator ${number}`,
  email: null,
  operatorNumber: number,
  badgeNumber: `9${number}`,
  roles: ['operator'],
  locale: 'en',
  ...over,
});

async function added(form: AddPerson): Promise<string> {
  const outcome = await addPerson(admin, form);
  if (!outcome.ok) throw new Error(outcome.code);
  return outcome.value.accountId;
}

const lastTrail = async () => (await open.db.select().from(trail).orderBy(desc(trail.id)).limit(1))[0]!;

describe('the first administrator', () => {
  test('is made by the newest link, once, and no link is made after', async () => {
    const older = (await firstAdministratorLink())!;
    const link = (await firstAdministratorLink())!;
    const tokenOf = (url: string) => url.split('/').at(-1)!;
    const form = { name: 'R. Admin', email: 'admin@plant.example', password, again: password };
    expect(await makeFirstAdministrator({ ...form, token: tokenOf(older) })).toMatchObject({ code: 'link-spent' });
    const both = await Promise.all([
      makeFirstAdministrator({ ...form, token: tokenOf(link) }),
      makeFirstAdministrator({ ...form, email: 'second@plant.example', token: tokenOf(link) }),
    ]);
    expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect(await firstAdministratorLink()).toBeNull();
    const [account] = await open.db.select().from(accounts);
    expect(account).toMatchObject({ name: 'R. Admin', roles: ['administrator'] });
    expect(await signInAtDesk({ email: account!.email!, password })).toMatchObject({ ok: true });
    admin = actorOf(account!);
  });
});

describe('a person', () => {
  test('is added with a trail entry that holds no secret', async () => {
    const accountId = await added(operatorForm('41'));
    const entry = await lastTrail();
    expect(entry).toMatchObject({ action: 'account.added', accountId: admin.accountId, entityId: accountId });
    expect(entry.after).toMatchObject({ operatorNumber: '41', badgeCode: 'SWB-941', roles: ['operator'] });
    expect(JSON.stringify(entry)).not.toContain('Hash');
  });

  test('is refused with the field when a badge, number or address is another account’s, or missing', async () => {
    await added(operatorForm('42', { email: 'taken@plant.example' }));
    const refused = (form: AddPerson) => addPerson(admin, form);
    expect(await refused(operatorForm('43', { badgeNumber: '942' }))).toMatchObject({ field: 'badgeNumber' });
    expect(await refused(operatorForm('42', { badgeNumber: '1' }))).toMatchObject({ field: 'operatorNumber' });
    expect(await refused(operatorForm('43', { email: 'taken@plant.example' }))).toMatchObject({ field: 'email' });
    expect(await refused(operatorForm('43', { badgeNumber: null }))).toMatchObject({ code: 'badge-missing' });
    expect(await refused(operatorForm('43', { roles: ['quality-manager'], badgeNumber: null }))).toMatchObject({
      code: 'email-missing',
    });
  });

  test('gets other roles only with a reason, and never from themselves', async () => {
    const accountId = await added(operatorForm('44', { email: 'b44@plant.example' }));
    const form = { ...operatorForm('44', { email: 'b44@plant.example' }), accountId, reason: '' };
    const promoted = { ...form, roles: ['operator', 'test-engineer'] as const };
    expect(await changePerson(admin, { ...promoted, roles: [...promoted.roles] })).toMatchObject({
      code: 'reason-missing',
    });
    expect(
      await changePerson(admin, { ...promoted, roles: [...promoted.roles], reason: 'Trained as engineer' }),
    ).toEqual({
      ok: true,
      value: null,
    });
    expect(await lastTrail()).toMatchObject({ action: 'account.roles-changed', reason: 'Trained as engineer' });
    const own = { ...form, accountId: admin.accountId, email: 'admin@plant.example', reason: 'I want to' };
    expect(await changePerson(admin, { ...own, roles: ['quality-manager'] })).toMatchObject({ code: 'own-roles' });
  });

  test('is closed with a reason, cannot sign in, and opens again; nobody closes themselves', async () => {
    const accountId = await added(operatorForm('45'));
    const station = await insertStation(open.db);
    await setPin(admin, { accountId, pin: '2580' });
    const signIn = () => signInAtBench({ stationId: station.id, accountId, digits: '2580' });
    expect(await signIn()).toMatchObject({ ok: true });
    expect(await disablePerson(admin, { accountId, reason: 'Left the plant' })).toMatchObject({ ok: true });
    expect(await lastTrail()).toMatchObject({ action: 'account.disabled', reason: 'Left the plant' });
    expect(await signIn()).toMatchObject({ code: 'wrong-pin' });
    expect(await enablePerson(admin, { accountId, reason: 'Came back' })).toMatchObject({ ok: true });
    expect(await signIn()).toMatchObject({ ok: true });
    expect(await disablePerson(admin, { accountId: admin.accountId, reason: 'x y z' })).toMatchObject({
      code: 'own-account',
    });
  });

  test('two administrators cannot close each other at the same moment', async () => {
    const secondId = await added(operatorForm('46', { roles: ['administrator'], email: 'two@plant.example' }));
    const second = actorOf((await open.db.query.accounts.findFirst({ where: eq(accounts.id, secondId) }))!);
    const both = await Promise.all([
      disablePerson(admin, { accountId: secondId, reason: 'One goes' }),
      disablePerson(second, { accountId: admin.accountId, reason: 'Other goes' }),
    ]);
    expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect(both.find((outcome) => !outcome.ok)).toMatchObject({ code: 'last-administrator' });
    await open.db.update(accounts).set({ disabledAt: null });
  });

  test('chooses a password by a link that works once, which ends their sessions', async () => {
    const accountId = await added(operatorForm('47', { email: 'c47@plant.example' }));
    const made = await makePasswordLink(admin, { accountId });
    if (!made.ok) throw new Error(made.code);
    const token = made.value.link.split('/').at(-1)!;
    expect(await passwordLinkWorks(token)).toBe(true);
    expect(await choosePassword({ token, password })).toEqual({ ok: true, value: null });
    expect(await passwordLinkWorks(token)).toBe(false);
    expect(await choosePassword({ token, password: 'another long one' })).toMatchObject({ code: 'link-spent' });
    expect(await signInAtDesk({ email: 'c47@plant.example', password })).toMatchObject({ ok: true });
  });

  test('who waits after wrong PINs is listed with station and time, and a new PIN ends the wait', async () => {
    const accountId = await added(operatorForm('48'));
    const station = await insertStation(open.db);
    await setPin(admin, { accountId, pin: '2580' });
    const at = (secondsAgo: number) => new Date(Date.now() - secondsAgo * 1000);
    await open.db.insert(signInAttempts).values(
      [50, 40, 30, 20, 5, 1].map((s) => ({
        identifier: accountId,
        stationId: station.id,
        at: at(s),
        outcome: 'failed' as const,
      })),
    );
    const waiting = async () => (await listPersons()).find((person) => person.accountId === accountId)!.waiting;
    expect(await waiting()).toMatchObject({ failures: 6, stationCode: station.code });
    const signIn = () => signInAtBench({ stationId: station.id, accountId, digits: '1470' });
    expect(await signIn()).toMatchObject({ code: 'too-many-tries' });
    await setPin(admin, { accountId, pin: '1470' });
    expect(await waiting()).toBeNull();
    expect(await signIn()).toMatchObject({ ok: true });
  });

  test('is listed with the training that ends first, by the latest record of each board type', async () => {
    const accountId = await added(operatorForm('49'));
    const [one, other] = [await insertLot(open.db), await insertLot(open.db)];
    const until = (day: string) => new Date(`${day}T00:00:00Z`);
    await open.db.insert(trainings).values([
      { accountId, boardTypeId: one.boardType.id, validUntil: until('2026-01-10'), recordedBy: admin.accountId },
      { accountId, boardTypeId: one.boardType.id, validUntil: until('2027-03-10'), recordedBy: admin.accountId },
      { accountId, boardTypeId: other.boardType.id, validUntil: until('2027-01-10'), recordedBy: admin.accountId },
    ]);
    const person = (await listPersons()).find((p) => p.accountId === accountId)!;
    expect(person).toMatchObject({ trainedUntilIso: '2027-01-10T00:00:00.000Z', lastSeenIso: null, hasPin: false });
  });
});

describe('forms of people', () => {
  test('take an empty field as none, and write badges in capitals', () => {
    const form = {
      name: 'A. B',
      email: '',
      operatorNumber: '',
      badgeNumber: 'ab-1',
      roles: ['operator'],
      locale: 'en',
    };
    expect(addPersonSchema.parse(form)).toMatchObject({ email: null, operatorNumber: null, badgeNumber: 'AB-1' });
  });

  test.each([
    ['2580', true],
    ['1111', false],
    ['1234', false],
    ['9876', false],
    ['123', false],
    ['123456789', false],
    ['25a0', false],
    ['90214', true],
  ])('PIN %s: %s', (pin, taken) => {
    expect(pinSchema.safeParse(pin).success).toBe(taken);
  });
});
