import { Fragment } from 'react';
import type { LotPage } from '@/lib/contracts/lot-page';
import type { LotReview, QuotedIndex } from '@/lib/contracts/lot-review';
import { count, index, percent } from '../numbers';

interface YieldSentenceProps {
  summary: LotPage['summary'];
  /** Null: the figures are not there yet. */
  quoted: LotReview['quoted'] | null;
}

/** Counts first, then per cent, then the capability, with "not stable" beside it while a chosen rule is broken. */
export function YieldSentence({ summary, quoted }: YieldSentenceProps) {
  const { tested, passedFirst, passedLater, rejected, undecided, firstPassYield, finalYield } = summary;
  if (tested === 0) return <p className="text-lede leading-snug max-sm:text-lead">No board has a verdict yet.</p>;
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
    quoted ? <CapabilityWords {...quoted} /> : null,
  ].filter((part) => part !== null);
  return (
    <p className="max-w-[46ch] text-lede leading-snug max-sm:text-lead">
      {parts.map((part, i) => (
        <Fragment key={i}>
          {part}
          {i < parts.length - 1 || !quoted ? '. ' : ''}
        </Fragment>
      ))}
    </p>
  );
}

function CapabilityWords({ trip, release }: LotReview['quoted']) {
  const told = [trip && { word: 'trip', quoted: trip }, release && { word: 'release', quoted: release }].filter(
    (each) => each !== null,
  );
  return told.map(({ word, quoted }, i) => (
    <Fragment key={word}>
      {i > 0 ? ', and ' : ''}
      {i === 0 || told[0]!.quoted.method !== quoted.method
        ? i === 0
          ? `${nameOf(quoted)} is `
          : `${nameOf(quoted)} `
        : ''}
      <b>{index(quoted.index)}</b> for {word}
      {quoted.stable ? '' : ', not stable'}
      {i === told.length - 1 ? '.' : ''}
    </Fragment>
  ));
}

/** Percentiles give a long-term figure, so it is named as one. */
const nameOf = (quoted: QuotedIndex) => (quoted.method === 'normal' ? 'Cpk' : 'Ppk by percentiles');
