import { headers } from 'next/headers';
import { takeRequest, type RequestCounts } from '@/lib/access/request-limit';

const counts: RequestCounts = new Map();
const mostAMinute = 30;

/** Whether this browser's address may ask once more. Kept in memory only: no record of who asked. */
export async function mayAskAgain(now = Date.now()): Promise<boolean> {
  const forwarded = (await headers()).get('x-forwarded-for');
  return takeRequest(counts, forwarded?.split(',')[0]?.trim() ?? '', now, mostAMinute);
}
