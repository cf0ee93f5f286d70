import type { ScaleLinear } from 'd3-scale';
import type { HistogramBin } from '@/lib/contracts/lot-review';
import { normalDensity } from '@/lib/statistics/distributions/normal';

interface HistogramProps {
  bins: readonly HistogramBin[];
  y: ScaleLinear<number, number>;
  left: number;
  right: number;
  colour: string;
  /** Normal curve of the same mean and standard deviation; null draws none. */
  fitted: { count: number; mean: number; deviation: number } | null;
}

const curvePoints = 60;

/** Path of the normal curve on the scale of the bars, from the lowest to the highest value of the axis. */
export function fittedPath(
  { count, mean, deviation }: NonNullable<HistogramProps['fitted']>,
  width: number,
  [low, high]: readonly [number, number],
  at: (boards: number, value: number) => { x: number; y: number },
): string {
  return Array.from({ length: curvePoints + 1 }, (_, i) => {
    const value = low + ((high - low) * i) / curvePoints;
    const { x, y } = at((count * width * normalDensity((value - mean) / deviation)) / deviation, value);
    return `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`;
  }).join('');
}

/** Counts as bars on the chart's own axis, and the normal curve that would fit them. */
export function Histogram({ bins, y, left, right, colour, fitted }: HistogramProps) {
  const [low, high] = y.domain() as [number, number];
  const width = bins[0] ? bins[0].to - bins[0].from : 0;
  const peak = fitted && width > 0 ? (fitted.count * width * normalDensity(0)) / fitted.deviation : 0;
  const most = Math.max(1, peak, ...bins.map((bin) => bin.boards));
  const x = (boards: number) => left + (boards / most) * (right - left) * 0.94;
  const shown = bins.filter((bin) => bin.boards > 0 && bin.to > low && bin.from < high);
  return (
    <g>
      {shown.map((bin) => {
        const top = y(Math.min(bin.to, high));
        const height = Math.max(1, y(Math.max(bin.from, low)) - top - 1);
        return (
          <rect key={bin.from} x={left} y={top + 0.5} width={x(bin.boards) - left} height={height} fill={colour} />
        );
      })}
      <path d={`M${left} ${y(high)}V${y(low)}`} stroke="var(--sw-ink)" strokeWidth={2} />
      {fitted && width > 0 ? (
        <path
          d={fittedPath(fitted, width, [low, high], (boards, value) => ({ x: x(boards), y: y(value) }))}
          fill="none"
          stroke="var(--sw-ink)"
          strokeWidth={1.4}
        />
      ) : null}
    </g>
  );
}
