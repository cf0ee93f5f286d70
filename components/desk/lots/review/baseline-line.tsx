import { count } from '../../numbers';
import { Time } from '../../time';
import type { LotReview } from '@/lib/contracts/lot-review';

/** Where the control limits come from and since when they stand. */
export function BaselineLine({ baseline }: { baseline: LotReview['baseline'] }) {
  if (baseline.kind === 'no-spread') return <>These values show no spread, so there are no control limits.</>;
  if (baseline.kind === 'waiting')
    return (
      <>
        Control limits and run rules begin with {baseline.needed} measured boards; <b>{baseline.values}</b>{' '}
        {baseline.values === 1 ? 'is' : 'are'} there.
      </>
    );
  const { boards, fromLots, frozenIso, byName } = baseline;
  return (
    <>
      Control limits from{' '}
      {fromLots.length === 0 ? (
        <>the first {boards} boards of this lot</>
      ) : (
        <>
          {count(boards)} boards of {fromLots.length === 1 ? 'lot' : 'lots'}{' '}
          <span className="font-num">{fromLots.join(', ')}</span>
        </>
      )}
      , {byName ? `chosen by ${byName}` : 'frozen'} <Time iso={frozenIso} />.
    </>
  );
}
