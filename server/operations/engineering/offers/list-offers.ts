import { listLastPoints, listOffersOfRevision, listRunsOfOffers } from '@/db/queries/engineering-offers';
import type { OfferedDraft } from '@/lib/contracts/engineering-offer';
import { database } from '@/server/postgres';

/** Where a revision was tried and what its engineering runs gave, newest first. */
export async function listOffersOf(revisionId: string): Promise<OfferedDraft[]> {
  const db = database();
  const offers = await listOffersOfRevision(db, revisionId);
  const runs = await listRunsOfOffers(
    db,
    offers.map(({ id }) => id),
  );
  const points = await listLastPoints(
    db,
    runs.map(({ id }) => id),
  );
  return offers.map(({ offeredAt, endedAt, ...offer }) => ({
    ...offer,
    offeredIso: offeredAt.toISOString(),
    endedIso: endedAt?.toISOString() ?? null,
    runs: runs
      .filter((run) => run.offerId === offer.id)
      .map(({ startedAt, offerId: _offer, ...run }) => ({
        ...run,
        startedIso: startedAt.toISOString(),
        tripVolts: points.get(run.id)?.get('trip-volts') ?? null,
        releaseVolts: points.get(run.id)?.get('release-volts') ?? null,
        hysteresisVolts: points.get(run.id)?.get('hysteresis-volts') ?? null,
      })),
  }));
}
