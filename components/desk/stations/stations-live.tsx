'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHead } from '@/components/ui/page-head';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import type { StationRow, StationsOverview } from '@/lib/contracts/station-overview';
import { English } from '../english';
import { fetchJson } from '../fetch-json';
import { count } from '../numbers';
import { StaleNote } from '../stale-note';
import { Time } from '../time';
import { StationLine } from './station-line';
import { countStations } from './station-words';

const refreshMs = 3_000;

interface StationsLiveProps {
  initial: StationsOverview;
  acknowledge: ((input: unknown) => Promise<Outcome>) | null;
}

/** All benches, live, most urgent first. Rows do not move while a pointer is on them. */
export function StationsLive({ initial, acknowledge }: StationsLiveProps) {
  const toast = useToast();
  const client = useQueryClient();
  const query = useQuery({
    queryKey: ['stations'],
    queryFn: ({ signal }) => fetchJson<StationsOverview>('/api/stations', signal),
    initialData: initial,
    refetchInterval: refreshMs,
  });
  const [busy, setBusy] = useState<string | null>(null);
  const order = useOrderHeldUnderPointer(query.data.stations);

  async function come(station: StationRow): Promise<void> {
    if (!station.call || !acknowledge) return;
    setBusy(station.id);
    const outcome = await acknowledge({ callId: station.call.id }).catch(() => null);
    toast(
      outcome?.ok
        ? `${station.name} knows that you are coming`
        : (outcome?.sentence ?? 'The server did not answer. Try again.'),
    );
    await Promise.all([query.refetch(), client.invalidateQueries({ queryKey: ['calls'] })]);
    setBusy(null);
  }

  return (
    <English>
      <PageHead
        title="Stations"
        tabs={
          <span className="text-ink-2">
            Live,{' '}
            <b>
              <Time iso={query.data.atIso} format="clock" />
            </b>
          </span>
        }
      />
      <Sentence stations={query.data.stations} />
      <StaleNote updatedAt={query.dataUpdatedAt} failing={query.isError} />
      {order.stations.length === 0 ? (
        <EmptyState title="No station is set up.">The administrator adds one under Administration.</EmptyState>
      ) : (
        <ul className="mt-4 border-t-2 border-ink" onPointerEnter={order.hold} onPointerLeave={order.release}>
          {order.stations.map((station) => (
            <StationLine
              key={station.id}
              station={station}
              onCome={acknowledge ? (each) => void come(each) : null}
              busy={busy === station.id}
            />
          ))}
        </ul>
      )}
    </English>
  );
}

/** The newest rows in the order in which they stood when the pointer came. */
function useOrderHeldUnderPointer(stations: StationRow[]) {
  const [held, setHeld] = useState<string[] | null>(null);
  const placed = held ? [...stations].sort((a, b) => held.indexOf(a.id) - held.indexOf(b.id)) : stations;
  return {
    stations: placed,
    hold: () => setHeld(stations.map((station) => station.id)),
    release: () => setHeld(null),
  };
}

function Sentence({ stations }: { stations: readonly StationRow[] }) {
  const { testing, calling, tested, boards, rejected } = countStations(stations);
  return (
    <p className="text-lede leading-snug max-sm:text-lead">
      <b>{testing}</b> of <b>{stations.length}</b> benches {testing === 1 ? 'tests' : 'test'}.{' '}
      {calling.map((name) => (
        <span key={name}>
          <b>{name}</b> calls the engineer.{' '}
        </span>
      ))}
      {boards > 0 ? (
        <>
          <b>{count(tested)}</b> of <b>{count(boards)}</b> boards are done, <b>{count(rejected)}</b> rejected.
        </>
      ) : null}
    </p>
  );
}
