import type { ScaleLinear } from 'd3-scale';
import type { ReviewBaseline } from '@/lib/contracts/lot-review';

/** Keeps words readable over the line of the boards. */
const halo = { paintOrder: 'stroke', stroke: 'var(--sw-sheet)', strokeWidth: 3 } as const;

interface ControlLinesProps {
  y: ScaleLinear<number, number>;
  baseline: ReviewBaseline;
  left: number;
  right: number;
  text: (value: number) => string;
  narrow: boolean;
}

/** Centre and control limits of the frozen baseline, dotted. */
export function ControlLines({ y, baseline, left, right, text, narrow }: ControlLinesProps) {
  const limits = [baseline.upper, baseline.lower];
  return (
    <g>
      <path d={`M${left} ${y(baseline.centre)}H${right}`} stroke="var(--sw-ink-2)" />
      <path
        d={limits.map((limit) => `M${left} ${y(limit)}H${right}`).join('')}
        stroke="var(--sw-ink-2)"
        strokeWidth={1.4}
        strokeDasharray="1.5 3.5"
      />
      {narrow
        ? null
        : limits.map((limit) => (
            <text key={limit} x={left + 6} y={y(limit) - 5} fontSize={13} fill="var(--sw-ink-2)" {...halo}>
              control limit {text(limit)}
            </text>
          ))}
    </g>
  );
}
