import { cookies, headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { cache } from 'react';
import { decideAccess, type Access } from '@/lib/access/access';
import type { Actor } from '@/lib/access/actor';
import { readEnrolment } from './enrolment-cookie';
import { readSession, type Cookies } from './read-session';

/** Name of the request header in which the proxy hands on the address asked for. */
export const pathHeader = 'x-sillwright-path';

async function requestCookies(): Promise<Cookies> {
  return Object.fromEntries((await cookies()).getAll().map(({ name, value }) => [name, value]));
}

/** Whoever is signed in, or null. Looked up once a request. */
export const currentActor = cache(async (): Promise<Actor | null> => readSession(await requestCookies()));

/** The station that this browser is enrolled at, or null. Looked up once a request. */
export const currentEnrolment = cache(async () => readEnrolment(await requestCookies()));

async function refuse(decision: 'sign-in' | 'not-allowed'): Promise<never> {
  if (decision === 'not-allowed') redirect('/not-allowed');
  const path = (await headers()).get(pathHeader);
  redirect(path && path !== '/' ? `/sign-in?next=${encodeURIComponent(path)}` : '/sign-in');
}

/**
 * First line of every page and server action that is not public: who acts, if they may. Anyone else is sent to sign in, or
 * told that their role does not allow it; nothing after this line runs.
 */
export async function authorise(access: Exclude<Access, 'public' | 'bench' | 'enrolled-bench'>): Promise<Actor> {
  const actor = await currentActor();
  const decision = decideAccess(access, { roles: actor?.roles ?? null, enrolledBench: false });
  if (!actor || decision !== 'allowed') return refuse(decision === 'allowed' ? 'sign-in' : decision);
  return actor;
}

/** The same for pages of a bench: an enrolled browser may see its station, a desk account may watch any. */
export async function authoriseBench(stationCode: string): Promise<{ actor: Actor | null; enrolled: boolean }> {
  const [actor, enrolment] = await Promise.all([currentActor(), currentEnrolment()]);
  const enrolled = enrolment?.stationCode === stationCode;
  const decision = decideAccess('bench', { roles: actor?.roles ?? null, enrolledBench: enrolled });
  return decision === 'allowed' ? { actor, enrolled } : refuse(decision);
}
