import { scaleLinear } from 'd3-scale';

export interface CheckPoint {
  atIso: string;
  volts: number;
  passed: boolean;
}

interface DailyCheckChartProps {
  /** Oldest first. */
  points: readonly CheckPoint[];
  knownVolts: number;
  toleranceVolts: number;
  side: 'trip' | 'release';
  label: string;
}

const width = 640;
const height = 180;
const left = 62;
const right = 90;

/** Daily checks of one point against the written value and its limits; a check outside them is an amber triangle. */
export function DailyCheckChart({ points, knownVolts, toleranceVolts, side, label }: DailyCheckChartProps) {
  const low = knownVolts - toleranceVolts;
  const high = knownVolts + toleranceVolts;
  const spread = points.map((point) => point.volts);
  const y = scaleLinear(
    [Math.min(low, ...spread) - toleranceVolts * 0.2, Math.max(high, ...spread) + toleranceVolts * 0.2],
    [height - 12, 12],
  );
  const x = scaleLinear([0, Math.max(points.length - 1, 1)], [left + 12, width - right - 12]);
  const path = points.map((point, i) => `${i === 0 ? 'M' : 'L'}${x(i)} ${y(point.volts)}`).join('');
  const colour = `var(--sw-${side})`;
  return (
    <svg viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label} className="block h-auto w-full max-w-[820px]">
      <rect x={left} y={y(high)} width={width - left - right} height={y(low) - y(high)} fill="var(--sw-sheet)" />
      <path
        d={`M${left} ${y(high)}H${width - right}M${left} ${y(low)}H${width - right}`}
        stroke={colour}
        strokeWidth={2}
      />
      <path d={`M${left} ${y(knownVolts)}H${width - right}`} stroke="var(--sw-ink-2)" />
      <g className="font-num" fontSize={14} fontWeight={700} fill={colour}>
        <path d={`M${width - right} ${y(high)}h14v-8zM${width - right} ${y(low)}h14v8z`} />
        <text x={width - right + 19} y={y(high) + 4}>
          {high.toFixed(3)}
        </text>
        <text x={width - right + 19} y={y(low) + 5}>
          {low.toFixed(3)}
        </text>
      </g>
      <text x={width - right + 6} y={y(knownVolts) + 5} fontSize={13} fill="var(--sw-ink-2)">
        written {knownVolts.toFixed(3)}
      </text>
      <g className="font-num" fontSize={13} fill="var(--sw-ink-2)" textAnchor="end">
        {y.ticks(5).map((tick) => (
          <g key={tick}>
            <path d={`M${left - 8} ${y(tick)}h8`} stroke="var(--sw-rule)" />
            <text x={left - 12} y={y(tick) + 4}>
              {tick.toFixed(2)}
            </text>
          </g>
        ))}
      </g>
      <path d={path} fill="none" stroke="var(--sw-rule)" />
      {points.map((point, i) =>
        point.passed ? (
          <circle key={point.atIso} cx={x(i)} cy={y(point.volts)} r={3} fill="var(--sw-ink)" />
        ) : (
          <path
            key={point.atIso}
            d={`M${x(i)} ${y(point.volts) - 8}l8 14h-16z`}
            fill="var(--sw-attn)"
            stroke="var(--sw-on-attn)"
            strokeWidth={1.5}
          />
        ),
      )}
    </svg>
  );
}
