import type { IntervalMethod, ReviewYields } from '../contracts/lot-review';
import { rolledThroughputYield, yieldOf, type Operation } from '../statistics/proportions/yields';
import type { ReviewBoard } from './review-board';

type Board = Pick<ReviewBoard, 'verdict' | 'lastVerdict' | 'rejectReason' | 'trimRounds' | 'found'>;

/** Trimming that needed no second round is right the first time. */
const mostRoundsAtOnce = 1;

/** The operation that rejected a board. What is decided before the first prompt belongs to finding the points. */
function rejectedAt({ rejectReason, found }: Board): 'find' | 'trim' | 'verify' {
  if (rejectReason === 'trim-cannot-reach') return 'find';
  if (rejectReason?.startsWith('trim-')) return 'trim';
  return found['trip-volts'] === null ? 'find' : 'verify';
}

/**
 * Find, trim and verify, each over the boards that entered it. A second trim round is rework inside the line, which first-pass
 * yield hides and rolled throughput shows; everything after sealing counts as verifying.
 */
export function operationsOf(boards: readonly Board[]): Record<'find' | 'trim' | 'verify', Operation> {
  const counts = {
    find: { entered: boards.length, passedFirst: 0 },
    trim: { entered: 0, passedFirst: 0 },
    verify: { entered: 0, passedFirst: 0 },
  };
  for (const board of boards) {
    const failed = board.verdict === 'reject' ? rejectedAt(board) : null;
    if (failed === 'find') continue;
    counts.find.passedFirst++;
    counts.trim.entered++;
    if (failed === 'trim') continue;
    if (board.trimRounds <= mostRoundsAtOnce) counts.trim.passedFirst++;
    counts.verify.entered++;
    if (failed === null) counts.verify.passedFirst++;
  }
  return counts;
}

/** First-pass and final yield, and rolled throughput over the operations; boards without a verdict are in none. */
export function lotYields(boards: readonly Board[], method: IntervalMethod): ReviewYields {
  const tested = boards.length;
  const passedFirst = boards.filter((board) => board.verdict === 'pass').length;
  const passedLast = boards.filter((board) => board.lastVerdict === 'pass').length;
  const operations = operationsOf(boards);
  const names = ['find', 'trim', 'verify'] as const;
  return {
    tested,
    passedFirst,
    passedLast,
    first: yieldOf(passedFirst, tested, method),
    final: yieldOf(passedLast, tested, method),
    rolled: rolledThroughputYield(names.map((name) => operations[name])),
    operations: names.map((name) => ({
      name,
      ...operations[name],
      share: yieldOf(operations[name].passedFirst, operations[name].entered, method),
    })),
  };
}
