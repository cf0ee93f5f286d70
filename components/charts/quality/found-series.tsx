import { scaleLinear } from 'd3-scale';
import { boardX, chartBox, shownBoards } from './chart-scale';
import { quantityLooks, scaleText } from './quantity-look';
import { dotsPath } from './thin-line';
import type { SeriesProps } from './series-props';
import { ValueAxis } from './value-axis';

const height = 124;
const top = 8;
const bottom = height - 8;

/** Values as found before trim: what the boards came with. On an axis of their own, since they lie far outside the limits. */
export function FoundSeries({ review, width, chosen, label, ref }: SeriesProps) {
  const { points, limits, quantity } = review;
  const box = chartBox(width);
  const shown = shownBoards(points.serials.length, review.size, box.narrow);
  const x = boardX(box, shown);
  const told = points.found.filter((value) => value !== null);
  if (told.length === 0) return null;
  const all = [...told, ...[limits?.min, limits?.max].filter((each) => typeof each === 'number')];
  const y = scaleLinear(
    [all.reduce((a, b) => Math.min(a, b)), all.reduce((a, b) => Math.max(a, b))],
    [bottom - 4, top + 4],
  );
  const drawn = points.found.flatMap((value, place) =>
    value === null || place < shown.from || place >= shown.to ? [] : [{ x: x(place), y: y(value) }],
  );
  const colour = quantityLooks[quantity].colour;
  const band = limits?.min != null && limits.max != null ? [y(limits.max), y(limits.min)] : null;
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
      {band ? (
        <g>
          <path
            d={`M${box.plotLeft} ${band[0]}H${box.plotRight}M${box.plotLeft} ${band[1]}H${box.plotRight}`}
            stroke={colour}
            strokeWidth={1.5}
          />
          <text x={box.plotRight + 8} y={(band[0]! + band[1]!) / 2 + 4} fontSize={13} fill={colour}>
            limits
          </text>
        </g>
      ) : null}
      <ValueAxis y={y} x={box.plotLeft - 4} ticks={4} text={(value) => scaleText(quantity, value)} />
      <path d={dotsPath(drawn)} fill="none" stroke="var(--sw-ink)" strokeWidth={3.4} strokeLinecap="round" />
      {chosen !== null && chosen >= shown.from && chosen < shown.to ? (
        <path d={`M${x(chosen)} ${top}V${bottom}`} stroke="var(--sw-accent)" strokeWidth={1.5} data-chosen-mark="" />
      ) : null}
    </svg>
  );
}
