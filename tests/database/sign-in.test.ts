import { eq } from 'drizzle-orm';
import { encode } from 'next-auth/jwt';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { sessions } from '@/db/schema/sessions';
import { signInAttempts } from '@/db/schema/sign-in-attempts';
import { stationEnrolments } from '@/db/schema/station-enrolments';
import { enrolmentCookie } from '@/server/auth/enrolment-cookie';
import { readHandshake, socketMay } from '@/server/auth/handshake';
import { readSession } from '@/server/auth/read-session';
import { hashSecret, hashToken, makeToken } from '@/server/auth/secret-hash';
import { watchSessions } from '@/server/auth/watch-sessions';
import { findBadge } from '@/server/operations/people/find-badge';
import { signInAtBench } from '@/server/operations/people/sign-in-bench';
import { signInAtDesk } from '@/server/operations/people/sign-in-desk';
import { signOutSession } from '@/server/operations/people/sign-out-session';
import { insertAccount, insertStation } from './records';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

const password = 'five blue screwdrivers';
const pin = '4471';
let open: TemporaryDatabase;
let passwordHash: string;
let pinHash: string;
beforeAll(async () => {
  open = await temporaryDatabase();
  [passwordHash, pinHash] = await Promise.all([hashSecret(password), hashSecret(pin)]);
});
afterAll(() => open.close());

let made = 0;
async function engineer() {
  return insertAccount(open.db, ['test-engineer'], { email: `engineer${++made}@plant.example`, passwordHash });
}
async function operator() {
  const number = String(100 + ++made);
  return insertAccount(open.db, ['operator'], { operatorNumber: number, badgeCode: `SWB-${number}`, pinHash });
}
const cookieOf = async (sessionId: string) => ({
  'next-auth.session-token': await encode({ token: { sessionId }, secret: process.env.NEXTAUTH_SECRET! }),
});

async function deskSession() {
  const account = await engineer();
  const signedIn = await signInAtDesk({ email: account.email!, password });
  if (!signedIn.ok) throw new Error(signedIn.code);
  return { account, ...signedIn.value, cookies: await cookieOf(signedIn.value.sessionId) };
}

describe('secrets', () => {
  test('are kept as argon2id', () => {
    expect(passwordHash).toMatch(/^\$argon2id\$/);
    expect(pinHash).toMatch(/^\$argon2id\$/);
  });
});

describe('signing in at a desk', () => {
  test('begins a session that the cookie leads back to', async () => {
    const { account, cookies } = await deskSession();
    expect(await readSession(cookies)).toMatchObject({
      accountId: account.id,
      roles: ['test-engineer'],
      sessionKind: 'desk',
      stationId: null,
    });
  });

  test('takes the address in any case, and refuses a wrong password, an unknown address and a disabled account alike', async () => {
    const account = await engineer();
    expect(await signInAtDesk({ email: account.email!.toUpperCase(), password })).toMatchObject({ ok: true });
    const wrong = await signInAtDesk({ email: account.email!, password: 'x' });
    const unknown = await signInAtDesk({ email: 'nobody@plant.example', password });
    await open.db.update(accounts).set({ disabledAt: new Date() }).where(eq(accounts.id, account.id));
    const disabled = await signInAtDesk({ email: account.email!, password });
    expect(wrong).toMatchObject({ ok: false, code: 'wrong-sign-in' });
    expect(unknown).toEqual(wrong);
    expect(disabled).toEqual(wrong);
  });

  test('refuses an account that has not chosen a password', async () => {
    const account = await insertAccount(open.db, ['test-engineer'], { email: 'new@plant.example' });
    expect(await signInAtDesk({ email: account.email!, password: '' })).toMatchObject({ code: 'wrong-sign-in' });
  });

  test('evaluates ten wrong tries in 15 minutes at most, whoever comes eleventh', async () => {
    const account = await engineer();
    const old = Date.now() - 14 * 60_000;
    await open.db.insert(signInAttempts).values(
      Array.from({ length: 10 }, (_, i) => ({
        identifier: account.id,
        at: new Date(old + i * 1000),
        outcome: 'failed' as const,
      })),
    );
    const eleventh = await signInAtDesk({ email: account.email!, password });
    expect(eleventh).toMatchObject({ ok: false, code: 'too-many-tries' });
    if (eleventh.ok || !eleventh.retryAtIso) throw new Error('expected the time of the next try');
    expect(Date.parse(eleventh.retryAtIso)).toBe(old + 15 * 60_000);
  });

  test('evaluates one of many wrong tries made at the same moment once the wait applies', async () => {
    const account = await engineer();
    const tries = await Promise.all(
      Array.from({ length: 12 }, () => signInAtDesk({ email: account.email!, password: 'wrong' })),
    );
    const codes = tries.map((t) => (t.ok ? 'ok' : t.code));
    expect(codes.filter((code) => code === 'wrong-sign-in')).toHaveLength(2);
    expect(codes.filter((code) => code === 'too-many-tries')).toHaveLength(10);
  });
});

