import { ProgressTicks } from '@/components/bench/progress-ticks';
import type { DryRunView } from '@/lib/contracts/dry-run';
import { count } from '../numbers';

/** How far a dry run has come and how long it still takes, in counts. */
export function RunProgress({ view }: { view: DryRunView }) {
  const { done, of, leftMs, state } = view;
  const passes = Math.max(1, Math.round(of / view.settings.boards));
  const boards = Math.min(view.settings.boards, Math.floor(done / passes));
  return (
    <div role="status" aria-live="off">
      <ProgressTicks done={done} of={of} />
      <p className="mt-1 text-[21px] leading-snug">
        {state === 'waiting' ? (
          'Waits for its turn.'
        ) : (
          <>
            <b className="font-num">{count(passes === 1 ? boards : done)}</b> of <b className="font-num">{count(of)}</b>{' '}
            {passes === 1 ? 'simulated boards' : 'tests of simulated boards'}
            {leftMs === null ? '.' : <>, about {leftWords(leftMs)} left.</>}
          </>
        )}
      </p>
      <p className="text-cap text-ink-2">
        {passes === 1
          ? 'It always runs to the end.'
          : `${count(view.settings.boards)} boards, ${passes} times each: ${passWords(passes)}. It always runs to the end.`}
      </p>
    </div>
  );
}

const passWords = (passes: number) =>
  passes === 2 ? 'the draft and the released revision' : 'the draft, the released revision and each change alone';

function leftWords(ms: number): string {
  const seconds = Math.max(1, Math.round(ms / 1000));
  return seconds < 90 ? `${seconds} s` : `${Math.round(seconds / 60)} minutes`;
}
