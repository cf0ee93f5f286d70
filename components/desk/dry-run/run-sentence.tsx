import type { DryRunResult, DryRunView } from '@/lib/contracts/dry-run';
import { percent } from '../numbers';

const bold = (value: string) => <b className="whitespace-nowrap font-num">{value}</b>;
const seconds = (value: number) => String(Math.round(value));

/** What the dry run says, in a sentence: yield beside the released revision, and the time of a board. */
export function RunSentence({ view, result }: { view: DryRunView; result: DryRunResult }) {
  const { draft, released, pair } = result;
  const { revisionNumber, releasedNumber } = view;
  const share = draft.firstPass.of > 0 ? draft.firstPass.count / draft.firstPass.of : null;
  const old = released && released.firstPass.of > 0 ? released.firstPass.count / released.firstPass.of : null;
  const faster = released ? Math.round(released.boardSeconds) - Math.round(draft.boardSeconds) : 0;
  const over = view.state === 'done';
  return (
    <p className="text-[21px] leading-snug">
      {over ? (
        <>
          {bold(percent(share))} would pass first time
          {old === null ? (
            ''
          ) : (
            <>
              , r{releasedNumber} gives {bold(percent(old))}
            </>
          )}
          . {pair && over ? <Chance pair={pair} /> : null}
        </>
      ) : (
        <>
          r{revisionNumber} passes {bold(percent(share))} first time so far.{' '}
        </>
      )}
      {draft.boardSeconds > 0 ? (
        <>
          One board takes {bold(seconds(draft.boardSeconds))} s with the operator
          {!released || faster === 0
            ? ''
            : `, ${Math.abs(faster)} s ${faster > 0 ? 'less' : 'more'} than r${releasedNumber}`}
          .
        </>
      ) : null}
    </p>
  );
}

/** Whether the difference may be chance, by its interval. */
function Chance({ pair: { difference } }: { pair: NonNullable<DryRunResult['pair']> }) {
  const points = Math.abs(difference.value * 100).toFixed(1);
  if (difference.low <= 0 && difference.high >= 0) return <>The difference of {bold(points)} points may be chance. </>;
  return (
    <>
      The {difference.value < 0 ? 'loss' : 'gain'} of {bold(points)} points is more than chance.{' '}
    </>
  );
}
