'use client';

import { useRouter } from 'next/navigation';
import { useRef, type PointerEvent } from 'react';
import { boardX, chartBox, shownBoards } from '@/components/charts/quality/chart-scale';
import { FoundSeries } from '@/components/charts/quality/found-series';
import { IndividualsChart } from '@/components/charts/quality/individuals-chart';
import { MovingRange } from '@/components/charts/quality/moving-range';
import { quantityLooks } from '@/components/charts/quality/quantity-look';
import { boardsAStroke } from '@/components/charts/quality/thin-line';
import { useElementWidth } from '@/components/charts/quality/use-element-width';
import type { LotReview } from '@/lib/contracts/lot-review';
import { BoardReadout, boardWords } from './board-readout';
import { SaveButtons } from './save-buttons';
import { useChosenBoard } from './use-chosen-board';

interface LotChartsProps {
  review: LotReview;
  lotCode: string;
  boardTypeCode: string;
  foundShown: boolean;
}

/** Width of a desk's page within its margins, until the page is on a screen. */
const deskWidth = 1344;

/** Individuals, moving range and as-found values over one axis; one board is chosen in all of them. */
export function LotCharts({ review, lotCode, boardTypeCode, foundShown }: LotChartsProps) {
  const router = useRouter();
  const [frame, width] = useElementWidth<HTMLDivElement>(deskWidth);
  const individuals = useRef<SVGSVGElement>(null);
  const ranges = useRef<SVGSVGElement>(null);
  const found = useRef<SVGSVGElement>(null);
  const { points, quantity } = review;
  const { place, choose, onKeyDown } = useChosenBoard(points.serials, (serial) =>
    router.push(`/units/${encodeURIComponent(serial)}`),
  );
  const { name, unit } = quantityLooks[quantity];
  const box = chartBox(width);
  const shown = shownBoards(points.serials.length, review.size, box.narrow);
  const each = boardsAStroke(shown.to - shown.from, box.plotRight - box.plotLeft);
  const point = (event: PointerEvent<HTMLDivElement>) => {
    const left = event.clientX - event.currentTarget.getBoundingClientRect().left;
    const x = boardX(box, shown);
    const to = shown.from + Math.round((left - x(shown.from)) / (x(1) - x(0)));
    if (left >= box.plotLeft && left <= box.plotRight && to >= 0 && to < points.serials.length) choose(to);
  };
  const told = points.values.filter((value) => value !== null).length;
  const label = `${name} of ${told} boards in test order, with their histogram`;
  const file = `lot-${lotCode}-${quantity}`;
  const drawn = { review, width, chosen: place };
  return (
    <div ref={frame}>
      <div
        role="slider"
        tabIndex={0}
        aria-label={`${name}, board by board`}
        aria-orientation="horizontal"
        aria-valuemin={1}
        aria-valuemax={Math.max(1, points.serials.length)}
        aria-valuenow={(place ?? 0) + 1}
        aria-valuetext={place === null ? 'No board chosen' : boardWords(review, place)}
        onKeyDown={onKeyDown}
        onPointerMove={point}
        onPointerDown={point}
        className="overflow-hidden"
      >
        <IndividualsChart {...drawn} label={label} ref={individuals} />
        <p className="mt-2 text-cap text-ink-2">Moving range, {unit}</p>
        <MovingRange {...drawn} label={`Moving range of ${name.toLowerCase()}`} ref={ranges} />
        {foundShown ? (
          <>
            <p className="mt-2 text-cap text-ink-2">As found before trim, {unit}</p>
            <FoundSeries {...drawn} label={`${name} as found before trim`} ref={found} />
          </>
        ) : null}
      </div>
      <div className="mt-1.5 flex flex-wrap items-start justify-between gap-x-6 gap-y-1">
        <BoardReadout review={review} boardTypeCode={boardTypeCode} place={place} />
        <span className="flex flex-wrap gap-x-5">
          <SaveButtons svg={individuals} name={file} what="the chart" />
          <details className="sw-screen-only text-cap">
            <summary className="sw-link">Other pictures</summary>
            <span className="mt-1 grid gap-1">
              <span className="flex gap-3">
                Moving range <SaveButtons svg={ranges} name={`${file}-range`} what="the moving range" />
              </span>
              {foundShown ? (
                <span className="flex gap-3">
                  As found <SaveButtons svg={found} name={`${file}-found`} what="the as-found values" />
                </span>
              ) : null}
            </span>
          </details>
        </span>
      </div>
      {box.narrow && review.size > shown.to - shown.from ? (
        <p className="text-cap text-ink-2">The newest {shown.to - shown.from} boards; the table has all.</p>
      ) : null}
      {each > 1 ? (
        <p className="text-cap text-ink-2">
          Each stroke spans the lowest and the highest of {each} boards; marked boards are drawn one by one.
        </p>
      ) : null}
    </div>
  );
}
