import { Fragment } from 'react';
import type { LotPage } from '@/lib/contracts/lot-page';
import { count, percent } from '../numbers';
import { Time } from '../time';
import { LotStateMark } from './lot-state';

/** Name, board type and sequence, where and when; one line. */
export function LotLine({ lot }: { lot: LotPage }) {
  const tested = lot.summary.tested;
  return (
    <span>
      <LotStateMark state={lot.state} held={false} />. Board <span className="font-num">{lot.boardTypeCode}</span>,
      sequence r{lot.sequenceNumber}
      {lot.stationCodes.length > 0
        ? `, ${lot.stationCodes.length === 1 ? 'station' : 'stations'} ${lot.stationCodes.join(', ')}`
        : ''}
      {lot.firstTestIso && lot.lastTestIso ? (
        <>
          , <Time iso={lot.firstTestIso} /> to <Time iso={lot.lastTestIso} />
        </>
      ) : null}
      .{' '}
      {tested === lot.summary.size
        ? `All ${count(tested)} boards tested.`
        : `${count(tested)} of ${count(lot.summary.size)} boards tested.`}
    </span>
  );
}

/** Counts first, then per cent. */
export function YieldSentence({ summary }: { summary: LotPage['summary'] }) {
  const { tested, passedFirst, passedLater, rejected, undecided, firstPassYield, finalYield } = summary;
  if (tested === 0) return <p className="text-lede leading-snug">No board has a verdict yet.</p>;
  const parts = [
    <>
      <b>{count(passedFirst)}</b> of <b>{count(tested)}</b> boards passed first time, <b>{percent(firstPassYield)}</b>
    </>,
    passedLater > 0 ? (
      <>
        <b>{count(passedLater)}</b> more passed on a later attempt, <b>{percent(finalYield)}</b> in the end
      </>
    ) : null,
    rejected > 0 ? (
      <>
        <b className="text-reject">{count(rejected)}</b> {rejected === 1 ? 'is' : 'are'} rejected
        {undecided > 0 ? (
          <>
            , <b>{count(undecided)}</b> still {undecided === 1 ? 'needs' : 'need'} a decision
          </>
        ) : null}
      </>
    ) : undecided > 0 ? (
      <>
        <b>{count(undecided)}</b> {undecided === 1 ? 'waits' : 'wait'} for quality
      </>
    ) : (
      'No board is rejected'
    ),
  ].filter((part) => part !== null);
  return (
    <p className="max-w-[46ch] text-lede leading-snug max-sm:text-lead">
      {parts.map((part, i) => (
        <Fragment key={i}>{part}. </Fragment>
      ))}
    </p>
  );
}
