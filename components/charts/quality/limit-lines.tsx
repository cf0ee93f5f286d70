import type { ScaleLinear } from 'd3-scale';
import type { ReviewLimits } from '@/lib/contracts/lot-review';

interface LimitLinesProps {
  y: ScaleLinear<number, number>;
  limits: ReviewLimits | null;
  colour: string;
  /** Stretches of the x-axis that the lines cross. */
  across: readonly (readonly [number, number])[];
  /** Where the jaws stand, after which their numbers follow. */
  jawX: number;
  text: (value: number) => string;
  /** Frozen centre of the chart; null without one. */
  centre: number | null;
  fineText: (value: number) => string;
  narrow: boolean;
}

/** The lighter ground between the limits as drawn in by the guard bands. */
export function LimitGround({ y, limits, across }: Pick<LimitLinesProps, 'y' | 'limits' | 'across'>) {
  const [low, high] = y.domain() as [number, number];
  const top = y(limits?.guardedMax ?? limits?.max ?? high);
  const bottom = y(limits?.guardedMin ?? limits?.min ?? low);
  return across.map(([from, to]) => (
    <rect key={from} x={from} y={top} width={to - from} height={Math.max(0, bottom - top)} fill="var(--sw-sheet)" />
  ));
}

/** Limits as gauge jaws with flat faces on the limit; guard bands dashed. */
export function LimitLines({ y, limits, colour, across, jawX, text, centre, fineText, narrow }: LimitLinesProps) {
  const { min = null, max = null, guardedMin = null, guardedMax = null } = limits ?? {};
  const lines = (value: number) => across.map(([from, to]) => `M${from} ${y(value)}H${to}`).join('');
  const solid = [min, max].filter((each) => each !== null);
  const dashed = [guardedMin !== min ? guardedMin : null, guardedMax !== max ? guardedMax : null].filter(
    (each) => each !== null,
  );
  return (
    <g>
      <path d={dashed.map(lines).join('')} stroke={colour} strokeDasharray="5 4" />
      <path d={solid.map(lines).join('')} stroke={colour} strokeWidth={2} />
      <g className="font-num" fontSize={14} fontWeight={700} fill={colour}>
        {max === null ? null : <Jaw x={jawX} y={y(max)} up text={text(max)} />}
        {min === null ? null : <Jaw x={jawX} y={y(min)} up={false} text={text(min)} />}
      </g>
      {narrow ? null : (
        <g fontSize={13} fill={colour}>
          {guardedMax !== null && max !== null && guardedMax < max ? (
            <text x={jawX + 6} y={Math.max(y(guardedMax) + 5, y(max) + 18)}>
              guard {fineText(guardedMax)}
            </text>
          ) : null}
          {guardedMin !== null && min !== null && guardedMin > min ? (
            <text x={jawX + 6} y={Math.min(y(guardedMin) + 4, y(min) - 10)}>
              guard {fineText(guardedMin)}
            </text>
          ) : null}
          {centre !== null && farFromGuards(y, limits, centre) ? (
            <text x={jawX + 6} y={y(centre) + 4} fill="var(--sw-ink-2)">
              centre {fineText(centre)}
            </text>
          ) : null}
        </g>
      )}
    </g>
  );
}

function Jaw({ x, y, up, text }: { x: number; y: number; up: boolean; text: string }) {
  return (
    <g>
      <path d={`M${x} ${y}h20v${up ? -10 : 10}z`} />
      <text x={x + 25} y={up ? y + 1 : y + 10}>
        {text}
      </text>
    </g>
  );
}

/** Whether a word beside the centre line is clear of those beside the limits. */
function farFromGuards(y: (value: number) => number, limits: ReviewLimits | null, centre: number): boolean {
  const taken = [
    limits?.max == null ? [] : [y(limits.max), y(limits.max) + 18],
    limits?.min == null ? [] : [y(limits.min) - 10, y(limits.min) + 8],
  ].flat();
  return taken.every((each) => Math.abs(each - y(centre)) > 15);
}