describe('signing in at a bench', () => {
  test('goes by badge, then PIN, and signs out whoever was there', async () => {
    const station = await insertStation(open.db);
    const [first, second] = [await operator(), await operator()];
    const badge = await findBadge({ badgeCode: first.badgeCode!.toLowerCase(), byHand: false });
    expect(badge).toEqual({ ok: true, value: { accountId: first.id, number: first.operatorNumber } });
    const one = await signInAtBench({ stationId: station.id, accountId: first.id, digits: pin });
    const two = await signInAtBench({ stationId: station.id, accountId: second.id, digits: pin });
    if (!one.ok || !two.ok) throw new Error('expected both to sign in');
    expect(two.value).toMatchObject({ sessionKind: 'bench', stationId: station.id, accountId: second.id });
    expect(await readSession(await cookieOf(one.value.sessionId))).toBeNull();
    const ended = await open.db.query.sessions.findFirst({ where: eq(sessions.id, one.value.sessionId) });
    expect(ended).toMatchObject({ endedBecause: 'replaced' });
  });

  test('takes the number by hand, but not as a scan', async () => {
    const person = await operator();
    const number = person.operatorNumber!;
    expect(await findBadge({ badgeCode: number, byHand: true })).toMatchObject({ ok: true });
    expect(await findBadge({ badgeCode: number, byHand: false })).toMatchObject({ code: 'badge-unknown' });
  });

  test('refuses badges without a role at a bench, without a PIN, and of disabled accounts', async () => {
    await insertAccount(open.db, ['quality-manager'], { badgeCode: 'SWB-Q1', pinHash });
    await insertAccount(open.db, ['operator'], { badgeCode: 'SWB-O1' });
    await insertAccount(open.db, ['operator'], { badgeCode: 'SWB-O2', pinHash, disabledAt: new Date() });
    const codeOf = async (badgeCode: string) => {
      const found = await findBadge({ badgeCode, byHand: false });
      return found.ok ? 'ok' : found.code;
    };
    expect(await codeOf('SWB-Q1')).toBe('badge-not-for-bench');
    expect(await codeOf('SWB-O1')).toBe('pin-not-chosen');
    expect(await codeOf('SWB-O2')).toBe('badge-unknown');
  });

  test('counts wrong PINs by station, so that one bench locked does not lock the next', async () => {
    const [here, there] = [await insertStation(open.db), await insertStation(open.db)];
    const person = await operator();
    const at = (stationId: string, digits: string) => signInAtBench({ stationId, accountId: person.id, digits });
    expect(await at(here.id, '0000')).toMatchObject({ code: 'wrong-pin' });
    expect(await at(here.id, '0001')).toMatchObject({ code: 'wrong-pin' });
    expect(await at(here.id, pin)).toMatchObject({ code: 'too-many-tries' });
    expect(await at(there.id, pin)).toMatchObject({ ok: true });
  });
});

