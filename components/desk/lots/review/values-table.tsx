'use client';

import Link from 'next/link';
import { useMemo } from 'react';
import { boardKinds, type BoardKind } from '@/components/charts/quality/board-kinds';
import { movingRangeOf } from '@/components/charts/quality/moving-range-of';
import { quantityLooks, valueText } from '@/components/charts/quality/quantity-look';
import { SerialStrip } from '@/components/ui/serial-strip';
import type { ChartQuantity, LotReview } from '@/lib/contracts/lot-review';
import { DataTable, deskColumns } from '../../data-table';
import { Time } from '../../time';

interface ValueRow {
  place: number;
  serial: string;
  boardTypeCode: string;
  quantity: ChartQuantity;
  value: number | undefined;
  range: number | undefined;
  found: number | undefined;
  station: string;
  endedIso: string;
  mark: string;
}

const kindWords: Record<BoardKind, string> = {
  plain: '',
  run: 'run',
  beyond: 'outside control limits',
  rejected: 'rejected',
};

const helper = deskColumns<ValueRow>();
const number = (key: 'value' | 'range' | 'found', header: string) =>
  helper.accessor((row) => row[key], {
    id: key,
    header,
    sortUndefined: 'last',
    meta: { number: true },
    cell: ({ getValue, row }) => {
      const value = getValue();
      return value === undefined ? '–' : valueText(row.original.quantity, value);
    },
  });

const columnsFor = (unit: string) =>
  helper.columns([
    helper.accessor('place', { header: 'Board', meta: { number: true } }),
    helper.accessor('serial', {
      header: 'Serial',
      sortFn: 'alphanumeric',
      cell: ({ row: { original } }) => (
        <Link className="sw-link" href={`/units/${encodeURIComponent(original.serial)}`}>
          <SerialStrip serial={original.serial} boardTypeCode={original.boardTypeCode} />
        </Link>
      ),
    }),
    number('value', `Verified, ${unit}`),
    number('range', 'Moving range'),
    number('found', 'As found'),
    helper.accessor('station', { header: 'Station', sortFn: 'alphanumeric' }),
    helper.accessor('endedIso', {
      header: 'Tested',
      sortFn: 'text',
      cell: ({ getValue }) => <Time iso={getValue()} />,
    }),
    helper.accessor('mark', { header: 'Mark', sortFn: 'text' }),
  ]);

/** What the charts draw, board by board. */
export function ValuesTable({ review, boardTypeCode }: { review: LotReview; boardTypeCode: string }) {
  const rows = useMemo((): ValueRow[] => {
    const { points, quantity, stationCodes } = review;
    const ranges = movingRangeOf(points.values);
    const kinds = boardKinds(review);
    return points.serials.map((serial, i) => ({
      place: i + 1,
      serial,
      boardTypeCode,
      quantity,
      value: points.values[i] ?? undefined,
      range: ranges[i] ?? undefined,
      found: points.found[i] ?? undefined,
      station: stationCodes[points.station[i]!] ?? '',
      endedIso: new Date(points.endedAt[i]! * 1000).toISOString(),
      mark: kinds[i] ? kindWords[kinds[i]] : points.marks[i] === 'R' ? kindWords.rejected : '',
    }));
  }, [review, boardTypeCode]);
  const { unit, name } = quantityLooks[review.quantity];
  const columns = useMemo(() => columnsFor(unit), [unit]);
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => row.serial}
      label={`${name}, board by board`}
      empty={{ title: 'No board has a verdict yet.' }}
      pageSize={25}
    />
  );
}
