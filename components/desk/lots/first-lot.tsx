import type { ReactNode } from 'react';
import { ButtonLink } from '@/components/ui/button';
import { VerdictMark } from '@/components/ui/verdict-mark';

interface FirstLotProps {
  steps: {
    boardType: string | null;
    sequence: { boardTypeCode: string; sequenceNumber: number } | null;
    station: string | null;
  };
  mayManage: boolean;
}

/** Before the first lot: what it needs, what is done, and the next move. */
export function FirstLot({ steps, mayManage }: FirstLotProps) {
  const { boardType, sequence, station } = steps;
  const ready = boardType !== null && sequence !== null && station !== null;
  return (
    <section className="max-w-[950px] border-y border-dashed border-rule py-9">
      <p className="text-lede leading-snug">
        No lot has been opened yet.
        <br />A lot needs a board type, a released sequence and a station that may test.
      </p>
      <ol className="mt-6">
        <Step number={1} title="Board type" done={boardType !== null}>
          {boardType
            ? `${boardType} is described, its limits approved.`
            : 'An engineer describes it; quality approves its limits.'}
        </Step>
        <Step number={2} title="Sequence" done={sequence !== null}>
          {sequence
            ? `${sequence.boardTypeCode} r${sequence.sequenceNumber} is released.`
            : 'An engineer makes it. A second person must release it.'}
        </Step>
        <Step number={3} title="Station" done={station !== null}>
          {station
            ? `Station ${station} is commissioned.`
            : 'An engineer commissions it at the bench: settling, overshoot and noise.'}
        </Step>
        <Step
          number={4}
          title="First lot"
          done={false}
          action={
            ready && mayManage ? (
              <ButtonLink kind="filled" href="/lots/new">
                Make the first lot
              </ButtonLink>
            ) : null
          }
        >
          {ready
            ? mayManage
              ? 'Lot number, quantity, first serial.'
              : 'Lot number, quantity, first serial. A quality manager makes it.'
            : 'Lot number, quantity, first serial. Opens when 1 to 3 are done.'}
        </Step>
      </ol>
    </section>
  );
}

interface StepProps {
  number: number;
  title: string;
  done: boolean;
  children: ReactNode;
  action?: ReactNode;
}

function Step({ number, title, done, children, action }: StepProps) {
  return (
    <li className="flex items-center gap-5 border-t border-hair py-4">
      <span className={`w-7 text-lead font-bold ${done ? 'text-ink-3' : ''}`}>{number}</span>
      <span className="flex-1">
        <b className="block text-[17px]">{title}</b>
        <span className="text-ink-2">{children}</span>
      </span>
      {action ??
        (done ? (
          <span className="inline-flex items-center gap-2 font-bold">
            <VerdictMark shape="pass" size={18} />
            done
          </span>
        ) : (
          <span className="text-ink-2">not yet</span>
        ))}
    </li>
  );
}
