interface LotRuleProps {
  /** One character a board: `.` ahead, `P` pass, `W` pass on a later attempt, `R` reject, `N` no verdict, `C` current. */
  marks: string;
  width?: number;
  /** Read aloud, such as "183 of 240 boards tested, 5 rejected". */
  label: string;
  /** Number of the first board. */
  first?: number;
}

const base = 30;

/** A tick a board: ring on top for a second attempt, red square below for a reject, blue caret for now. */
export function LotRule({ marks, width = 1180, label, first = 1 }: LotRuleProps) {
  const count = Math.max(marks.length, 2);
  const pitch = (width - 2) / (count - 1);
  const every = [1, 2, 5, 10, 20, 40, 50, 100, 200, 500].find((n) => n * pitch > 150) ?? 1000;
  const x = (i: number) => 1 + i * pitch;
  return (
    <svg viewBox={`-9 -6 ${width + 18} 76`} className="block h-auto w-full" role="img" aria-label={label}>
      <path d={`M0 ${base}H${width}`} stroke="var(--sw-ink)" strokeWidth={2} />
      {[...marks].map((mark, i) => (
        <BoardTick key={i} mark={mark} x={x(i)} pitch={pitch} />
      ))}
      {Array.from({ length: Math.floor(marks.length / every) + 1 }, (_, k) => {
        const board = k === 0 ? 0 : k * every - 1;
        // Where every board is numbered, the first one is not numbered twice.
        if (every === 1 && k === 0) return null;
        const anchor = k === 0 ? 'start' : board >= marks.length - 1 ? 'end' : 'middle';
        return (
          <text
            key={k}
            x={x(board)}
            y={68}
            textAnchor={anchor}
            className="font-num"
            fontSize={22}
            fill="var(--sw-ink-3)"
          >
            {board + first}
          </text>
        );
      })}
    </svg>
  );
}

function BoardTick({ mark, x, pitch }: { mark: string; x: number; pitch: number }) {
  const thin = Math.min(2, pitch * 0.5);
  if (mark === 'P') return <path d={`M${x} ${base}v-18`} stroke="var(--sw-ink-2)" strokeWidth={thin} />;
  if (mark === 'W')
    return (
      <g stroke="var(--sw-ink)" strokeWidth={2}>
        <path d={`M${x} ${base}v-22`} />
        <circle cx={x} cy={base - 24} r={3.4} fill="var(--sw-paper)" />
      </g>
    );
  if (mark === 'R')
    return (
      <g>
        <path d={`M${x} ${base - 18}V${base + 12}`} stroke="var(--sw-reject)" strokeWidth={2} />
        <rect x={x - 4.5} y={base + 10} width={9} height={9} fill="var(--sw-reject)" />
      </g>
    );
  if (mark === 'N') return <path d={`M${x} ${base}v-6m0 -5v-7`} stroke="var(--sw-ink-2)" strokeWidth={2} />;
  if (mark === 'C')
    return (
      <g>
        <path d={`M${x} ${base}v-26`} stroke="var(--sw-accent)" strokeWidth={4} />
        <path d={`M${x - 8} ${base - 34}h16l-8 11z`} fill="var(--sw-accent)" />
      </g>
    );
  return <path d={`M${x} ${base}v-5`} stroke="var(--sw-rule)" strokeWidth={1} />;
}
