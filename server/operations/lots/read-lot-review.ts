import { listComponentBatches } from '@/db/queries/lots-components';
import { findLotByCode } from '@/db/queries/lots';
import { findBaseline, getLotBoardType } from '@/db/queries/chart-baselines';
import { countRunsWithoutVerdict, findReviewLimits, listFirstAttempts } from '@/db/queries/review-boards';
import type { LotReview } from '@/lib/contracts/lot-review';
import { lotViewSchema, type LotView } from '@/lib/contracts/lot-view';
import { operatorLetters } from '@/lib/quality/operator-labels';
import { reviewLot } from '@/lib/quality/review-lot';
import { database } from '@/server/postgres';
import { freezeBaselines } from './freeze-baselines';
import { readReviewSettings } from './review-settings';

type ReviewView = Pick<LotView, 'quantity' | 'rules' | 'interval' | 'compare'>;

/** The figures of a lot for one quantity, or null when there is no lot of that code. */
export async function readLotReview(
  code: string,
  view: ReviewView = lotViewSchema.parse({}),
): Promise<LotReview | null> {
  const db = database();
  const lot = await findLotByCode(db, code.toUpperCase());
  if (!lot) return null;
  await freezeBaselines(db, lot.id);
  const type = await getLotBoardType(db, lot.id);
  const stored = (quantity: LotView['quantity']) => findBaseline(db, type, quantity);
  const limits = (quantity: LotView['quantity']) => findReviewLimits(db, lot.id, quantity);
  const [
    attempts,
    withoutVerdict,
    components,
    settings,
    ownBaseline,
    trip,
    release,
    ownLimits,
    tripLimits,
    releaseLimits,
  ] = await Promise.all([
    listFirstAttempts(db, lot.id),
    countRunsWithoutVerdict(db, lot.id),
    listComponentBatches(db, lot.id),
    readReviewSettings(db),
    stored(view.quantity),
    stored('trip-volts'),
    stored('release-volts'),
    limits(view.quantity),
    limits('trip-volts'),
    limits('release-volts'),
  ]);
  const lettersOf = operatorLetters([...attempts, ...withoutVerdict].map((run) => run.operatorId));
  const operator = (run: { operatorId: string; operatorNumber: string | null }) =>
    (settings.operatorsShown ? run.operatorNumber : null) ?? lettersOf.get(run.operatorId)!;
  return reviewLot({
    view,
    size: lot.size,
    boards: attempts.map((attempt) => ({ ...attempt, operator: operator(attempt) })),
    withoutVerdict: withoutVerdict.map((row) => ({
      station: row.stationCode,
      operator: operator(row),
      runs: row.runs,
    })),
    components,
    shifts: settings,
    limits: { [view.quantity]: ownLimits, 'trip-volts': tripLimits, 'release-volts': releaseLimits },
    baselines: { [view.quantity]: ownBaseline, 'trip-volts': trip, 'release-volts': release },
  });
}
