import type { Transaction } from '@/db/client';
import { chartBaselines } from '@/db/schema/chart-baselines';
import { chartQuantities, type ChartQuantity } from '@/lib/contracts/lot-review';
import { boardsOfBaseline, firstBoardsBaseline } from '@/lib/quality/frozen-baseline';
import type { Measurement } from '@/lib/run/types';
import type { DemoAttempt, DemoBoard } from './drifting-boards';
import { testedAt } from './finished-lot-times';

const readings: Record<ChartQuantity, (attempt: DemoAttempt) => number | undefined> = {
  'trip-volts': verified('trip-volts'),
  'release-volts': verified('release-volts'),
  'hysteresis-volts': verified('hysteresis-volts'),
  turns: (attempt) => (attempt.measurements.some(({ phase }) => phase === 'found') ? attempt.turnsAdvised : undefined),
  seconds: (attempt) => attempt.seconds,
};

function verified(quantity: Measurement['quantity']) {
  return ({ measurements }: DemoAttempt) =>
    measurements.find((each) => each.quantity === quantity && each.phase === 'verified')?.value;
}

/** Frozen when the thirtieth board was tested, as a station would have done. */
export async function insertOwnBaselines(
  tx: Transaction,
  lotId: string,
  boardTypeId: string,
  boards: readonly DemoBoard[],
  firstDay: Date,
): Promise<void> {
  const rows = chartQuantities.flatMap((quantity) => {
    const measured = boards
      .map(({ place, attempts }) => ({ place, value: readings[quantity](attempts[0]!) }))
      .filter((each): each is { place: number; value: number } => each.value !== undefined);
    const figures = firstBoardsBaseline(measured.map(({ value }) => value));
    const last = measured[boardsOfBaseline - 1];
    return figures && last
      ? [{ quantity, lotId, boardTypeId, ...figures, frozenAt: testedAt(firstDay, last.place) }]
      : [];
  });
  await tx.insert(chartBaselines).values(rows);
}
