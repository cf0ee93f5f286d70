import { scaleLinear } from 'd3-scale';
import { sampleQuantile } from '@/lib/statistics/summary/quantiles';
import { movingRangeOf } from './moving-range-of';
import { boardX, chartBox, shownBoards } from './chart-scale';
import { valueText } from './quantity-look';
import { boardsAStroke, dotsPath, linePath } from './thin-line';
import type { SeriesProps } from './series-props';
import { ValueAxis } from './value-axis';

const height = 104;
const top = 8;
const bottom = height - 8;

/** Distance of every board to the measured one before, under the individuals and on their x-axis. */
export function MovingRange({ review, width, chosen, label, ref }: SeriesProps) {
  const { points, baseline, quantity } = review;
  const box = chartBox(width);
  const shown = shownBoards(points.serials.length, review.size, box.narrow);
  const x = boardX(box, shown);
  const ranges = movingRangeOf(points.values);
  const told = ranges.filter((range) => range !== null);
  const upper = baseline.kind === 'frozen' ? baseline.rangeUpper : null;
  const most = Math.max(upper === null ? 0 : upper * 1.25, told.length > 0 ? sampleQuantile(told, 0.98) : 0) || 1;
  const y = scaleLinear([0, most], [bottom, top]).clamp(true);
  const drawn = ranges.flatMap((range, place) =>
    range === null || place < shown.from || place >= shown.to ? [] : [{ x: x(place), y: y(range), range }],
  );
  const beyond = upper === null ? [] : drawn.filter(({ range }) => range > upper);
  const text = (value: number) => valueText(quantity, value);
  return (
    <svg
      ref={ref}
      viewBox={`0 0 ${box.width} ${height}`}
      width={box.width}
      height={height}
      role="img"
      aria-label={label}
      className="block h-auto max-w-full"
    >
      <rect
        x={box.plotLeft}
        y={top}
        width={box.plotRight - box.plotLeft}
        height={bottom - top}
        fill="var(--sw-sheet)"
      />
      <ValueAxis y={y} x={box.plotLeft - 4} ticks={3} text={text} />
      {baseline.kind === 'frozen' ? (
        <g>
          <path d={`M${box.plotLeft} ${y(baseline.meanRange)}H${box.plotRight}`} stroke="var(--sw-ink-2)" />
          <path
            d={`M${box.plotLeft} ${y(baseline.rangeUpper)}H${box.plotRight}`}
            stroke="var(--sw-ink-2)"
            strokeWidth={1.4}
            strokeDasharray="1.5 3.5"
          />
          <g fontSize={13} fill="var(--sw-ink-2)">
            <text x={box.plotRight + 8} y={y(baseline.rangeUpper) + 4}>
              limit {text(baseline.rangeUpper)}
            </text>
            <text x={box.plotRight + 8} y={y(baseline.meanRange) + 4}>
              mean {text(baseline.meanRange)}
            </text>
          </g>
        </g>
      ) : null}
      <g fill="none">
        <path d={linePath(drawn, boardsAStroke(drawn.length, box.plotRight - box.plotLeft))} stroke="var(--sw-rule)" />
        {boardsAStroke(drawn.length, box.plotRight - box.plotLeft) === 1 ? (
          <path d={dotsPath(drawn)} stroke="var(--sw-ink)" strokeWidth={3} strokeLinecap="round" />
        ) : null}
        <path
          d={beyond.map((point) => `M${point.x.toFixed(1)} ${(point.y - 5).toFixed(1)}l5.5 10h-11z`).join('')}
          fill="var(--sw-attn)"
          stroke="var(--sw-on-attn)"
          strokeWidth={1.5}
        />
      </g>
      {chosen !== null && chosen >= shown.from && chosen < shown.to ? (
        <path d={`M${x(chosen)} ${top}V${bottom}`} stroke="var(--sw-accent)" strokeWidth={1.5} data-chosen-mark="" />
      ) : null}
    </svg>
  );
}
