import { z } from 'zod';
import type { ChainHead } from '@/db/queries/trail-chain';
import type { ObjectStore } from '@/server/files/storage/object-store';
import type { KnownHead } from './verify-trail';

const headsSchema = z.object({
  format: z.literal('sillwright-trail-heads'),
  version: z.literal(1),
  atIso: z.string(),
  heads: z.array(z.object({ chain: z.string(), place: z.number(), seal: z.string() })),
});

const keyOf = (day: Date) => `trail/${day.toISOString().slice(0, 10)}.json`;

/** Puts the heads of all chains into object storage, one object a day, out of the database's reach. Returns the key. */
export async function storeHeads(store: ObjectStore, heads: readonly ChainHead[], at: Date): Promise<string> {
  const text = JSON.stringify(
    { format: 'sillwright-trail-heads', version: 1, atIso: at.toISOString(), heads },
    null,
    2,
  );
  await store.put(keyOf(at), new TextEncoder().encode(text), 'application/json');
  return keyOf(at);
}

/** Heads of the last `days` days as object storage has them; a day without any is left out. */
export async function readStoredHeads(store: ObjectStore, at: Date, days = 60): Promise<KnownHead[]> {
  const known: KnownHead[] = [];
  for (let back = 0; back < days; back++) {
    const key = keyOf(new Date(at.getTime() - back * 86_400_000));
    const body = await store.get(key);
    if (!body) continue;
    const { heads } = headsSchema.parse(await new Response(body).json());
    known.push(...heads.map((head) => ({ ...head, from: `object storage, ${key}` })));
  }
  return known;
}
