import { listPeople, type PersonRow } from '@/db/queries/accounts';
import { listEvaluatedTries } from '@/db/queries/sign-in-attempts';
import { nextTryAtMs, triesWindowMs } from '@/lib/access/sign-in-limits';
import { database } from '@/server/postgres';

/** A wait shorter than this is not worth telling an administrator. */
const toldFromMs = 15_000;

/** Somebody who must wait before the next try, since PINs or passwords were wrong. */
export interface Waiting {
  failures: number;
  /** Null: at a desk. */
  stationCode: string | null;
  lastTryIso: string;
  untilIso: string;
}

export interface Person {
  accountId: string;
  name: string;
  email: string | null;
  operatorNumber: string | null;
  badgeCode: string | null;
  roles: PersonRow['roles'];
  locale: string;
  hasPassword: boolean;
  hasPin: boolean;
  createdIso: string;
  disabledIso: string | null;
  lastSeenIso: string | null;
  trainedUntilIso: string | null;
  waiting: Waiting | null;
}

/** Everyone with an account, closed ones too, by name. */
export async function listPersons(now = new Date()): Promise<Person[]> {
  const db = database();
  const [rows, tries] = await Promise.all([
    listPeople(db),
    listEvaluatedTries(db, new Date(now.getTime() - triesWindowMs)),
  ]);
  const waitingOf = (accountId: string): Waiting | null => {
    const own = tries.filter((t) => t.identifier === accountId);
    for (const stationId of new Set(own.map((t) => t.stationId))) {
      const there = own.filter((t) => t.stationId === stationId);
      const evaluated = there.map((t) => ({ atMs: t.at.getTime(), succeeded: t.outcome === 'succeeded' }));
      const untilMs = nextTryAtMs(evaluated, now.getTime());
      if (untilMs < now.getTime() + toldFromMs) continue;
      const failed = there.filter((t) => t.outcome === 'failed');
      return {
        failures: failed.length,
        stationCode: there[0]!.stationCode,
        lastTryIso: new Date(Math.max(...failed.map((t) => t.at.getTime()))).toISOString(),
        untilIso: new Date(untilMs).toISOString(),
      };
    }
    return null;
  };
  return rows.map(({ id, createdAt, disabledAt, lastSeenAt, trainedUntil, ...row }) => ({
    ...row,
    accountId: id,
    createdIso: createdAt.toISOString(),
    disabledIso: disabledAt?.toISOString() ?? null,
    lastSeenIso: lastSeenAt?.toISOString() ?? null,
    trainedUntilIso: trainedUntil?.toISOString() ?? null,
    waiting: waitingOf(id),
  }));
}
