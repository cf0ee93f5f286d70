import { parseCookie } from 'cookie';
import type { Enrolment } from '@/db/queries/station-enrolments';
import { decideAccess, type Access } from '@/lib/access/access';
import type { Actor } from '@/lib/access/actor';
import { originAllowed } from '@/lib/access/origin';
import { environment } from '@/server/environment';
import { readEnrolment } from './enrolment-cookie';
import { readSession } from './read-session';

/** Whoever opened a socket: a desk account, a browser enrolled at a bench, or both. */
export interface SocketVisitor {
  actor: Actor | null;
  enrolment: Enrolment | null;
}

export type Handshake = { ok: true; visitor: SocketVisitor } | { ok: false; code: 'wrong-origin' | 'sign-in' };

/** Checks origin, session and enrolment of a socket's handshake request. Throws while the database is away. */
export async function readHandshake(headers: { origin?: string; cookie?: string }): Promise<Handshake> {
  if (!originAllowed(headers.origin, environment().publicUrl)) return { ok: false, code: 'wrong-origin' };
  const cookies = parseCookie(headers.cookie ?? '');
  const [actor, enrolment] = await Promise.all([readSession(cookies), readEnrolment(cookies)]);
  return actor || enrolment ? { ok: true, visitor: { actor, enrolment } } : { ok: false, code: 'sign-in' };
}

/** Whether the visitor may send an event with this access; for events about one station, `stationId` must be the enrolled one. */
export function socketMay(access: Access, { actor, enrolment }: SocketVisitor, stationId?: string): boolean {
  const enrolledBench = enrolment !== null && (stationId === undefined || enrolment.stationId === stationId);
  return decideAccess(access, { roles: actor?.roles ?? null, enrolledBench }) === 'allowed';
}
