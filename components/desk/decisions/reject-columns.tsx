'use client';

import Link from 'next/link';
import { MiniGauge } from '@/components/ui/mini-gauge';
import { SerialStrip } from '@/components/ui/serial-strip';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { RejectRow } from '@/lib/contracts/reject-list';
import { deskColumns } from '../data-table';
import { inSpokenUnit, limitsText } from '../numbers';
import { Time } from '../time';
import { quantityWords, rejectWords } from '../words';
import { otherSideWords } from './decision-words';

export const rejectColumn = deskColumns<RejectRow>();

export const serialColumn = rejectColumn.accessor('serial', {
  header: 'Serial',
  cell: ({ row: { original } }) => (
    <Link className="sw-link whitespace-nowrap" href={`/units/${encodeURIComponent(original.serial)}`}>
      <SerialStrip serial={original.serial} boardTypeCode={original.boardTypeCode} />
    </Link>
  ),
});

export const lotColumn = rejectColumn.accessor('lotCode', {
  id: 'lot',
  header: 'Lot',
  cell: ({ row: { original } }) => (
    <>
      <Link className="sw-link font-num" href={`/lots/${encodeURIComponent(original.lotCode)}`}>
        {original.lotCode}
      </Link>
      {original.lotHeld ? <span className="text-ink-2">, on hold</span> : null}
    </>
  ),
});

export const reasonColumn = rejectColumn.accessor('rejectReason', {
  id: 'reason',
  header: 'Reason',
  cell: ({ row: { original } }) => <Reason row={original} />,
});

export const measuredColumn = rejectColumn.display({
  id: 'measured',
  header: 'Against limits',
  cell: ({ row: { original } }) => <Measured measured={original.measured} />,
});

export const triesColumn = rejectColumn.accessor('attempt', {
  header: 'Tries',
  enableSorting: false,
  meta: { number: true },
});

export const stationColumn = rejectColumn.accessor('stationCode', { id: 'station', header: 'Station' });

export const endedColumn = rejectColumn.accessor('endedIso', {
  id: 'ended',
  header: 'Tested',
  cell: ({ getValue }) => <Time iso={getValue()} />,
});

function Reason({ row: { rejectReason, concession } }: { row: RejectRow }) {
  return (
    <span>
      <span className="inline-flex items-center gap-2">
        <VerdictMark shape={rejectReason ? 'reject' : 'check'} size={15} />
        {rejectReason ? rejectWords[rejectReason] : 'Stopped without a verdict'}
      </span>
      {concession ? (
        <span className="block text-cap text-ink-2">
          Concession by {concession.byName} waits for {otherSideWords(concession.sides)}
        </span>
      ) : null}
    </span>
  );
}

const tones = { 'trip-volts': 'trip', 'release-volts': 'release' } as const;

function Measured({ measured }: { measured: RejectRow['measured'] }) {
  if (!measured) return <span className="text-ink-3">–</span>;
  const { quantity, value, min, max } = measured;
  const { text, unit } = inSpokenUnit(quantity, value);
  const tone = quantity === 'trip-volts' || quantity === 'release-volts' ? tones[quantity] : 'plain';
  const label = `${quantityWords[quantity]} ${text} ${unit}, limits ${limitsText(quantity, min, max)}`;
  return (
    <span className="inline-flex items-center gap-3 whitespace-nowrap">
      <b className="min-w-[72px] text-right font-num">
        {text} {unit}
      </b>
      <MiniGauge value={value} min={min} max={max} tone={tone} label={label} />
    </span>
  );
}
