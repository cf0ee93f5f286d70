interface LotRuleAxisProps {
  /** One character a board in test order; boards ahead are missing. */
  marks: string;
  from: number;
  to: number;
  x: (place: number) => number;
  /** Left and right end of the rule. */
  left: number;
  right: number;
  /** Where the rule's line lies. */
  y: number;
}

const tick = 12;
const ring = 17;
const foot = 7;

/** The lot rule as the chart's x-axis: a tick a board, ring on top for a later pass, red square below for a reject. */
export function LotRuleAxis({ marks, from, to, x, left, right, y }: LotRuleAxisProps) {
  const pitch = x(1) - x(0);
  const places = (mark: string) =>
    [...marks].flatMap((each, place) => (each === mark && place >= from && place < to ? [x(place)] : []));
  const ahead = Array.from({ length: Math.max(0, to - Math.max(from, marks.length)) }, (_, i) =>
    x(Math.max(from, marks.length) + i),
  );
  const strokes = (xs: readonly number[], up: number, down = 0) =>
    xs.map((at) => `M${at.toFixed(1)} ${y + down}v${-up - down}`).join('');
  const every = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000].find((n) => n * pitch > 58) ?? 2000;
  const numbers = Array.from({ length: to - from }, (_, i) => from + i + 1).filter(
    (n) => n === from + 1 || n % every === 0,
  );
  return (
    <g fill="none">
      <path d={`M${left} ${y}H${right}`} stroke="var(--sw-ink)" strokeWidth={2} />
      <path d={strokes(ahead, 4)} stroke="var(--sw-rule)" strokeWidth={Math.min(1, pitch * 0.5)} />
      <path d={strokes(places('P'), tick)} stroke="var(--sw-ink-2)" strokeWidth={Math.min(2, pitch * 0.5)} />
      <path d={strokes(places('W'), ring)} stroke="var(--sw-ink)" strokeWidth={Math.min(2, Math.max(1, pitch * 0.5))} />
      {places('W').map((at) => (
        <circle
          key={at}
          cx={at}
          cy={y - ring}
          r={3.2}
          fill="var(--sw-paper)"
          stroke="var(--sw-ink)"
          strokeWidth={1.8}
        />
      ))}
      <path
        d={strokes(places('R'), tick, foot)}
        stroke="var(--sw-reject)"
        strokeWidth={Math.min(2, Math.max(1, pitch * 0.5))}
      />
      <path
        d={places('R')
          .map((at) => `M${(at - 4).toFixed(1)} ${y + foot}h8v8h-8z`)
          .join('')}
        fill="var(--sw-reject)"
      />
      <g className="font-num" fontSize={14} fill="var(--sw-ink-3)">
        {numbers.map((n) =>
          n !== from + 1 && x(n - 1) - x(from) < 40 ? null : (
            <text key={n} x={x(n - 1)} y={y + 30} textAnchor={n === from + 1 ? 'start' : n === to ? 'end' : 'middle'}>
              {n}
            </text>
          ),
        )}
      </g>
    </g>
  );
}
