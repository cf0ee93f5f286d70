import { scaleLinear } from 'd3-scale';
import { line } from 'd3-shape';
import type { Band, TraceStretch } from '@/lib/contracts/unit-page';
import { joinTraces, recordedPoints, type RecordedPoint } from './trace-points';

interface TraceChartProps {
  traces: readonly TraceStretch[];
  limits: { tripVolts: Band; releaseVolts: Band } | null;
  /** Trip and release as recorded, drawn where they were last crossed. */
  tripVolts: number | null;
  releaseVolts: number | null;
  /** Read aloud. */
  label: string;
  /** So that several charts of one board can be compared. */
  mostSeconds?: number;
}

const width = 440;
const height = 320;
const margin = { top: 10, right: 14, bottom: 28, left: 38 };

/** Supply at the board over time: limits as bands, hollow marks where the output changed, solid ones at the recorded points. */
export function TraceChart({ traces, limits, tripVolts, releaseVolts, label, mostSeconds }: TraceChartProps) {
  const readings = joinTraces(traces);
  const last = readings.at(-1)?.seconds ?? 1;
  const highest = Math.max(...readings.map((r) => r.volts), limits?.releaseVolts.max ?? 0);
  const shownLow = limits ? limits.tripVolts.min - (limits.releaseVolts.max - limits.tripVolts.min) * 0.9 : 0;
  const x = scaleLinear([0, Math.max(mostSeconds ?? 0, last)], [margin.left, width - margin.right]).nice(5);
  const y = scaleLinear([Math.max(0, shownLow), highest], [height - margin.bottom, margin.top])
    .nice(5)
    .clamp(true);
  const path = line<{ seconds: number; volts: number }>(
    (r) => x(r.seconds),
    (r) => y(r.volts),
  )(readings);
  const marks = recordedPoints(readings, tripVolts, releaseVolts);
  return (
    <svg viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label} className="block h-auto w-full">
      {limits
        ? (['trip', 'release'] as const).map((side) => {
            const { min, max } = side === 'trip' ? limits.tripVolts : limits.releaseVolts;
            return (
              <g key={side}>
                <rect
                  x={margin.left}
                  width={width - margin.left - margin.right}
                  y={y(max)}
                  height={y(min) - y(max)}
                  fill={`var(--sw-${side}-wash)`}
                />
                <path
                  d={`M${margin.left} ${y(max)}H${width - margin.right}M${margin.left} ${y(min)}H${width - margin.right}`}
                  stroke={`var(--sw-${side})`}
                />
              </g>
            );
          })
        : null}
      <VoltAxis ticks={y.ticks(6)} y={y} />
      <TimeAxis ticks={x.ticks(width > 400 ? 10 : 5)} labelled={x.ticks(4)} x={x} />
      <path d={path ?? ''} fill="none" stroke="var(--sw-ink)" strokeWidth={1.6} strokeLinejoin="round" />
      {marks.map((mark, i) => (
        <PointTriangle key={i} mark={mark} x={x(mark.seconds)} y={y(mark.volts)} />
      ))}
    </svg>
  );
}

function VoltAxis({ ticks, y }: { ticks: number[]; y: (volts: number) => number }) {
  return (
    <g className="font-num" fontSize={14} fill="var(--sw-ink-2)" textAnchor="end">
      {ticks.map((tick) => (
        <g key={tick}>
          <path d={`M${margin.left - 8} ${y(tick)}h8`} stroke="var(--sw-ink-2)" />
          {Number.isInteger(tick) ? (
            <text x={margin.left - 12} y={y(tick) + 5}>
              {tick}
            </text>
          ) : null}
        </g>
      ))}
    </g>
  );
}

function TimeAxis({ ticks, labelled, x }: { ticks: number[]; labelled: number[]; x: (seconds: number) => number }) {
  const base = height - margin.bottom + 6;
  return (
    <g className="font-num" fontSize={14} fill="var(--sw-ink-2)" textAnchor="middle">
      {ticks.map((tick) => (
        <path key={tick} d={`M${x(tick)} ${base}v${labelled.includes(tick) ? 7 : 4}`} stroke="var(--sw-rule)" />
      ))}
      {labelled.map((tick, i) => (
        <text key={tick} x={x(tick)} y={height - 1} textAnchor={i === labelled.length - 1 ? 'end' : 'middle'}>
          {i === labelled.length - 1 ? `${tick} s` : tick}
        </text>
      ))}
    </g>
  );
}

/** ▼ where the output went off, ▲ where it came on. */
function PointTriangle({ mark, x, y }: { mark: RecordedPoint; x: number; y: number }) {
  const side = mark.recorded ? 7 : 4;
  const colour = `var(--sw-${mark.side})`;
  const d =
    mark.side === 'trip'
      ? `M${x - side} ${y - side}h${2 * side}l${-side} ${1.7 * side}z`
      : `M${x - side} ${y + side}h${2 * side}l${-side} ${-1.7 * side}z`;
  return (
    <path
      d={d}
      fill={mark.recorded ? colour : 'var(--sw-paper)'}
      stroke={colour}
      strokeWidth={mark.recorded ? 0 : 1.3}
    />
  );
}