describe('a session', () => {
  test('is nobody once it is signed out, expired or disabled', async () => {
    const ends = [
      (id: string) => signOutSession(id),
      (id: string) =>
        open.db
          .update(sessions)
          .set({ expiresAt: new Date(0) })
          .where(eq(sessions.id, id)),
      async (id: string) => {
        const row = await open.db.query.sessions.findFirst({ where: eq(sessions.id, id) });
        await open.db.update(accounts).set({ disabledAt: new Date() }).where(eq(accounts.id, row!.accountId));
      },
    ];
    for (const end of ends) {
      const { sessionId, cookies } = await deskSession();
      expect(await readSession(cookies)).not.toBeNull();
      await end(sessionId);
      expect(await readSession(cookies)).toBeNull();
    }
  });

  test('needs a cookie signed with our secret', async () => {
    const { sessionId } = await deskSession();
    const forged = await encode({ token: { sessionId }, secret: 'another secret of 32 characters or more' });
    expect(await readSession({ 'next-auth.session-token': forged })).toBeNull();
    expect(await readSession({ 'next-auth.session-token': sessionId })).toBeNull();
    expect(await readSession({})).toBeNull();
  });

  test('tells whoever holds its socket within 5 s that it ended', async () => {
    const [one, other] = [await deskSession(), await deskSession()];
    const told: string[] = [];
    const watch = await watchSessions({
      liveSessionIds: () => [one.sessionId],
      onEnded: (id) => told.push(id),
    });
    try {
      await signOutSession(other.sessionId);
      await signOutSession(one.sessionId);
      await expect.poll(() => told, { timeout: 5_000 }).toEqual([one.sessionId]);
    } finally {
      await watch.close();
    }
  });
});

describe('a handshake', () => {
  const origin = 'http://127.0.0.1:3000';
  const header = (cookies: Record<string, string>) =>
    Object.entries(cookies)
      .map(([name, value]) => `${name}=${value}`)
      .join('; ');

  test('needs an allowed origin and someone behind it', async () => {
    const { cookies, account } = await deskSession();
    const cookie = header(cookies);
    expect(await readHandshake({ origin: 'http://elsewhere.example', cookie })).toEqual({
      ok: false,
      code: 'wrong-origin',
    });
    expect(await readHandshake({ cookie })).toEqual({ ok: false, code: 'wrong-origin' });
    expect(await readHandshake({ origin })).toEqual({ ok: false, code: 'sign-in' });
    expect(await readHandshake({ origin, cookie })).toMatchObject({
      ok: true,
      visitor: { actor: { accountId: account.id }, enrolment: null },
    });
  });

  test('knows a browser enrolled at a bench, for that bench, until it is revoked', async () => {
    const [here, there] = [await insertStation(open.db), await insertStation(open.db)];
    const token = makeToken();
    const admin = await insertAccount(open.db, ['administrator']);
    await open.db
      .insert(stationEnrolments)
      .values({ stationId: here.id, tokenHash: hashToken(token), enrolledBy: admin.id });
    const cookie = header({ [enrolmentCookie]: token });
    const shake = await readHandshake({ origin, cookie });
    if (!shake.ok) throw new Error(shake.code);
    expect(socketMay('enrolled-bench', shake.visitor, here.id)).toBe(true);
    expect(socketMay('enrolled-bench', shake.visitor, there.id)).toBe(false);
    expect(socketMay('bench', shake.visitor, there.id)).toBe(false);
    await open.db.update(stationEnrolments).set({ revokedAt: new Date() });
    expect(await readHandshake({ origin, cookie })).toEqual({ ok: false, code: 'sign-in' });
  });

  test('lets a desk watch every bench and command none', async () => {
    const { cookies } = await deskSession();
    const shake = await readHandshake({ origin, cookie: header(cookies) });
    if (!shake.ok) throw new Error(shake.code);
    const station = await insertStation(open.db);
    expect(socketMay('bench', shake.visitor, station.id)).toBe(true);
    expect(socketMay('enrolled-bench', shake.visitor, station.id)).toBe(false);
  });
});
