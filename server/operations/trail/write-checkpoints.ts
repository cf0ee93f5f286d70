import type { Database } from '@/db/client';
import { insertCheckpoints, listChainHeads, listCheckpoints, type ChainHead } from '@/db/queries/trail-chain';
import type { ObjectStore } from '@/server/files/storage/object-store';
import { storeHeads } from './stored-heads';

/**
 * Keeps the head of every chain that grew since its last checkpoint, in the database and, where there is one, in object storage,
 * which goes first: what stands in the database alone could be written anew with it. Returns all heads.
 */
export async function writeCheckpoints(db: Database, store: ObjectStore | null, at = new Date()): Promise<ChainHead[]> {
  const heads = await listChainHeads(db);
  const kept = await listCheckpoints(db);
  const isKept = (head: ChainHead) => kept.some(({ chain, place }) => chain === head.chain && place === head.place);
  const storageKey = store && heads.length > 0 ? await storeHeads(store, heads, at) : null;
  await insertCheckpoints(
    db,
    heads
      .filter((head) => !isKept(head))
      .map((head) => ({ ...head, writtenAt: at, storageKey, storedAt: storageKey === null ? null : at })),
  );
  return heads;
}

/** When a head was last kept; null: never. */
export async function lastCheckpointAt(db: Database): Promise<Date | null> {
  const times = (await listCheckpoints(db)).map(({ writtenAt }) => writtenAt.getTime());
  return times.length === 0 ? null : new Date(Math.max(...times));
}
