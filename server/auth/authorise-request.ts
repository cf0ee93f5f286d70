import { parseCookie } from 'cookie';
import { decideAccess, type Access } from '@/lib/access/access';
import type { Actor } from '@/lib/access/actor';
import { originAllowed } from '@/lib/access/origin';
import { environment } from '@/server/environment';
import { readEnrolment } from './enrolment-cookie';
import { readSession } from './read-session';

const readingMethods = ['GET', 'HEAD', 'OPTIONS'];

const refusals = {
  'wrong-origin': [403, 'This request came from another site.'],
  'sign-in': [401, 'Sign in first.'],
  'not-allowed': [403, 'Your roles do not allow this.'],
} as const;

export function refusedResponse(code: keyof typeof refusals): Response {
  const [status, sentence] = refusals[code];
  return Response.json({ ok: false, code, sentence }, { status });
}

/** Whether the request only reads, or comes from a page of ours. */
export function requestOriginAllowed(request: Request): boolean {
  return (
    readingMethods.includes(request.method) || originAllowed(request.headers.get('origin'), environment().publicUrl)
  );
}

/**
 * First line of every route handler that is not public. For `bench` and `enrolled-bench`, `actor` may be null and
 * `stationId` names the enrolled browser's station; for everything else there is an actor.
 */
export async function authoriseRequest(
  request: Request,
  access: 'bench' | 'enrolled-bench',
): Promise<{ ok: true; actor: Actor | null; stationId: string | null } | { ok: false; response: Response }>;
export async function authoriseRequest(
  request: Request,
  access: Exclude<Access, 'public' | 'bench' | 'enrolled-bench'>,
): Promise<{ ok: true; actor: Actor; stationId: null } | { ok: false; response: Response }>;
export async function authoriseRequest(request: Request, access: Exclude<Access, 'public'>) {
  if (!requestOriginAllowed(request)) return { ok: false, response: refusedResponse('wrong-origin') };
  const cookies = parseCookie(request.headers.get('cookie') ?? '');
  const forBench = access === 'bench' || access === 'enrolled-bench';
  const [actor, enrolment] = await Promise.all([readSession(cookies), forBench ? readEnrolment(cookies) : null]);
  const decision = decideAccess(access, { roles: actor?.roles ?? null, enrolledBench: enrolment !== null });
  if (decision !== 'allowed') return { ok: false, response: refusedResponse(decision) };
  return { ok: true, actor, stationId: enrolment?.stationId ?? null };
}
