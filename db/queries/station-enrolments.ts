import { and, eq, isNull } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { stationEnrolments } from '@/db/schema/station-enrolments';
import { stations } from '@/db/schema/stations';

export interface Enrolment {
  enrolmentId: string;
  stationId: string;
  stationCode: string;
}

/** The station that a browser with this token stands at, or null when it is not or no longer enrolled. */
export async function findEnrolment(db: Database, tokenHash: string): Promise<Enrolment | null> {
  const [row] = await db
    .select({ enrolmentId: stationEnrolments.id, stationId: stations.id, stationCode: stations.code })
    .from(stationEnrolments)
    .innerJoin(stations, eq(stations.id, stationEnrolments.stationId))
    .where(
      and(eq(stationEnrolments.tokenHash, tokenHash), isNull(stationEnrolments.revokedAt), isNull(stations.retiredAt)),
    );
  return row ?? null;
}

export async function insertEnrolment(
  tx: Transaction,
  enrolment: { stationId: string; tokenHash: string; enrolledBy: string },
): Promise<string> {
  const [row] = await tx.insert(stationEnrolments).values(enrolment).returning({ id: stationEnrolments.id });
  return row!.id;
}

/** Ends the enrolments of a station; a trigger tells whoever holds a socket of theirs. */
export async function revokeEnrolments(tx: Transaction, stationId: string): Promise<number> {
  const rows = await tx
    .update(stationEnrolments)
    .set({ revokedAt: new Date() })
    .where(and(eq(stationEnrolments.stationId, stationId), isNull(stationEnrolments.revokedAt)))
    .returning({ id: stationEnrolments.id });
  return rows.length;
}
