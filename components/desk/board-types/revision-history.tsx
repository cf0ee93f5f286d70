'use client';

import { PointMark } from '@/components/ui/point-mark';
import { Section } from '@/components/ui/page-head';
import { Table, Td, Th } from '@/components/ui/table';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { compareBoardTypes } from '@/lib/board-type/compare-board-types';
import type { BoardTypePage, BoardTypeRevisionHead } from '@/lib/contracts/board-type-revision';
import { limitsText } from '../numbers';
import { Time } from '../time';
import { ChangeList } from './change-list';

const volts = ({ min, max }: { min: number; max: number }) => limitsText('trip-volts', min, max);

/** Every revision with its limits, who asked for it and why, and who approved it; newest first. */
export function RevisionHistory({ history, openLots }: Pick<BoardTypePage, 'history' | 'openLots'>) {
  return (
    <Section
      title="History of the limits, V"
      aside={<span className="text-cap text-ink-2">Two people stand behind every change.</span>}
    >
      <Table aria-label="History of the limits">
        <thead>
          <tr>
            <Th>No.</Th>
            <Th>
              <PointMark point="trip" /> Trip
            </Th>
            <Th>
              <PointMark point="release" /> Release
            </Th>
            <Th>Hysteresis</Th>
            <Th>Asked by</Th>
            <Th>Approved by</Th>
            <Th>Why, and what changed</Th>
          </tr>
        </thead>
        <tbody>
          {history.map((row, i) => (
            <tr key={row.id} className={row.status === 'submitted' || row.status === 'draft' ? 'bg-attn-wash' : ''}>
              <Td label="No." className="font-num font-bold">
                {row.number}
              </Td>
              <Td label="Trip" className="font-num whitespace-nowrap">
                {volts(row.specification.limits.tripVolts)}
              </Td>
              <Td label="Release" className="font-num whitespace-nowrap">
                {volts(row.specification.limits.releaseVolts)}
              </Td>
              <Td label="Hysteresis" className="font-num whitespace-nowrap">
                {volts(row.specification.limits.hysteresisVolts)}
              </Td>
              <Td label="Asked by">
                {row.submittedBy ?? row.madeBy},{' '}
                <Time iso={row.submittedAtIso ?? row.approvedAtIso ?? row.savedAtIso} format="day" />
              </Td>
              <Td label="Approved by">
                <Approval row={row} />
              </Td>
              <Td label="Why, and what changed">
                <WhatChanged row={row} before={approvedBefore(history, i)} openLots={openLots} />
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Section>
  );
}

const approvedBefore = (history: readonly BoardTypeRevisionHead[], i: number) =>
  history.slice(i + 1).find(({ status }) => status === 'approved' || status === 'superseded');

function Approval({ row }: { row: BoardTypeRevisionHead }) {
  switch (row.status) {
    case 'draft':
      return row.sentBackBy ? (
        <>
          <VerdictMark shape="check" size={15} /> sent back by {row.sentBackBy}
        </>
      ) : (
        <span className="text-ink-2">draft</span>
      );
    case 'submitted':
      return (
        <>
          <VerdictMark shape="check" size={15} /> <b>1 of 2</b>, quality waits
        </>
      );
    case 'withdrawn':
      return <span className="text-ink-2">discarded</span>;
    case 'approved':
    case 'superseded':
      return (
        <>
          <VerdictMark shape="pass" size={15} /> {row.approvedBy}
          {row.approvedAtIso ? (
            <>
              , <Time iso={row.approvedAtIso} format="day" />
            </>
          ) : null}
          {row.status === 'approved' ? <b>, in use</b> : null}
        </>
      );
  }
}

interface WhatChangedProps {
  row: BoardTypeRevisionHead;
  before: BoardTypeRevisionHead | undefined;
  openLots: BoardTypePage['openLots'];
}

function WhatChanged({ row, before, openLots }: WhatChangedProps) {
  const changes = before ? compareBoardTypes(before.specification, row.specification) : [];
  const lots = openLots.filter(({ revisionNumber }) => revisionNumber === row.number).length;
  return (
    <>
      {row.note || (before ? '' : 'First revision.')}
      {changes.length > 0 ? (
        <details>
          <summary className="cursor-pointer text-accent underline">
            {changes.length} {changes.length === 1 ? 'value differs' : 'values differ'} from {before!.number}
          </summary>
          <ChangeList changes={changes} />
        </details>
      ) : null}
      {lots > 0 ? (
        <span className="block text-ink-2">
          {lots} open {lots === 1 ? 'lot keeps' : 'lots keep'} it.
        </span>
      ) : null}
    </>
  );
}
