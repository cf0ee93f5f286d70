import Link from 'next/link';
import { EmptyState } from '@/components/ui/empty-state';
import { SerialStrip } from '@/components/ui/serial-strip';
import { Table, Td, Th } from '@/components/ui/table';
import type { SuspectBoards } from '@/lib/contracts/lot-holds-page';
import { Time } from '../time';

/** Boards to look after while their lot is on hold. */
export function SuspectList({ suspects, boardTypeCode }: { suspects: SuspectBoards; boardTypeCode: string }) {
  const { since, stations, boards } = suspects;
  return (
    <>
      <p className="mb-2">
        Passed {since === 'run' ? 'since the run of boards that the rule saw began' : 'since the last good daily check'}
        :{' '}
        {stations.map(({ code, fromIso }, i) => (
          <span key={code}>
            {i > 0 ? '; ' : ''}station {code} {fromIso ? <Time iso={fromIso} /> : 'without a good check on record'}
          </span>
        ))}
        . Keep them apart until the hold is released.
      </p>
      {boards.length === 0 ? (
        <EmptyState title="No board passed since then." />
      ) : (
        <Table aria-label="Suspect boards">
          <thead>
            <tr>
              <Th>Serial</Th>
              <Th>Station</Th>
              <Th>Passed</Th>
            </tr>
          </thead>
          <tbody>
            {boards.map(({ serial, stationCode, passedIso }) => (
              <tr key={`${serial} ${passedIso}`}>
                <Td label="Serial">
                  <Link className="sw-link" href={`/units/${encodeURIComponent(serial)}`}>
                    <SerialStrip serial={serial} boardTypeCode={boardTypeCode} />
                  </Link>
                </Td>
                <Td label="Station">{stationCode}</Td>
                <Td label="Passed">
                  <Time iso={passedIso} />
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </>
  );
}
