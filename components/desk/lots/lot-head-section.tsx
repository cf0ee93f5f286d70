import { PageHead } from '@/components/ui/page-head';
import type { LotReview } from '@/lib/contracts/lot-review';
import { LotActions, LotHold, LotSheetLink } from './lot-actions';
import { LotLine } from './lot-head';
import type { LotSectionProps } from './lot-section';
import { YieldSentence } from './yield-sentence';

/** Name and figures in one sentence; beside them what can be done, and the hold. */
export function LotHeadSection({ review, ...section }: LotSectionProps & { review: LotReview | null }) {
  const { lot, may, actions, onChanged } = section;
  return (
    <div className="grid items-start gap-x-14 gap-y-5 lg:grid-cols-[minmax(0,5fr)_minmax(0,3fr)]">
      <div>
        <PageHead title={<>Lot {lot.code}</>} lede={<LotLine lot={lot} />} />
        <YieldSentence summary={lot.summary} quoted={review?.quoted ?? null} />
      </div>
      <div className="grid gap-4 max-lg:-order-none">
        <div className="sw-screen-only flex flex-wrap items-center gap-3 lg:justify-end">
          <LotSheetLink code={lot.code} />
          {may.manage ? <LotActions lot={lot} actions={actions} onChanged={onChanged} /> : null}
        </div>
        <LotHold lot={lot} mayRelease={may.hold} actions={actions} onChanged={onChanged} />
      </div>
    </div>
  );
}
