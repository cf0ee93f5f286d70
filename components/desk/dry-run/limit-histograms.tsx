import { scaleLinear } from 'd3-scale';
import type { BoardLimits } from '@/lib/contracts/board-type';
import type { Bins, DryRunResult } from '@/lib/contracts/dry-run';
import { count } from '../numbers';

const [width, height, axis] = [440, 92, 24];
const sides = ['trip', 'release'] as const;

/** The limits' own stretch of each rail, enlarged: the draft solid, the released revision dashed, jaws at the limits. */
export function LimitHistograms({ limits, result }: { limits: BoardLimits; result: DryRunResult }) {
  return (
    <div className="grid gap-1">
      {sides.map((side) => (
        <LimitHistogram
          key={side}
          side={side}
          limits={side === 'trip' ? limits.tripVolts : limits.releaseVolts}
          draft={result.draft[side]}
          released={result.released?.[side] ?? null}
        />
      ))}
    </div>
  );
}

interface LimitHistogramProps {
  side: (typeof sides)[number];
  limits: { min: number; max: number };
  draft: Bins;
  released: Bins | null;
}

function LimitHistogram({ side, limits, draft, released }: LimitHistogramProps) {
  const room = (limits.max - limits.min) * 0.2;
  const [low, high] = [limits.min - room, limits.max + room];
  const x = scaleLinear([low, high], [0, width]);
  const most = Math.max(1, ...draft.counts, ...(released?.counts ?? []));
  const y = scaleLinear([0, most], [height - axis, 8]);
  const colour = `var(--sw-${side})`;
  const path = ({ from, width: bin, counts }: Bins) => {
    const steps = counts.flatMap((boards, i) => {
      const [a, b] = [from + i * bin, from + (i + 1) * bin];
      return b < low || a > high ? [] : [`H${x(a).toFixed(1)}V${y(boards).toFixed(1)}H${x(b).toFixed(1)}`];
    });
    return steps.length === 0
      ? ''
      : `M${x(Math.max(low, from)).toFixed(1)} ${height - axis}${steps.join('')}V${height - axis}`;
  };
  const beyond = beyondOf(draft, low, high);
  const word = side === 'trip' ? 'Trip' : 'Release';
  const jaw = (at: number, out: number) => `M${x(at)} ${height - axis}v-16l${out * 9} 16z`;
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={`${word} between its limits ${limits.min.toFixed(2)} and ${limits.max.toFixed(2)} V: at most ${most} boards in 5 mV${beyond ? `, ${beyond} boards beyond the drawing` : ''}.`}
      className="block h-auto w-full"
    >
      <rect
        x={x(limits.min)}
        y={4}
        width={x(limits.max) - x(limits.min)}
        height={height - axis - 4}
        fill={`var(--sw-${side}-wash)`}
      />
      <path d={path(draft)} fill={colour} />
      {released ? (
        <path d={path(released)} fill="none" stroke="var(--sw-ink)" strokeWidth={1.6} strokeDasharray="4 3" />
      ) : null}
      <path d={`M0 ${height - axis}H${width}`} stroke="var(--sw-rule)" />
      <path d={`${jaw(limits.min, -1)}${jaw(limits.max, 1)}`} fill={colour} />
      <g className="font-num" fontSize={15} fontWeight={700} fill={colour} textAnchor="middle">
        <text x={x(limits.min)} y={height - 6}>
          {limits.min.toFixed(2)}
        </text>
        <text x={x(limits.max)} y={height - 6}>
          {limits.max.toFixed(2)}
        </text>
      </g>
      <text x={width / 2} y={height - 6} textAnchor="middle" fontSize={14} fill="var(--sw-ink-2)">
        {word}
        {beyond ? `, ${count(beyond)} beyond` : ''}
      </text>
    </svg>
  );
}

function beyondOf({ from, width: bin, counts }: Bins, low: number, high: number): number {
  return counts.reduce((sum, boards, i) => {
    const middle = from + (i + 0.5) * bin;
    return middle < low || middle > high ? sum + boards : sum;
  }, 0);
}
