import type { ReasonCount } from '@/lib/statistics/lot-summary';
import { EmptyState } from '@/components/ui/empty-state';
import { rejectWords } from '../words';

const size = 21;
const gap = 3.5;
/** Above 40 boards a row, one square stands for five. */
const mostSquares = 40;

type Decision = 'undecided' | 'rework' | 'scrap' | 'other';
const order: Decision[] = ['rework', 'scrap', 'other', 'undecided'];
const decisionWords: Record<Decision, string> = {
  undecided: 'undecided',
  rework: 'rework',
  scrap: 'scrap',
  other: 'used or returned',
};

/** One square a rejected board: solid undecided, hollow rework, crossed scrap. */
export function RejectPareto({ reasons }: { reasons: readonly ReasonCount[] }) {
  const total = reasons.reduce((sum, reason) => sum + reason.boards, 0);
  if (total === 0) return <EmptyState title="No board is rejected.">A reject appears here with its reason.</EmptyState>;
  const cumulative = reasons.map((_, i) => reasons.slice(0, i + 1).reduce((sum, reason) => sum + reason.boards, 0));
  const each = Math.max(...reasons.map((reason) => reason.boards)) > mostSquares ? 5 : 1;
  const used = order.filter((decision) => reasons.some((reason) => reason.decisions[decision] > 0));
  return (
    <div>
      <p className="mb-1 flex justify-between text-cap text-ink-2">
        <span>{each > 1 ? `one square is ${each} boards` : ''}</span>
        <span>cumulative</span>
      </p>
      <ul>
        {reasons.map(({ reason, boards, decisions }, i) => (
          <li key={reason} className="flex min-h-9 items-center gap-3">
            <span className="w-[190px] flex-none max-sm:w-[130px]">{rejectWords[reason]}</span>
            <b className="w-7 flex-none text-right font-num">{boards}</b>
            <span className="flex min-w-0 flex-1 flex-wrap gap-[3px] border-l-2 border-ink py-1 pl-1.5">
              {order.flatMap((decision) =>
                Array.from({ length: Math.ceil(decisions[decision] / each) }, (_, k) => (
                  <DecisionSquare key={`${decision}${k}`} decision={decision} />
                )),
              )}
            </span>
            <span className="flex-none font-num text-ink-2">{Math.round((cumulative[i]! / total) * 100)} %</span>
          </li>
        ))}
      </ul>
      <p className="mt-2 flex flex-wrap gap-5 text-cap text-ink-2">
        {used.map((decision) => (
          <span key={decision} className="inline-flex items-center gap-1.5">
            <DecisionSquare decision={decision} scale={0.6} /> {decisionWords[decision]}
          </span>
        ))}
      </p>
    </div>
  );
}

export function DecisionSquare({ decision, scale = 1 }: { decision: Decision; scale?: number }) {
  const side = size * scale;
  const inner = size - gap;
  return (
    <svg viewBox={`0 0 ${size} ${size}`} width={side} height={side} aria-hidden="true" className="block flex-none">
      {decision === 'undecided' ? (
        <rect width={size} height={size} fill="var(--sw-reject)" />
      ) : (
        <g fill="none" stroke="var(--sw-ink-2)" strokeWidth={gap}>
          <rect x={gap / 2} y={gap / 2} width={inner} height={inner} />
          {decision === 'scrap' ? (
            <path d={`M2 2L${size - 2} ${size - 2}M${size - 2} 2L2 ${size - 2}`} strokeWidth={2.5} />
          ) : null}
          {decision === 'other' ? <path d={`M5 ${size / 2}H${size - 5}`} strokeWidth={2.5} /> : null}
        </g>
      )}
    </svg>
  );
}
