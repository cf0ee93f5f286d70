import { scaleLinear } from 'd3-scale';
import { height, type PointLimits } from './predicted-supply-scale';

type Scale = (value: number) => number;

interface LimitsProps {
  limits: PointLimits;
  y: Scale;
  left: number;
  right: number;
}
const points = ['release', 'trip'] as const;

export function LimitBands({ limits, y, left, right }: LimitsProps) {
  return points.map((point) => {
    const { min, max } = limits[`${point}Volts`];
    return (
      <g key={point}>
        <rect x={left} width={right - left} y={y(max)} height={y(min) - y(max)} fill={`var(--sw-${point}-wash)`} />
        <path d={`M${left} ${y(max)}H${right}M${left} ${y(min)}H${right}`} stroke={`var(--sw-${point})`} />
      </g>
    );
  });
}

/** Over the trace, on a ground of their own. */
export function LimitNames({ limits, y, left, right }: LimitsProps) {
  return points.map((point) => {
    const { min, max } = limits[`${point}Volts`];
    const isTrip = point === 'trip';
    const x = left + (right - left) * (isTrip ? 0.2 : 0.4);
    const textY = isTrip ? y(min) + 16 : y(max) - 7;
    return (
      <g key={point} fill={`var(--sw-${point})`} stroke="var(--sw-paper)" strokeWidth={5} paintOrder="stroke">
        <path d={`M${x - 14} ${textY + (isTrip ? -9 : 0)}h10l-5 ${isTrip ? 9 : -9}z`} />
        <text x={x} y={textY} fontSize={13}>
          {point} limits
        </text>
      </g>
    );
  });
}

interface VoltsAxisProps {
  ticks: number[];
  y: Scale;
  breakVolts: number;
  bottom: number;
  left: number;
}

export function VoltsAxis({ ticks, y, breakVolts, bottom, left }: VoltsAxisProps) {
  const labelled = ticks.filter((tick) => breakVolts === 0 || y(tick) < bottom - 14);
  const breakY = bottom - 11;
  return (
    <g className="font-num" fontSize={13} fill="var(--sw-ink-2)" textAnchor="end">
      {labelled.map((tick) => (
        <g key={tick}>
          <path d={`M${left - 8} ${y(tick)}h8`} stroke="var(--sw-ink-2)" />
          {Number.isInteger(tick) ? (
            <text x={left - 12} y={y(tick) + 4.5}>
              {tick}
            </text>
          ) : null}
        </g>
      ))}
      <path d={`M${left - 8} ${bottom}h8`} stroke="var(--sw-ink-2)" />
      <text x={left - 12} y={bottom + 4.5}>
        0
      </text>
      {breakVolts > 0 ? (
        <path d={`M${left - 8} ${breakY + 1}l8 -5M${left - 8} ${breakY + 6}l8 -5`} stroke="var(--sw-ink-2)" />
      ) : null}
    </g>
  );
}

interface Stretch {
  stepId: string;
  fromMs: number;
  toMs: number;
  optionId: string;
  number: number;
  name: string;
}

interface StepNumbersProps {
  stretches: readonly Stretch[];
  selectedId: string | null;
  x: Scale;
  bottom: number;
  role: 'option' | 'listitem';
  onSelect: ((stepId: string) => void) | undefined;
}

/** A number needs so much room, in pixels. */
const numberWidth = 14;

/** Step numbers over their stretches; a stretch is clicked anywhere down to the axis. */
export function StepNumbers({ stretches, selectedId, x, bottom, role, onSelect }: StepNumbersProps) {
  return stretches.map(({ stepId, fromMs, toMs, optionId, number, name }) => {
    const [from, to] = [x(fromMs), x(toMs)];
    const selected = stepId === selectedId;
    const seconds = ((toMs - fromMs) / 1000).toFixed(1);
    const isOption = role === 'option';
    return (
      <g
        key={optionId}
        id={optionId}
        role={role}
        aria-selected={isOption ? selected : undefined}
        aria-label={`Step ${number}, ${name}, ${seconds} seconds`}
        onClick={onSelect ? () => onSelect(stepId) : undefined}
        className={onSelect ? 'cursor-pointer' : undefined}
      >
        <rect x={from} width={Math.max(1, to - from)} y={2} height={bottom - 2} fill="transparent" />
        <path d={`M${from} 4V${bottom}`} stroke="var(--sw-rule)" pointerEvents="none" />
        {selected ? (
          <>
            <rect x={from} width={Math.max(2, to - from)} y={2} height={19} fill="var(--sw-accent-wash)" />
            <path d={`M${from} 21H${Math.max(from + 2, to)}`} stroke="var(--sw-accent)" strokeWidth={2} />
          </>
        ) : null}
        {selected || to - from >= numberWidth ? (
          <text
            x={(from + to) / 2}
            y={16}
            fontSize={13}
            fontWeight={700}
            textAnchor="middle"
            fill={selected ? 'var(--sw-accent)' : 'var(--sw-ink-2)'}
          >
            {number}
          </text>
        ) : null}
      </g>
    );
  });
}

interface LoadBarProps {
  stretches: readonly { fromMs: number; toMs: number }[];
  x: Scale;
  left: number;
  right: number;
  top: number;
}

/** Filled while the load is on. */
export function LoadBar({ stretches, x, left, right, top }: LoadBarProps) {
  return (
    <g>
      <text x={left - 12} y={top + 9} fontSize={13} fill="var(--sw-ink-2)" textAnchor="end">
        load
      </text>
      <rect x={left} y={top} width={right - left} height={9} fill="none" stroke="var(--sw-ink-2)" />
      {stretches.map(({ fromMs, toMs }, i) => (
        <rect
          key={i}
          x={x(fromMs)}
          y={top}
          width={Math.max(0.5, x(toMs) - x(fromMs))}
          height={9}
          fill="var(--sw-ink-2)"
        />
      ))}
    </g>
  );
}

export function SecondsAxis({ x, lastMs, width }: { x: Scale; lastMs: number; width: number }) {
  const scale = scaleLinear([0, lastMs / 1000], [0, 1]);
  const labelled = scale.ticks(width > 500 ? 5 : 3);
  const base = height - 32;
  return (
    <g className="font-num" fontSize={13} fill="var(--sw-ink-2)" textAnchor="middle">
      {scale.ticks(width > 500 ? 20 : 9).map((tick) => (
        <path key={tick} d={`M${x(tick * 1000)} ${base}v${labelled.includes(tick) ? 8 : 4}`} stroke="var(--sw-ink-2)" />
      ))}
      {labelled.map((tick, i) => (
        <text key={tick} x={x(tick * 1000)} y={height - 8}>
          {i === labelled.length - 1 ? `${tick} s` : tick}
        </text>
      ))}
    </g>
  );
}
