import type { RailsView } from '@/lib/contracts/bench-view';
import { useNumbers } from '../use-numbers';
import { heightOf, railsBox, scaleTicks, tubeEdge } from '@/lib/rails/rails-geometry';

const lengths = { minor: 15, middle: 23, major: 36 } as const;

export type RailSide = 'trip' | 'release';

interface RailsScaleProps {
  rails: RailsView;
  side: RailSide;
  /** The target between the jaws takes the place of the limits' numbers. */
  showsTarget: boolean;
  targetLabel: string;
}

/** What is printed outside a tube: ticks, numerals, jaws on the limits, dashes at the guard. */
export function RailsScale({ rails, side, showsTarget, targetLabel }: RailsScaleProps) {
  const { volts } = useNumbers();
  const out = side === 'trip' ? -1 : 1;
  const base = (side === 'trip' ? railsBox.tripX : railsBox.releaseX) + out * (tubeEdge + 5);
  const limits = side === 'trip' ? rails.tripLimits : rails.releaseLimits;
  const colour = `var(--sw-${side})`;
  const anchor = side === 'trip' ? 'end' : 'start';
  const jawEnd = base + out * railsBox.jawLength;
  const textX = jawEnd + out * 8;
  const top = limits ? heightOf(rails, limits.max) : 0;
  const bottom = limits ? heightOf(rails, limits.min) : 0;
  const target = showsTarget && rails.targetVolts !== null ? rails.targetVolts : null;
  const taken = !limits ? [] : target === null ? [top - 12, bottom + 14] : [heightOf(rails, target), bottom];
  const guard = rails.guardVolts;
  const guards = guard ? (side === 'trip' ? [guard.tripMin, guard.tripMax] : [guard.releaseMin, guard.releaseMax]) : [];
  return (
    <g>
      {limits && (
        <rect
          x={Math.min(base, jawEnd)}
          y={top}
          width={railsBox.jawLength}
          height={bottom - top}
          fill={`var(--sw-${side}-wash)`}
        />
      )}
      {scaleTicks(rails.scaleMinVolts, rails.scaleMaxVolts).map(({ volts: at, rank }) => {
        const y = heightOf(rails, at);
        return (
          <g key={at}>
            <path
              d={`M${base} ${y}h${out * lengths[rank]}`}
              stroke={rank === 'minor' ? 'var(--sw-rule)' : 'var(--sw-ink-2)'}
              strokeWidth={rank === 'major' ? 2.5 : 1.6}
            />
            {rank === 'major' && !taken.some((other) => Math.abs(other - y) < 31) && (
              <text x={textX} y={y + 10} textAnchor={anchor} className="font-num" fontSize={29} fill="var(--sw-ink-2)">
                {Number(at.toFixed(2))}
              </text>
            )}
          </g>
        );
      })}
      {limits && (
        <>
          <path
            d={`M${base - out * 3} ${top}H${jawEnd}v${-railsBox.jawHeight}ZM${base - out * 3} ${bottom}H${jawEnd}v${railsBox.jawHeight}Z`}
            fill={colour}
          />
          {guards.map((at) => (
            <path
              key={at}
              d={`M${base} ${heightOf(rails, at)}h${out * railsBox.jawLength}`}
              stroke={colour}
              strokeWidth={1.8}
              strokeDasharray="5 4"
            />
          ))}
          {target === null && (
            <g className="font-num" fontWeight={700} fontSize={31} fill={colour} textAnchor={anchor}>
              <text x={textX} y={top - 2}>
                {volts(limits.max)}
              </text>
              <text x={textX} y={bottom + 23}>
                {volts(limits.min)}
              </text>
            </g>
          )}
        </>
      )}
      {target !== null && side === 'trip' && (
        <g fill={colour} textAnchor="end">
          <path d={`M${base} ${heightOf(rails, target)}H${jawEnd}`} stroke={colour} strokeWidth={3} />
          <text x={textX} y={heightOf(rails, target) + 10} className="font-num" fontWeight={700} fontSize={31}>
            {volts(target)}
          </text>
          <text x={textX} y={heightOf(rails, target) + 40} fontSize={25}>
            {targetLabel}
          </text>
        </g>
      )}
    </g>
  );
}
