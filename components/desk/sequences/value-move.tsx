import { scaleLinear } from 'd3-scale';
import type { ValueChange } from '@/lib/sequence/compare-sequences';

const width = 132;
const base = 22;
const colours = { trip: 'var(--sw-trip)', release: 'var(--sw-release)', plain: 'var(--sw-ink)' } as const;

/** How far a number moved: a hollow jaw where it was, a solid one where it is, an arrow between. */
export function ValueMove({ change }: { change: ValueChange }) {
  const { numbers, label, from, to, tone } = change;
  if (!numbers) return null;
  const span = Math.abs(numbers.to - numbers.from);
  const [low, high] = [Math.min(numbers.from, numbers.to), Math.max(numbers.from, numbers.to)];
  const x = scaleLinear([low - 0.9 * span, high + 0.9 * span], [6, width - 6]);
  const colour = colours[tone ?? 'plain'];
  const [a, b] = [x(numbers.from), x(numbers.to)];
  const way = Math.sign(b - a);
  return (
    <span className="flex items-center gap-x-3">
      <svg
        viewBox={`0 0 ${width} 30`}
        width={width}
        height={30}
        role="img"
        aria-label={`${label}: ${from} is now ${to}`}
        className="flex-none"
      >
        <path d={`M0 ${base}H${width}`} stroke="var(--sw-rule)" />
        <path
          d={x
            .ticks(9)
            .map((v) => `M${x(v)} ${base}v4`)
            .join('')}
          stroke="var(--sw-rule)"
        />
        <path d={`M${a} ${base}V${base - 13}L${a + 6} ${base}Z`} fill="none" stroke={colour} strokeWidth={1.4} />
        <path d={`M${b} ${base}V${base - 13}L${b + 6} ${base}Z`} fill={colour} />
        <path d={`M${a} 5H${b}M${b - 4 * way} 2L${b} 5L${b - 4 * way} 8`} fill="none" stroke="var(--sw-ink)" />
      </svg>
      <span className="text-cap whitespace-nowrap">{numbers.difference}</span>
    </span>
  );
}
