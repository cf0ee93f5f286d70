import { endOpenOffer } from '@/db/queries/engineering-offers';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Takes an offer back, at a desk or at the bench; a run under way finishes. Code: offer-ended. */
export async function endOffer(
  actor: Pick<Actor, 'accountId' | 'stationId'>,
  offerId: string,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const ended = await endOpenOffer(tx, offerId, { accountId: actor.accountId, at });
    if (!ended) return refusal('offer-ended', 'This offer has ended already.');
    await insertTrail(tx, actor, { action: 'offer.ended', entity: 'engineering-offer', entityId: offerId });
    return done;
  });
}
