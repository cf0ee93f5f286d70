import type { Database } from '@/db/client';
import { countLots, listLots } from '@/db/queries/lots';
import type { BenchRow } from '@/db/queries/station-benches';
import { say, type BenchSaying } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchAsk, BenchRefusal, OpenLot } from '@/lib/bench/types';
import { mayDo } from '@/lib/access/permissions';
import { findBadge } from '../people/find-badge';
import { signInAtBench } from '../people/sign-in-bench';
import { readStanding } from './read-standing';

type Ask<K extends BenchAsk['kind']> = Extract<BenchAsk, { kind: K }>;

/** Codes of sign-in that the bench has a sentence for without parameters. */
const plain = ['badge-unknown', 'badge-not-for-bench', 'pin-not-chosen', 'wrong-pin'] as const satisfies BenchSaying[];

function refused(code: string, retryAtIso?: string): BenchRefusal {
  if (code === 'too-many-tries' && retryAtIso)
    return { ok: false, refusal: say('too-many-tries', { untilIso: retryAtIso }), retryAtIso };
  return { ok: false, refusal: say(plain.find((each) => each === code) ?? 'badge-unknown') };
}

export async function answerBadge(ask: Ask<'badge'>): Promise<BenchAnswerTo<'badge'> | BenchRefusal> {
  const found = await findBadge(ask);
  return found.ok ? { ok: true, kind: 'badge', value: found.value } : refused(found.code);
}

export async function answerPin(
  db: Database,
  bench: BenchRow,
  ask: Ask<'pin'>,
): Promise<BenchAnswerTo<'pin'> | BenchRefusal> {
  const signedIn = await signInAtBench({ stationId: bench.id, accountId: ask.accountId, digits: ask.digits });
  if (!signedIn.ok) return refused(signedIn.code, signedIn.retryAtIso);
  const { accountId, sessionId, operatorNumber, locale, roles } = signedIn.value;
  const [lots, { standing }] = await Promise.all([
    listOpenLots(db),
    readStanding(db, bench, { accountId, sessionId, lotId: null, offerId: null, serial: null }),
  ]);
  const operator = {
    accountId,
    sessionId,
    number: operatorNumber ?? '',
    locale,
    mayCommission: mayDo(roles, 'commission-stations'),
  };
  return { ok: true, kind: 'pin', value: { operator, lots, standing } };
}

/** Lots that a bench may take: open and not on hold. */
export async function listOpenLots(db: Database): Promise<OpenLot[]> {
  const rows = await listLots(db, { state: 'open', stationCode: null, since: null });
  const free = rows.filter((row) => row.heldAt === null);
  const counts = await countLots(
    db,
    free.map((row) => row.id),
  );
  return free.map(({ id, code, boardTypeCode, size }) => ({
    lotId: id,
    code,
    boardTypeCode,
    size,
    tested: counts.get(id)?.tested ?? 0,
  }));
}
