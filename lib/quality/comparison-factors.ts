import { batchAt } from './batch-at';
import type { ReviewBoard } from './review-board';
import { shiftHourReader } from './shift-hour';

export interface ShiftClock {
  /** IANA name. */
  timeZone: string;
  /** Beginnings of the shifts, such as 06:00. */
  shiftStarts: readonly string[];
}

type Batches = readonly { component: string; batch: string; fromAt: Date }[];

/** What boards of a lot can be compared by; a component only once it has a batch. */
export function comparisonFactors(batches: Batches): { value: string; label: string }[] {
  const components = [...new Set(batches.map((each) => each.component))].sort();
  return [
    { value: 'station', label: 'stations' },
    { value: 'operator', label: 'operators' },
    { value: 'hour', label: 'hours of the shift' },
    ...components.map((component) => ({ value: `batch:${component}`, label: `batches of ${component}` })),
  ];
}

/** Which group a board belongs to by a factor; null in none. */
export function labelReader(
  factor: string,
  batches: Batches,
  shifts: ShiftClock,
): (board: Pick<ReviewBoard, 'stationCode' | 'operator' | 'startedAt'>) => string | null {
  if (factor === 'operator') return (board) => board.operator;
  if (factor === 'hour') {
    const hourOf = shiftHourReader(shifts.timeZone, shifts.shiftStarts);
    return (board) => String(hourOf(board.startedAt));
  }
  if (factor.startsWith('batch:')) return (board) => batchAt(batches, factor.slice('batch:'.length), board.startedAt);
  return (board) => board.stationCode;
}
