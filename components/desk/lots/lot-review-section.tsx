'use client';

import { useIsFetching } from '@tanstack/react-query';
import { EmptyState } from '@/components/ui/empty-state';
import { FillInChoice } from '@/components/ui/fill-in';
import { Section } from '@/components/ui/page-head';
import type { LotReview } from '@/lib/contracts/lot-review';
import type { LotView } from '@/lib/contracts/lot-view';
import { CopyAddress } from '../copy-address';
import type { LotSectionProps } from './lot-section';
import { BaselineLine } from './review/baseline-line';
import { BinsTable } from './review/bins-table';
import { ChartKey } from './review/chart-key';
import { ChooseBaseline } from './review/choose-baseline';
import { LotCharts } from './review/lot-charts';
import { QuantityTabs } from './review/quantity-tabs';
import { ValuesTable } from './review/values-table';

const forms = [
  { value: 'charts', label: 'charts' },
  { value: 'tables', label: 'tables' },
];
const foundChoices = [
  { value: 'hidden', label: 'without' },
  { value: 'shown', label: 'with' },
];

/** Every board in test order: the charts of one quantity or their tables, and where their limits come from. */
export function LotReviewSection({ review, ...section }: LotSectionProps & { review: LotReview }) {
  const { lot, view, changeView, may } = section;
  const asCharts = view.as === 'charts';
  const reading = useIsFetching({ queryKey: ['lot-review', lot.code] }) > 0;
  return (
    <Section
      title="Every board, in test order"
      aside={
        <div className="flex flex-1 flex-wrap items-baseline justify-between gap-x-5 gap-y-1">
          <QuantityTabs value={view.quantity} onChange={(quantity) => changeView({ quantity })} />
          <span className="flex flex-wrap items-baseline gap-x-5">
            {reading ? <Reading /> : null}
            {asCharts ? <ChartKey /> : null}
          </span>
        </div>
      }
    >
      {review.points.serials.length === 0 ? (
        <EmptyState title="No board has a verdict yet.">The first one appears here as it finishes.</EmptyState>
      ) : asCharts ? (
        <>
          <LotCharts
            review={review}
            lotCode={lot.code}
            boardTypeCode={lot.boardTypeCode}
            foundShown={view.found === 'shown'}
          />
        </>
      ) : (
        <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-6 lg:grid-cols-[minmax(0,3fr)_minmax(0,1fr)]">
          <div>
            <ValuesTable key={review.quantity} review={review} boardTypeCode={lot.boardTypeCode} />
          </div>
          <BinsTable review={review} />
        </div>
      )}
      <div className="mt-2 flex flex-wrap items-center justify-between gap-x-6 gap-y-2 text-ink-2">
        <span className="flex flex-wrap items-center gap-x-4 gap-y-1">
          <span>
            <BaselineLine baseline={review.baseline} />
          </span>
          {may.manage ? <ChooseBaseline review={review} {...section} /> : null}
        </span>
        <span className="sw-screen-only flex flex-wrap items-center gap-2">
          Show{' '}
          <FillInChoice
            label="Charts or tables"
            choices={forms}
            value={view.as}
            onChange={(event) => changeView({ as: event.target.value as LotView['as'] })}
          />
          {asCharts ? (
            <>
              {' '}
              <FillInChoice
                label="As-found values"
                choices={foundChoices}
                value={view.found}
                onChange={(event) => changeView({ found: event.target.value as LotView['found'] })}
              />{' '}
              as-found values
            </>
          ) : null}
          <CopyAddress />
        </span>
      </div>
    </Section>
  );
}

/** After 400 ms only, so that quick answers show nothing. */
function Reading() {
  return (
    <span role="status" className="text-cap text-ink-2 [animation:sw-appear_1ms_400ms_backwards]">
      Reading the figures…
    </span>
  );
}
