import { database } from '@/server/postgres';
import { verifyTrail, type TrailReport } from './verify-trail';

/** Every chain and the hash of every closed run, and when that was. */
export async function verifyWholeTrail(): Promise<TrailReport & { atIso: string }> {
  const report = await verifyTrail(database(), { runs: true });
  return { ...report, atIso: new Date().toISOString() };
}
