import { PageHead } from '@/components/ui/page-head';
import type { LotReview } from '@/lib/contracts/lot-review';
import { LotActions, LotHold, LotSheetLink } from './lot-actions';
import { LotLine } from './lot-head';
import type { LotSectionProps } from './lot-section';
import { YieldSentence } from './yield-sentence';

/** Name and figures in one sentence; beside them what can be done, and the hold. */
export function LotHeadSection({ review, ...section }: LotSectionProps & { review: LotReview | null }) {
  const { lot, may, actions, deciding, onChanged } = section;
  return (
    <div className="grid items-start gap-x-14 gap-y-4 lg:grid-cols-[minmax(0,5fr)_minmax(0,3fr)] lg:gap-y-0 lg:[grid-template-areas:'head_moves''words_hold']">
      <div className="lg:[grid-area:head]">
        <PageHead title={<>Lot {lot.code}</>} lede={<LotLine lot={lot} />} />
      </div>
      <div className="lg:[grid-area:hold]">
        <LotHold lot={lot} mayRelease={may.hold} actions={actions} reasons={deciding.reasons} onChanged={onChanged} />
      </div>
      <div className="lg:[grid-area:words]">
        <YieldSentence summary={lot.summary} quoted={review?.quoted ?? null} />
      </div>
      <div className="sw-screen-only flex flex-wrap items-center gap-3 lg:justify-end lg:[grid-area:moves]">
        <LotSheetLink code={lot.code} />
        {may.manage ? (
          <LotActions lot={lot} actions={actions} reasons={deciding.reasons} onChanged={onChanged} />
        ) : null}
      </div>
    </div>
  );
}
