import type { LotPage } from '@/lib/contracts/lot-page';
import { count } from '../numbers';
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
