import { getToken } from 'next-auth/jwt';
import type { NextRequest } from 'next/server';
import { findActor } from '@/db/queries/sessions';
import type { Actor } from '@/lib/access/actor';
import { environment } from '@/server/environment';
import { database } from '@/server/postgres';

export type Cookies = Record<string, string | undefined>;

export function cookiesAreSecure(): boolean {
  return environment().publicUrl.startsWith('https://');
}

/** The session id inside the signed cookie, or null; says nothing about whether the session still holds. */
export async function sessionIdOf(cookies: Cookies): Promise<string | null> {
  const token = await getToken({
    req: { headers: {}, cookies } as unknown as NextRequest,
    secret: environment().secret,
    secureCookie: cookiesAreSecure(),
  });
  return typeof token?.sessionId === 'string' ? token.sessionId : null;
}

/** Whoever these cookies belong to, looked up in PostgreSQL each time. Throws while the database is away. */
export async function readSession(cookies: Cookies): Promise<Actor | null> {
  const sessionId = await sessionIdOf(cookies);
  return sessionId ? findActor(database(), sessionId) : null;
}
