import { objectStore } from '@/server/files/storage/object-store';
import { database } from '@/server/postgres';
import { readStoredHeads } from './stored-heads';
import { verifyTrail, type TrailReport } from './verify-trail';

/** Every chain, against heads kept in the database and in object storage, with the hash of every closed run; and when that was. */
export async function verifyWholeTrail(at = new Date()): Promise<TrailReport & { atIso: string }> {
  const store = objectStore();
  const known = store ? await readStoredHeads(store, at) : [];
  const report = await verifyTrail(database(), { runs: true, known });
  return { ...report, atIso: at.toISOString() };
}
