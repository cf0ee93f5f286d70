import { encode } from 'next-auth/jwt';
import type { Database } from '@/db/client';
import { insertSession } from '@/db/queries/sessions';
import { stationEnrolments } from '@/db/schema/station-enrolments';
import type { Visitor } from '@/lib/access/access';
import { roles, type Role } from '@/lib/access/roles';
import { enrolmentCookie } from '@/server/auth/enrolment-cookie';
import { hashToken, makeToken } from '@/server/auth/secret-hash';
import { insertAccount, insertStation } from '../database/records';

export interface TestVisitors {
  visitors: TestVisitor[];
  /** Where the enrolled bench stands. */
  station: { id: string; code: string };
}

export interface TestVisitor {
  name: string;
  visitor: Visitor;
  /** Cookies of a new session, so that one walk cannot end another's. */
  cookies(): Promise<Record<string, string>>;
}

/** Nobody, a browser enrolled at a bench, an account without roles, and one account for each role. */
export async function makeVisitors(db: Database): Promise<TestVisitors> {
  const admin = await insertAccount(db, ['administrator']);
  const station = await insertStation(db);
  const token = makeToken();
  await db
    .insert(stationEnrolments)
    .values({ stationId: station.id, tokenHash: hashToken(token), enrolledBy: admin.id });

  async function withRoles(name: string, held: Role[]): Promise<TestVisitor> {
    const account = await insertAccount(db, held);
    return {
      name,
      visitor: { roles: held, enrolledBench: false },
      async cookies() {
        const sessionId = await insertSession(db, { accountId: account.id, stationId: null });
        return {
          'next-auth.session-token': await encode({ token: { sessionId }, secret: process.env.NEXTAUTH_SECRET! }),
        };
      },
    };
  }

  const visitors: TestVisitor[] = [
    { name: 'nobody', visitor: { roles: null, enrolledBench: false }, cookies: async () => ({}) },
    {
      name: 'an enrolled bench',
      visitor: { roles: null, enrolledBench: true },
      cookies: async () => ({ [enrolmentCookie]: token }),
    },
    await withRoles('an account without roles', []),
    ...(await Promise.all(roles.map((role) => withRoles(role, [role])))),
  ];
  return { visitors, station };
}
