import type { Database } from '@/db/client';
import { findAccount } from '@/db/queries/accounts';
import { findOpenOffer } from '@/db/queries/engineering-offers';
import type { BenchRow } from '@/db/queries/station-benches';
import { insertTrail } from '@/db/queries/trail';
import { mayDo } from '@/lib/access/permissions';
import type { Role } from '@/lib/access/roles';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchAsk, BenchPlace, BenchRefusal } from '@/lib/bench/types';
import { endOffer } from '../engineering/offers/end-offer';
import { nextRunOf, trialOfferOf } from './next-run';
import { readStanding } from './read-standing';

/** An engineer may, and an operator too: the engineer's offer is what allows the run. */
export function mayTakeOffers(roles: readonly Role[]): boolean {
  return mayDo(roles, 'make-engineering-runs') || mayDo(roles, 'test-boards');
}

/** Somebody at the bench starts the trial of the draft on offer. Who did is kept. */
export async function takeOffer(
  db: Database,
  bench: BenchRow,
  { offerId }: Extract<BenchAsk, { kind: 'offer' }>,
  who: BenchPlace,
): Promise<BenchAnswerTo<'offer'> | BenchRefusal> {
  const [account, offer] = await Promise.all([
    who.accountId ? findAccount(db, who.accountId) : null,
    findOpenOffer(db, bench.id),
  ]);
  if (!account || !mayTakeOffers(account.roles)) return { ok: false, refusal: say('not-permitted') };
  if (offer?.id !== offerId) return { ok: false, refusal: say('offer-ended') };
  await insertTrail(
    db,
    { accountId: account.id, stationId: bench.id },
    { action: 'offer.taken', entity: 'engineering-offer', entityId: offerId },
  );
  const { standing } = await readStanding(db, bench, { ...who, offerId, serial: null });
  return { ok: true, kind: 'offer', value: { offer: trialOfferOf(offer), next: nextRunOf(offer), standing } };
}

/** The trial is done at this bench. An offer that was taken back meanwhile has ended too. */
export async function endOfferAtBench(
  bench: BenchRow,
  { offerId }: Extract<BenchAsk, { kind: 'end-offer' }>,
  { accountId }: BenchPlace,
): Promise<BenchAnswerTo<'end-offer'> | BenchRefusal> {
  if (!accountId) return { ok: false, refusal: say('sign-in-first') };
  await endOffer({ accountId, stationId: bench.id }, offerId);
  return { ok: true, kind: 'end-offer', value: null };
}
