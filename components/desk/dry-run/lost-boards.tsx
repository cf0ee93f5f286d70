import { count } from '../numbers';
import type { LostAtStep } from './lost-at';

/** Boards lost at a step, as squares: solid the draft, hollow the released revision. Stands in the step's row. */
export function LostBoards({ lost }: { lost: LostAtStep }) {
  const { draft, released, boardsASquare } = lost;
  return (
    <span className="grid gap-0.5">
      <Row boards={draft} each={boardsASquare} look="solid" />
      {released === null ? null : <Row boards={released} each={boardsASquare} look="hollow" />}
    </span>
  );
}

/** The difference at a step, draft less released, in words a table can hold; nothing where there is none. */
export function LostDifference({ lost: { draft, released } }: { lost: LostAtStep }) {
  if (released === null || draft === released) return null;
  const more = draft - released;
  return (
    <b className={`font-num ${more > 0 ? 'text-reject' : 'text-pass'}`}>
      {more > 0 ? '+' : '−'}
      {count(Math.abs(more))}
    </b>
  );
}

function Row({ boards, each, look }: { boards: number; each: number; look: 'solid' | 'hollow' }) {
  const squares = Math.ceil(boards / each);
  return (
    <span className="flex items-center gap-2">
      <span className={`w-9 flex-none text-right font-num ${look === 'solid' ? 'font-bold' : 'text-ink-2'}`}>
        <span className="sr-only">{look === 'solid' ? 'draft ' : 'released '}</span>
        {count(boards)}
      </span>
      <svg width={squares * 14} height={12} aria-hidden="true" className="flex-none">
        {Array.from({ length: squares }, (_, i) =>
          look === 'solid' ? (
            <rect key={i} x={i * 14} y={0} width={12} height={12} fill="var(--sw-reject)" />
          ) : (
            <rect
              key={i}
              x={i * 14 + 1}
              y={1}
              width={10}
              height={10}
              fill="none"
              stroke="var(--sw-ink-2)"
              strokeWidth={2}
            />
          ),
        )}
      </svg>
    </span>
  );
}
