import { scaleLinear } from 'd3-scale';
import type { Ref } from 'react';
import type { LotReview } from '@/lib/contracts/lot-review';
import { boardKinds } from './board-kinds';
import { BoardLayer, type DrawnBoard } from './board-layer';
import { boardX, chartBox, pinnedTo, shownBoards, shownDomain } from './chart-scale';
import { ControlLines } from './control-lines';
import { Histogram } from './histogram';
import { LimitGround, LimitLines } from './limit-lines';
import { LotRuleAxis } from './lot-rule-axis';
import { placePinned, type PinnedValue } from './pinned-values';
import { quantityLooks, scaleText, valueText } from './quantity-look';
import { runBrackets } from './run-brackets';
import { ValueAxis } from './value-axis';

interface IndividualsChartProps {
  review: LotReview;
  /** CSS pixels. */
  width: number;
  /** Place of the board that the reader walks over; null none. */
  chosen: number | null;
  /** Read aloud. */
  label: string;
  ref?: Ref<SVGSVGElement>;
}

/** First-attempt values in test order over the lot rule, with limits, frozen control limits, runs, and the histogram beside them. */
export function IndividualsChart({ review, width, chosen, label, ref }: IndividualsChartProps) {
  const { quantity, points, limits, baseline } = review;
  const look = quantityLooks[quantity];
  const box = chartBox(width);
  const shown = shownBoards(points.serials.length, review.size, box.narrow);
  const x = boardX(box, shown);
  const measured = points.values.filter((value) => value !== null);
  const control = baseline.kind === 'frozen' ? baseline : null;
  const domain = shownDomain({ values: measured, limits, control });
  const y = scaleLinear(domain, [box.bottom, box.top]);
  const { boards, pinned } = drawn(review, domain, x, y, shown);
  const brackets = box.narrow ? [] : runBrackets(review.stretches, x, [box.plotLeft, box.plotRight]);
  const texts = { text: (v: number) => scaleText(quantity, v), fineText: (v: number) => valueText(quantity, v) };
  const across = [
    [box.plotLeft, box.plotRight],
    [box.histLeft, box.histRight],
  ] as const;
  return (
    <svg
      ref={ref}
      viewBox={`0 0 ${box.width} ${box.height}`}
      width={box.width}
      height={box.height}
      role="img"
      aria-label={label}
      className="block h-auto max-w-full"
    >
      <LimitGround y={y} limits={limits} across={across} />
      {brackets.map(({ stretch, left, right }) => (
        <rect
          key={`${stretch.rule} ${stretch.from}`}
          x={left}
          y={box.top}
          width={right - left}
          height={box.bottom - box.top}
          fill="var(--sw-attn-wash)"
        />
      ))}
      <LimitLines
        y={y}
        limits={limits}
        colour={look.colour}
        across={across}
        jawX={box.histRight}
        centre={control?.centre ?? null}
        narrow={box.narrow}
        {...texts}
      />
      <ValueAxis y={y} x={box.plotLeft - 4} ticks={6} text={texts.text} />
      {control ? (
        <ControlLines
          y={y}
          baseline={control}
          left={box.plotLeft}
          right={box.plotRight}
          text={texts.fineText}
          narrow={box.narrow}
        />
      ) : null}
      <BoardLayer boards={boards} pixels={box.plotRight - box.plotLeft} />
      <PinnedLayer pinned={pinned} marks={points.marks} top={box.top} bottom={box.bottom} right={box.plotRight} />
      {brackets.map(({ stretch, left, right, words }) => (
        <g key={`${stretch.rule} ${stretch.from}`}>
          <path
            d={`M${left + 1} ${box.top - 4}v-8H${right - 1}v8`}
            fill="none"
            stroke="var(--sw-ink)"
            strokeWidth={1.5}
          />
          {words ? (
            <text
              x={words.x}
              y={box.top - 7}
              fontSize={14}
              fontWeight={700}
              textAnchor={words.anchor}
              fill="var(--sw-ink)"
            >
              {words.text}
            </text>
          ) : null}
        </g>
      ))}
      <LotRuleAxis
        marks={points.marks}
        {...shown}
        x={x}
        left={box.plotLeft}
        right={box.plotRight}
        y={box.bottom + 24}
      />
      <Histogram
        bins={review.bins}
        y={y}
        left={box.histLeft}
        right={box.histRight}
        colour={look.colour}
        fitted={
          review.capability.kind === 'found' && review.deviation !== null
            ? { count: measured.length, mean: review.capability.mean, deviation: review.deviation }
            : null
        }
      />
      {chosen !== null && chosen >= shown.from && chosen < shown.to ? (
        <ChosenMark
          x={x(chosen)}
          y={chosenY(points.values[chosen] ?? null, y, domain)}
          top={box.top}
          bottom={box.bottom + 24}
        />
      ) : null}
    </svg>
  );
}

function drawn(
  { points, stretches }: LotReview,
  domain: readonly [number, number],
  x: (place: number) => number,
  y: (value: number) => number,
  { from, to }: { from: number; to: number },
): { boards: DrawnBoard[]; pinned: Omit<PinnedValue, 'text'>[] } {
  const boards: DrawnBoard[] = [];
  const pinned: Omit<PinnedValue, 'text'>[] = [];
  boardKinds({ points, stretches }).forEach((kind, place) => {
    const value = points.values[place];
    if (kind === null || value === null || value === undefined || place < from || place >= to) return;
    const edge = pinnedTo(domain, value);
    if (edge) pinned.push({ place, value, edge, x: x(place) });
    else boards.push({ place, kind, x: x(place), y: y(value) });
  });
  return { boards, pinned };
}

interface PinnedLayerProps {
  pinned: readonly Omit<PinnedValue, 'text'>[];
  marks: string;
  top: number;
  bottom: number;
  right: number;
}

/** Values beyond the axis stand at its edge with an arrow and their number. */
function PinnedLayer({ pinned, marks, top, bottom, right }: PinnedLayerProps) {
  return placePinned(pinned, (value) => value.toFixed(2)).map(({ place, edge, x, text }) => {
    const rejected = marks[place] === 'R';
    const colour = rejected ? 'var(--sw-reject)' : 'var(--sw-ink)';
    const y = edge === 'high' ? top + 4 : bottom - 4;
    const after = x + 70 < right;
    const arrow = after ? x + 8 : x - 16;
    return (
      <g key={place} fill={colour}>
        {rejected ? <rect x={x - 4.5} y={y - 4.5} width={9} height={9} /> : <circle cx={x} cy={y} r={3} />}
        {text ? (
          <>
            <path d={edge === 'high' ? `M${arrow} ${y + 8}h8l-4 -8z` : `M${arrow} ${y}h8l-4 8z`} />
            <text
              x={after ? x + 19 : x - 19}
              y={y + 9}
              textAnchor={after ? 'start' : 'end'}
              fontSize={13}
              fontWeight={700}
              className="font-num"
            >
              {text}
            </text>
          </>
        ) : null}
      </g>
    );
  });
}

function chosenY(value: number | null, y: (value: number) => number, [low, high]: readonly [number, number]) {
  return value === null ? null : y(Math.min(high, Math.max(low, value)));
}

function ChosenMark({ x, y, top, bottom }: { x: number; y: number | null; top: number; bottom: number }) {
  return (
    <g fill="none" stroke="var(--sw-accent)" data-chosen-mark="">
      <path d={`M${x} ${top}V${bottom}`} strokeWidth={1.5} />
      {y === null ? null : <circle cx={x} cy={y} r={8} strokeWidth={3} />}
    </g>
  );
}
