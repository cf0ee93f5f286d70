'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useSay } from '@/components/bench/use-say';
import { ButtonLink } from '@/components/ui/button';
import { PageHead, Section } from '@/components/ui/page-head';
import { Table, Td, Th } from '@/components/ui/table';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { ReadinessItem } from '@/lib/contracts/bench-view';
import type { InstrumentKind } from '@/lib/contracts/stored-states';
import type { StationPage } from '@/lib/contracts/station-overview';
import { DueDate } from '../engineering/due-date';
import type { Send } from '../engineering/instrument-forms';
import { instrumentWords, needsCertificate } from '../engineering/instrument-words';
import { English } from '../english';
import { fetchJson } from '../fetch-json';
import { StaleNote } from '../stale-note';
import { Time } from '../time';
import { DailyCheckForm } from './daily-check-form';
import { Commissionings, DailyChecks } from './station-checks';
import { TrialNote } from './station-line';
import { stationStateWords } from './station-words';

const refreshMs = 5_000;
const usualHours = 12;

interface StationLiveProps {
  initial: StationPage;
  /** Year-month-day of the server. */
  today: string;
  /** Null: this person may look only. */
  recordCheck: Send<{ passed: boolean }> | null;
}

/** One station: may it test, until when, and what says so. */
export function StationLive({ initial, today, recordCheck }: StationLiveProps) {
  const query = useQuery({
    queryKey: ['station', initial.code],
    queryFn: ({ signal }) => fetchJson<StationPage>(`/api/stations/${encodeURIComponent(initial.code)}`, signal),
    initialData: initial,
    refetchInterval: refreshMs,
  });
  const station = query.data;
  return (
    <English>
      <PageHead
        title={station.name}
        lede={`${station.fixture}${station.simulated ? ', simulated' : ''}. ${stationStateWords[station.state]}.`}
        actions={<ButtonLink href={`/bench/${encodeURIComponent(station.code)}`}>Watch the bench</ButtonLink>}
      />
      <MayTest station={station} />
      <TrialNote station={station} />
      <StaleNote updatedAt={query.dataUpdatedAt} failing={query.isError} />
      <div className="grid gap-x-12 lg:grid-cols-2">
        <Section title="What must hold">
          <Readiness items={station.readiness} />
        </Section>
        <Section
          title="Instruments"
          aside={
            <Link className="sw-link" href="/instruments">
              All instruments
            </Link>
          }
        >
          <Table aria-label="Instruments of the station">
            <thead>
              <tr>
                <Th>Instrument</Th>
                <Th>Kind</Th>
                <Th>Due</Th>
              </tr>
            </thead>
            <tbody>
              {station.instruments.map((instrument) => (
                <tr key={instrument.id}>
                  <Td label="Instrument">
                    <b className="font-num">{instrument.code}</b>
                  </Td>
                  <Td label="Kind">{instrumentWords[instrument.kind as InstrumentKind]}</Td>
                  <Td label="Due">
                    {needsCertificate(instrument.kind as InstrumentKind) ? (
                      <DueDate dueOn={instrument.dueOn} today={today} />
                    ) : (
                      <span className="text-ink-2">not needed</span>
                    )}
                  </Td>
                </tr>
              ))}
            </tbody>
          </Table>
        </Section>
      </div>
      <Section
        title="Daily check"
        aside={
          <Link className="sw-link" href="/reference-boards">
            Limits of the reference boards
          </Link>
        }
      >
        <DailyChecks station={station} />
        {recordCheck && station.references.length > 0 ? (
          <div className="mt-4">
            <DailyCheckForm
              stationId={station.id}
              references={station.references}
              validHours={station.dailyChecks[0]?.validHours ?? usualHours}
              record={recordCheck}
              onDone={() => void query.refetch()}
            />
          </div>
        ) : null}
      </Section>
      <Section title="Commissioning">
        <p className="mb-3 max-w-[70ch]">
          Commissioning energises the fixture, so it is made at the bench: sign in there with your badge, choose
          Commission in the menu, and follow the screen with the reference board. Its values appear here.
        </p>
        <Commissionings rows={station.commissionings} />
      </Section>
    </English>
  );
}

function MayTest({ station }: { station: StationPage }) {
  const say = useSay();
  const bad = station.reasons.length > 0;
  const ends = station.readiness
    .flatMap((item) => (item.validUntil && item.key !== 'training' ? [item.validUntil] : []))
    .sort()[0];
  return (
    <p className="text-lead leading-snug">
      <VerdictMark shape={bad ? 'hold' : 'pass'} size={22} />{' '}
      {bad ? (
        <>
          <b>May not test.</b> {station.reasons.map(say).join(' ')}
        </>
      ) : (
        <>
          <b>May test</b>
          {ends ? (
            <>
              {' '}
              until{' '}
              <b>
                <Time iso={ends} />
              </b>
            </>
          ) : null}
          .
        </>
      )}
    </p>
  );
}

const keyWords: Record<ReadinessItem['key'], string> = {
  meter: 'Meter',
  supply: 'Supply',
  fixture: 'Fixture',
  'daily-check': 'Daily check',
  commissioned: 'Commissioning',
  training: 'Training',
  links: 'Links',
  database: 'Records',
};
const shapes = { good: 'pass', soon: 'check', bad: 'reject' } as const;

function Readiness({ items }: { items: readonly ReadinessItem[] }) {
  const say = useSay();
  return (
    <Table aria-label="What must hold before the station may test">
      <thead>
        <tr>
          <Th>What</Th>
          <Th>State</Th>
          <Th>Until</Th>
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <tr key={item.key}>
            <Td label="What">
              <b>{keyWords[item.key]}</b> {item.label}
            </Td>
            <Td label="State">
              <span className="inline-flex items-center gap-2">
                <VerdictMark shape={shapes[item.state]} size={16} />
                {say(item.sentence)}
              </span>
            </Td>
            <Td label="Until">{item.validUntil ? <Until item={item} until={item.validUntil} /> : ''}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** Certificates hold through a day, everything else to a moment. */
function Until({ item, until }: { item: ReadinessItem; until: string }) {
  if (item.key !== 'meter' && item.key !== 'supply') return <Time iso={until} />;
  return <Time iso={new Date(Date.parse(until) - 1).toISOString()} format="day" />;
}
