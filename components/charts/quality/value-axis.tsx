import type { ScaleLinear } from 'd3-scale';

interface ValueAxisProps {
  y: ScaleLinear<number, number>;
  /** Where the ticks end. */
  x: number;
  ticks: number;
  text: (value: number) => string;
}

/** Printed scale at the left: a long tick with a number, four short ones between. */
export function ValueAxis({ y, x, ticks, text }: ValueAxisProps) {
  const [low, high] = y.domain() as [number, number];
  const major = y.ticks(ticks).filter((tick) => tick >= low && tick <= high);
  const step = major.length > 1 ? (major[1]! - major[0]!) / 5 : 0;
  const first = step > 0 ? Math.ceil(low / step - 1e-9) : 0;
  const minor =
    step > 0 ? Array.from({ length: Math.floor(high / step + 1e-9) - first + 1 }, (_, i) => (first + i) * step) : [];
  return (
    <g className="font-num" fontSize={14} fill="var(--sw-ink-2)" textAnchor="end">
      <path d={minor.map((tick) => `M${x - 7} ${y(tick).toFixed(1)}h7`).join('')} stroke="var(--sw-rule)" />
      <path d={major.map((tick) => `M${x - 12} ${y(tick).toFixed(1)}h12`).join('')} stroke="var(--sw-ink-2)" />
      {major.map((tick) => (
        <text key={tick} x={x - 16} y={y(tick) + 5}>
          {text(tick)}
        </text>
      ))}
    </g>
  );
}
