/** Requests of each address in the current window; empty at the start. */
export type RequestCounts = Map<string, { sinceMs: number; requests: number }>;

const windowMs = 60_000;
/** Addresses remembered at most; beyond it those of past windows are dropped. */
const mostAddresses = 10_000;

/** Counts one more request. False: this address has made more than `most` within a minute. */
export function takeRequest(counts: RequestCounts, address: string, atMs: number, most: number): boolean {
  const entry = counts.get(address);
  if (entry && atMs - entry.sinceMs < windowMs) {
    entry.requests += 1;
    return entry.requests <= most;
  }
  if (counts.size >= mostAddresses)
    for (const [known, { sinceMs }] of counts) if (atMs - sinceMs >= windowMs) counts.delete(known);
  // Where that many are asking at once, nobody new is counted, and nobody new is answered.
  if (counts.size >= mostAddresses && !entry) return false;
  counts.set(address, { sinceMs: atMs, requests: 1 });
  return true;
}
