import { useTranslations } from 'next-intl';
import type { Direction } from '@/lib/trim/types';
import { dialShape, polar, type Sense } from './spiral';

interface TrimDialProps {
  direction: Direction;
  /** Exact turns still to make, positive. The end mark is exact; the words beside it are rounded. */
  turns: number;
  /** Fractions around the bezel. */
  labelled?: boolean;
}

const fractions = [
  ['0', 0],
  ['¼', 0.25],
  ['½', 0.5],
  ['¾', 0.75],
] as const;

/** A spiral that thickens to its arrowhead, the way and as far as the screw is to go. */
export function TrimDial({ direction, turns, labelled = true }: TrimDialProps) {
  const t = useTranslations('bench.dial');
  const sense: Sense = direction === 'clockwise' ? 1 : -1;
  const shape = dialShape(Math.max(turns, 0.01), sense, labelled);
  const rest = turns - Math.floor(turns + 1e-9);
  return (
    <svg
      viewBox="0 0 600 600"
      role="img"
      aria-label={t(`aria.${direction}`, { turns })}
      className="block h-full w-full"
    >
      <circle cx={300} cy={300} r={shape.bezel} fill="var(--sw-sheet)" stroke="var(--sw-ink)" strokeWidth={2.8} />
      <BezelTicks bezel={shape.bezel} sense={sense} />
      {labelled &&
        fractions.map(([text, at]) => {
          const here = at > 0 && Math.abs(at - rest) < 0.01;
          const { x, y } = polar(at, shape.bezel + 24, sense);
          return (
            <text
              key={text}
              x={x}
              y={y + 12}
              textAnchor="middle"
              fontSize={36}
              fontWeight={here ? 700 : 400}
              fill={here ? 'var(--sw-accent)' : 'var(--sw-ink-2)'}
            >
              {text}
            </text>
          );
        })}
      <path d={shape.arrow} fill="var(--sw-accent)" />
      <path d={shape.index} fill="var(--sw-accent)" />
      {shape.counters.map(({ turn, x, y, radius }) => (
        <g key={turn}>
          <circle
            cx={x}
            cy={y}
            r={radius}
            fill="var(--sw-sheet)"
            stroke="var(--sw-accent)"
            strokeWidth={radius > 20 ? 5 : 3.5}
          />
          <text
            x={x}
            y={y + radius * 0.5}
            textAnchor="middle"
            fontWeight={700}
            fontSize={radius * 1.45}
            fill="var(--sw-accent)"
          >
            {turn}
          </text>
        </g>
      ))}
      <Screw radius={shape.screw} endDegrees={shape.endSlotDegrees} />
    </svg>
  );
}

function BezelTicks({ bezel, sense }: { bezel: number; sense: Sense }) {
  return Array.from({ length: 48 }, (_, i) => {
    const rank = i % 12 === 0 ? 2 : i % 6 === 0 ? 1 : 0;
    const outer = polar(i / 48, bezel, sense);
    const inner = polar(i / 48, bezel - [9, 15, 24][rank]!, sense);
    return (
      <path
        key={i}
        d={`M${outer.x} ${outer.y}L${inner.x} ${inner.y}`}
        stroke={rank ? 'var(--sw-ink)' : 'var(--sw-rule)'}
        strokeWidth={[1.5, 2, 4][rank]}
      />
    );
  });
}

function Screw({ radius, endDegrees }: { radius: number; endDegrees: number | null }) {
  return (
    <g>
      <circle cx={300} cy={300} r={radius} fill="var(--sw-well)" stroke="var(--sw-ink)" strokeWidth={3} />
      <circle cx={300} cy={300} r={radius - 9} fill="none" stroke="var(--sw-rule)" strokeWidth={1.2} />
      {endDegrees !== null && (
        <rect
          x={290}
          y={300 - radius + 14}
          width={20}
          height={2 * radius - 28}
          fill="none"
          stroke="var(--sw-accent)"
          strokeDasharray="6 5"
          strokeWidth={2.5}
          transform={`rotate(${endDegrees} 300 300)`}
        />
      )}
      <rect x={289} y={300 - radius + 10} width={22} height={2 * radius - 20} fill="var(--sw-ink)" />
    </g>
  );
}
