import { and, eq, gt, inArray, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { signInAttempts } from '@/db/schema/sign-in-attempts';
import { stations } from '@/db/schema/stations';
import { nextTryAtMs, triesWindowMs } from '@/lib/access/sign-in-limits';

/** Whose tries are counted together: an account, or the text given where no account has it, at a station or a desk. */
export interface TrySubject {
  identifier: string;
  stationId: string | null;
}

export type Reservation = { ok: true; attemptId: string } | { ok: false; retryAt: Date };

const of = ({ identifier, stationId }: TrySubject) =>
  and(
    eq(signInAttempts.identifier, identifier),
    stationId ? eq(signInAttempts.stationId, stationId) : isNull(signInAttempts.stationId),
  );

/**
 * Takes one of the tries that may be evaluated now, counted as failed until `markTrySucceeded`: tries made at the same
 * moment cannot slip past the limit. Refused with the time of the next try.
 */
export async function reserveTry(db: Database, subject: TrySubject, now: Date): Promise<Reservation> {
  return db.transaction(async (tx) => {
    const key = `${subject.identifier} at ${subject.stationId ?? 'desk'}`;
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${key}, 0))`);
    const rows = await tx
      .select({ at: signInAttempts.at, outcome: signInAttempts.outcome })
      .from(signInAttempts)
      .where(
        and(
          of(subject),
          gt(signInAttempts.at, new Date(now.getTime() - triesWindowMs)),
          inArray(signInAttempts.outcome, ['succeeded', 'failed']),
        ),
      );
    const tries = rows.map((row) => ({ atMs: row.at.getTime(), succeeded: row.outcome === 'succeeded' }));
    const nextMs = nextTryAtMs(tries, now.getTime());
    const outcome = nextMs > now.getTime() ? 'not-evaluated' : 'failed';
    const [attempt] = await tx
      .insert(signInAttempts)
      .values({ ...subject, at: now, outcome })
      .returning({ id: signInAttempts.id });
    return outcome === 'failed' ? { ok: true, attemptId: attempt!.id } : { ok: false, retryAt: new Date(nextMs) };
  });
}

export async function markTrySucceeded(db: Database, attemptId: string): Promise<void> {
  await db.update(signInAttempts).set({ outcome: 'succeeded' }).where(eq(signInAttempts.id, attemptId));
}

/** A new PIN or password starts without the failures of the old one. */
export async function clearFailures(db: Database | Transaction, identifier: string): Promise<void> {
  await db
    .update(signInAttempts)
    .set({ outcome: 'cleared' })
    .where(and(eq(signInAttempts.identifier, identifier), eq(signInAttempts.outcome, 'failed')));
}

/** Evaluated tries since `since` at any place, for telling who is waiting to try again. */
export async function listEvaluatedTries(db: Database, since: Date) {
  return db
    .select({
      identifier: signInAttempts.identifier,
      stationId: signInAttempts.stationId,
      stationCode: stations.code,
      at: signInAttempts.at,
      outcome: signInAttempts.outcome,
    })
    .from(signInAttempts)
    .leftJoin(stations, eq(stations.id, signInAttempts.stationId))
    .where(and(gt(signInAttempts.at, since), inArray(signInAttempts.outcome, ['succeeded', 'failed'])));
}
