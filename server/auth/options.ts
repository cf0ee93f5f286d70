import type { NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { signOutSession } from '@/server/operations/people/sign-out-session';
import { signInAtDesk } from '@/server/operations/people/sign-in-desk';
import { environment } from '@/server/environment';
import { cookiesAreSecure } from './read-session';

const cookieSeconds = 12 * 3600;

/** What the sign-in page is told when it fails: the code, and the time of the next try where there is one. */
function problemOf(refused: { code: string; retryAtIso?: string }): Error {
  return new Error(refused.retryAtIso ? `${refused.code}|${refused.retryAtIso}` : refused.code);
}

/** next-auth with e-mail and password. The signed cookie holds a session's id and nothing that could go stale. */
export function authOptions(): NextAuthOptions {
  return {
    secret: environment().secret,
    session: { strategy: 'jwt', maxAge: cookieSeconds },
    useSecureCookies: cookiesAreSecure(),
    pages: { signIn: '/sign-in', error: '/sign-in' },
    providers: [
      CredentialsProvider({
        id: 'desk',
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        async authorize(given) {
          const signedIn = await signInAtDesk({ email: given?.email ?? '', password: given?.password ?? '' });
          if (!signedIn.ok) throw problemOf(signedIn);
          return { id: signedIn.value.accountId, sessionId: signedIn.value.sessionId };
        },
      }),
    ],
    callbacks: {
      jwt({ token, user }) {
        return user && 'sessionId' in user ? { sub: user.id, sessionId: user.sessionId } : token;
      },
    },
    events: {
      async signOut({ token }) {
        if (typeof token?.sessionId === 'string') await signOutSession(token.sessionId);
      },
    },
  };
}
