import { findEnrolment, type Enrolment } from '@/db/queries/station-enrolments';
import { database } from '@/server/postgres';
import { cookiesAreSecure, type Cookies } from './read-session';
import { hashToken } from './secret-hash';

export const enrolmentCookie = 'sillwright-bench';

/** A bench browser stays enrolled for a year, or until the administrator ends it. */
export function enrolmentCookieOptions() {
  return { httpOnly: true, sameSite: 'lax', secure: cookiesAreSecure(), path: '/', maxAge: 365 * 24 * 3600 } as const;
}

/** The station that this browser is enrolled at, or null. */
export async function readEnrolment(cookies: Cookies): Promise<Enrolment | null> {
  const token = cookies[enrolmentCookie];
  return token ? findEnrolment(database(), hashToken(token)) : null;
}
