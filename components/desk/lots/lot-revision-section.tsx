'use client';

import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorPanel } from '@/components/ui/error-panel';
import { Section } from '@/components/ui/page-head';
import { Table, Td, Th } from '@/components/ui/table';
import { useToast } from '@/components/ui/toast';
import { ReasonDialog } from '../reason-dialog';
import { Time } from '../time';
import type { LotSectionProps } from './lot-section';

/** The revision that a lot is tested with, the newer one that it could go on with, and the moves that were decided. */
export function LotRevisionSection({ lot, may, actions, onChanged }: LotSectionProps) {
  const toast = useToast();
  const [asking, setAsking] = useState(false);
  const { id, code, sequenceNumber, revision } = lot;
  const { sequenceId, status, withdrawnReason, newer, moves } = revision;
  const mayMove = newer !== null && may.manage && lot.state !== 'closed';
  const compare = newer && `/sequences/${sequenceId}/compare?a=r${sequenceNumber}&b=r${newer.number}`;
  return (
    <Section title="Sequence">
      {status === 'withdrawn' ? (
        <ErrorPanel title={`r${sequenceNumber} is withdrawn.`}>
          {withdrawnReason} No board of the lot is tested.
        </ErrorPanel>
      ) : null}
      <div className="flex flex-wrap items-center gap-x-6 gap-y-3 py-1">
        <p>
          Every board is tested with{' '}
          <Link className="sw-link" href={`/sequences/${sequenceId}`}>
            r{sequenceNumber}
          </Link>
          {newer ? (
            <>
              . New lots take <b>r{newer.number}</b>.{' '}
              <Link className="sw-link" href={compare!}>
                Compare the two
              </Link>
            </>
          ) : (
            ', the newest.'
          )}
        </p>
        {mayMove ? <Button onClick={() => setAsking(true)}>Move the lot to r{newer.number}…</Button> : null}
      </div>
      {moves.length > 0 ? (
        <Table aria-label="Moves to another revision">
          <thead>
            <tr>
              <Th>Moved</Th>
              <Th>Reason</Th>
              <Th>By</Th>
              <Th>When</Th>
            </tr>
          </thead>
          <tbody>
            {moves.map((move) => (
              <tr key={move.id}>
                <Td label="Moved">
                  r{move.fromNumber} to <b>r{move.toNumber}</b>
                </Td>
                <Td label="Reason">{move.reason}</Td>
                <Td label="By">{move.byName}</Td>
                <Td label="When">
                  <Time iso={move.atIso} />
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      ) : null}
      {newer ? (
        <ReasonDialog
          open={asking}
          onClose={() => setAsking(false)}
          title={`Move lot ${code} to r${newer.number}?`}
          consequence={`From the next board on it is tested with r${newer.number}. Boards tested so far keep r${sequenceNumber} in their records. Your reason is recorded.`}
          verb={`Move to r${newer.number}`}
          keep={`Keep r${sequenceNumber}`}
          send={(reason) => actions.move({ lotId: id, toRevisionId: newer.id, reason })}
          onDone={() => {
            setAsking(false);
            toast(`Lot ${code} is tested with r${newer.number} from now on`);
            onChanged();
          }}
        />
      ) : null}
    </Section>
  );
}
