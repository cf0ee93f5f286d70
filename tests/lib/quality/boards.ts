import type { ChartQuantity } from '@/lib/contracts/lot-review';
import type { ReviewBoard } from '@/lib/quality/review-board';

const quantities: ChartQuantity[] = ['trip-volts', 'release-volts', 'hysteresis-volts', 'turns', 'seconds'];
export const allOf = (value: number | null) =>
  Object.fromEntries(quantities.map((quantity) => [quantity, value])) as ReviewBoard['values'];

let made = 0;
/** A board that passed at once, but for what is said. */
export function board(over: Partial<ReviewBoard> = {}): ReviewBoard {
  const n = ++made;
  return {
    serial: `CB1210${n}`,
    verdict: 'pass',
    rejectReason: null,
    lastVerdict: over.verdict ?? 'pass',
    startedAt: new Date(Date.UTC(2026, 10, 30, 7, n)),
    endedAt: new Date(Date.UTC(2026, 10, 30, 7, n, 20)),
    stationCode: 'S1',
    operator: 'A',
    trimRounds: 1,
    values: allOf(10.8),
    found: allOf(10.4),
    ...over,
  };
}
