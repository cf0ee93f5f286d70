import { NextResponse, type NextRequest } from 'next/server';
import { decideAccess } from '@/lib/access/access';
import { accessOfRequest } from '@/lib/access/surface';
import { pathHeader } from '@/server/auth/authorise';
import { refusedResponse, requestOriginAllowed } from '@/server/auth/authorise-request';
import { readEnrolment } from '@/server/auth/enrolment-cookie';
import { nothingHereResponse } from '@/server/auth/nothing-here';
import { readSession, type Cookies } from '@/server/auth/read-session';

/**
 * Stands before every page, action and route handler: refuses writes from other sites, whatever is not listed in
 * lib/access/surface.ts, and whoever may not. Pages and actions ask again for themselves.
 */
export async function proxy(request: NextRequest): Promise<Response> {
  if (!requestOriginAllowed(request)) return refusedResponse('wrong-origin');
  const { pathname, search } = request.nextUrl;
  const headers = new Headers(request.headers);
  headers.set(pathHeader, pathname + search);
  const passOn = () => NextResponse.next({ request: { headers } });

  const isAction = request.headers.has('next-action');
  const access = accessOfRequest(request.method, pathname);
  if (access === null) return nothingHereResponse();
  // An action's own first line answers, in a form that the page which called it can follow.
  if (access === 'public' || isAction) return passOn();

  const cookies: Cookies = Object.fromEntries(request.cookies.getAll().map(({ name, value }) => [name, value]));
  const [actor, enrolment] = await Promise.all([readSession(cookies), readEnrolment(cookies)]);
  const decision = decideAccess(access, { roles: actor?.roles ?? null, enrolledBench: enrolment !== null });
  if (decision === 'allowed') return passOn();
  if (pathname.startsWith('/api/')) return refusedResponse(decision);
  // No rewrites: Next takes 127.0.0.1 for another host than localhost and would fetch them over the network.
  if (decision === 'not-allowed') return NextResponse.redirect(new URL('/not-allowed', request.url));
  const signIn = new URL('/sign-in', request.url);
  if (pathname !== '/') signIn.searchParams.set('next', pathname + search);
  return NextResponse.redirect(signIn);
}

export const config = { matcher: ['/((?!_next/|icon.svg|favicon.ico).*)'] };
