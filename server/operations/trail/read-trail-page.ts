import { countTrail, listKeptSeals, listTrail, listTrailChoices } from '@/db/queries/trail-page';
import type { TrailFilter, TrailPage } from '@/lib/contracts/trail-page';
import { changesOf, thingWords } from '@/lib/trail/entry-words';
import { database } from '@/server/postgres';

const rowsOnAPage = 50;

/** One page of the trail, newest first. */
export async function readTrailPage({ what, who, since, containing, before }: TrailFilter): Promise<TrailPage> {
  const db = database();
  const question = {
    entity: what || null,
    accountId: who || null,
    since: since ? new Date(`${since}T00:00:00Z`) : null,
    containing: containing || null,
  };
  const [found, total, choices, kept] = await Promise.all([
    listTrail(db, question, before, rowsOnAPage + 1),
    countTrail(db, question),
    listTrailChoices(db),
    listKeptSeals(db),
  ]);
  const rows = found.slice(0, rowsOnAPage).map(({ entry, who: name }) => ({
    id: entry.id,
    atIso: entry.at.toISOString(),
    who: name,
    chain: entry.chain ?? '',
    place: entry.place,
    action: entry.action,
    entity: entry.entity,
    thing: thingWords(entry.entityId, entry.before, entry.after),
    changes: changesOf(entry.before, entry.after),
    reason: entry.reason,
    seal: entry.seal?.slice(-6) ?? null,
    checkpoint: entry.seal !== null && kept.seals.has(entry.seal),
  }));
  return {
    rows,
    total,
    older: found.length > rowsOnAPage ? rows.at(-1)!.id : null,
    ...choices,
    checkpointAtIso: kept.newest?.toISOString() ?? null,
  };
}
