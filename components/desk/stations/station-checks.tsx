'use client';

import { DailyCheckChart } from '@/components/charts/daily-check-chart';
import { PointMark } from '@/components/ui/point-mark';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { StationPage } from '@/lib/contracts/station-overview';
import { DataTable, deskColumns } from '../data-table';
import { Time } from '../time';

type Check = StationPage['dailyChecks'][number];
type Commissioning = StationPage['commissionings'][number];

const volts = (value: number | null) => (value === null ? 'not found' : `${value.toFixed(3)} V`);
const checks = deskColumns<Check>();
const checkColumns = checks.columns([
  checks.accessor('atIso', { header: 'At', sortFn: 'text', cell: ({ getValue }) => <Time iso={getValue()} /> }),
  checks.accessor((row) => (row.passed ? 'passed' : 'failed'), {
    id: 'passed',
    header: 'Result',
    sortFn: 'text',
    cell: ({ row: { original } }) => (
      <span className="inline-flex items-center gap-2">
        <VerdictMark shape={original.passed ? 'pass' : 'reject'} size={16} />
        {original.passed ? 'Passed' : 'Failed'}
      </span>
    ),
  }),
  checks.accessor('referenceCode', {
    header: 'Board',
    sortFn: 'text',
    cell: ({ getValue }) => <span className="font-num">{getValue()}</span>,
  }),
  checks.accessor('tripVolts', { header: 'Trip', meta: { number: true }, cell: ({ getValue }) => volts(getValue()) }),
  checks.accessor('releaseVolts', {
    header: 'Release',
    meta: { number: true },
    cell: ({ getValue }) => volts(getValue()),
  }),
  checks.accessor('validHours', { header: 'Valid', meta: { number: true }, cell: ({ getValue }) => `${getValue()} h` }),
  checks.accessor('byName', {
    header: 'By',
    sortFn: 'text',
    cell: ({ row: { original } }) => `${original.byName}, ${original.atBench ? 'at the bench' : 'by hand'}`,
  }),
]);

/** Every daily check, and both points of the newest reference board over time. */
export function DailyChecks({ station }: { station: StationPage }) {
  const newest = station.dailyChecks[0];
  const sameBoard = newest
    ? station.dailyChecks.filter((check) => check.referenceCode === newest.referenceCode).reverse()
    : [];
  return (
    <>
      {newest && sameBoard.length > 1
        ? (['trip', 'release'] as const).map((side) => {
            const known = side === 'trip' ? newest.knownTripVolts : newest.knownReleaseVolts;
            const points = sameBoard.flatMap((check) => {
              const measured = side === 'trip' ? check.tripVolts : check.releaseVolts;
              return measured === null ? [] : [{ atIso: check.atIso, volts: measured, passed: check.passed }];
            });
            return (
              <figure key={side} className="mb-3">
                <figcaption className={`font-bold ${side === 'trip' ? 'text-trip' : 'text-release'}`}>
                  <PointMark point={side} /> {side === 'trip' ? 'Trip' : 'Release'} of reference board{' '}
                  {newest.referenceCode}, V
                </figcaption>
                <DailyCheckChart
                  points={points}
                  knownVolts={known}
                  toleranceVolts={newest.toleranceVolts}
                  side={side}
                  label={`${points.length} daily checks of the ${side} point, written ${known.toFixed(3)} V; the table below has the values`}
                />
              </figure>
            );
          })
        : null}
      <DataTable
        rows={station.dailyChecks}
        columns={checkColumns}
        rowKey={(row) => row.id}
        label="Daily checks"
        empty={{ title: 'No daily check yet.', text: 'Scan the reference board at the bench.' }}
        pageSize={10}
      />
    </>
  );
}

const commissionings = deskColumns<Commissioning>();
const commissioningColumns = commissionings.columns([
  commissionings.accessor('atIso', { header: 'At', sortFn: 'text', cell: ({ getValue }) => <Time iso={getValue()} /> }),
  commissionings.accessor('validUntilIso', {
    header: 'Valid until',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={getValue()} format="day" />,
  }),
  commissionings.accessor('overshoot', {
    header: 'Overshoot',
    meta: { number: true },
    cell: ({ getValue }) => `${(getValue() * 100).toFixed(1)} %`,
  }),
  commissionings.accessor('settleMs', {
    header: 'Settling',
    meta: { number: true },
    cell: ({ getValue }) => `${getValue().toFixed(0)} ms`,
  }),
  commissionings.accessor('waypointMs', {
    header: 'Waypoint',
    meta: { number: true },
    cell: ({ getValue }) => `${getValue().toFixed(0)} ms`,
  }),
  commissionings.accessor('noiseVolts', {
    header: 'Noise',
    meta: { number: true },
    cell: ({ getValue }) => `${(getValue() * 1000).toFixed(2)} mV`,
  }),
  commissionings.accessor('referenceCode', {
    header: 'Board',
    sortFn: 'text',
    cell: ({ getValue }) => <span className="font-num">{getValue()}</span>,
  }),
  commissionings.accessor('byName', { header: 'By', sortFn: 'text' }),
]);

/** What each commissioning measured. */
export function Commissionings({ rows }: { rows: readonly Commissioning[] }) {
  return (
    <DataTable
      rows={rows}
      columns={commissioningColumns}
      rowKey={(row) => row.id}
      label="Commissionings"
      empty={{ title: 'This station is not commissioned.', text: 'It searches no board until it is.' }}
      pageSize={10}
    />
  );
}
