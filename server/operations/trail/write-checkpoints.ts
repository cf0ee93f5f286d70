import type { Database } from '@/db/client';
import { insertCheckpoints, listChainHeads, listCheckpoints, type ChainHead } from '@/db/queries/trail-chain';

/** Keeps the head of every chain that grew since its last checkpoint; returns all heads, as a report sends them out. */
export async function writeCheckpoints(db: Database, at = new Date()): Promise<ChainHead[]> {
  return db.transaction(async (tx) => {
    const heads = await listChainHeads(tx);
    const kept = await listCheckpoints(tx);
    const isKept = (head: ChainHead) => kept.some(({ chain, place }) => chain === head.chain && place === head.place);
    await insertCheckpoints(
      tx,
      heads.filter((head) => !isKept(head)).map((head) => ({ ...head, writtenAt: at })),
    );
    return heads;
  });
}
