import type { Database, Transaction } from '@/db/client';

/** The zone in which certificates give times. */
export function certificateTimeZone(_db: Database | Transaction): Promise<string> {
  return Promise.resolve('UTC');
}
