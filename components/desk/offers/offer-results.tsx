'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Table, Td, Th } from '@/components/ui/table';
import { useToast } from '@/components/ui/toast';
import { TrialMark } from '@/components/ui/trial-mark';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { OfferedDraft, OfferRun } from '@/lib/contracts/engineering-offer';
import type { Outcome } from '@/lib/contracts/outcome';
import { fetchJson } from '../fetch-json';
import { volts } from '../numbers';
import { Time } from '../time';
import { noVerdictWords, rejectWords, verdictWords } from '../words';

const refreshMs = 4_000;
const shapes = { pass: 'pass', reject: 'reject', 'no-verdict': 'check' } as const;

interface OfferResultsProps {
  revisionId: string;
  /** listOffersOf(revisionId). */
  initial: OfferedDraft[];
  /** endOfferAction; null: this person may only look. */
  endOffer: ((input: { offerId: string }) => Promise<Outcome>) | null;
}

/** What the trials of a revision at stations gave. Renders nothing while it was never offered. */
export function OfferResults({ revisionId, initial, endOffer }: OfferResultsProps) {
  const toast = useToast();
  const query = useQuery({
    queryKey: ['offers', revisionId],
    queryFn: ({ signal }) => fetchJson<OfferedDraft[]>(`/api/offers/${revisionId}`, signal),
    initialData: initial,
    refetchInterval: ({ state }) => (state.data?.some(({ endedIso }) => endedIso === null) ? refreshMs : false),
  });
  const [ending, setEnding] = useState<string | null>(null);

  async function end(offer: OfferedDraft): Promise<void> {
    setEnding(offer.id);
    const outcome = await endOffer?.({ offerId: offer.id }).catch(() => null);
    toast(
      outcome?.ok
        ? `${offer.stationName} no longer has the draft on offer`
        : (outcome?.sentence ?? 'The server did not answer. Try again.'),
    );
    await query.refetch();
    setEnding(null);
  }

  return query.data.map((offer) => (
    <section key={offer.id} className="border-t-2 border-ink pt-3 pb-5" aria-label={`Trial at ${offer.stationName}`}>
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
        <h3 className="flex items-center gap-3 font-bold">
          <TrialMark size={20} />
          {titleOf(offer)}
        </h3>
        {offer.endedIso === null && endOffer ? (
          <Button onClick={() => void end(offer)} pending={ending === offer.id ? 'Ending' : null}>
            End the offer
          </Button>
        ) : null}
      </div>
      <p className="text-ink-2">
        Offered by {offer.offeredByName}, <Time iso={offer.offeredIso} />
        {offer.endedIso ? (
          <>
            ; ended by {offer.endedByName}, <Time iso={offer.endedIso} />
          </>
        ) : null}
        .{offer.note ? ` “${offer.note}”` : ''}
      </p>
      {offer.runs.length === 0 ? (
        <p className="mt-2">
          {offer.endedIso === null ? 'No board yet. Somebody at that bench has to start it.' : 'No board was run.'}
        </p>
      ) : (
        <Runs runs={offer.runs} />
      )}
    </section>
  ));
}

function titleOf({ endedIso, runs, stationName }: OfferedDraft): string {
  if (endedIso === null) return `On offer at ${stationName}`;
  return runs.length > 0 ? `Tried at ${stationName}` : `Was on offer at ${stationName}`;
}

function Runs({ runs }: { runs: readonly OfferRun[] }) {
  return (
    <Table aria-label="Engineering runs" className="mt-2">
      <thead>
        <tr>
          <Th>Board</Th>
          <Th>Verdict</Th>
          <Th number>Trip</Th>
          <Th number>Release</Th>
          <Th number>Hysteresis</Th>
          <Th number>Seconds</Th>
          <Th>Record</Th>
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => (
          <tr key={run.id}>
            <Td label="Board">
              <span className="font-num">{run.serial}</span>
            </Td>
            <Td label="Verdict">
              <RunVerdict run={run} />
            </Td>
            <Td label="Trip" number>
              {run.tripVolts === null ? '–' : `${volts(run.tripVolts)} V`}
            </Td>
            <Td label="Release" number>
              {run.releaseVolts === null ? '–' : `${volts(run.releaseVolts)} V`}
            </Td>
            <Td label="Hysteresis" number>
              {run.hysteresisVolts === null ? '–' : `${volts(run.hysteresisVolts)} V`}
            </Td>
            <Td label="Seconds" number>
              {run.seconds === null ? '–' : Math.round(run.seconds)}
            </Td>
            <Td label="Record">
              <Link className="sw-link" href={`/engineering-runs/${run.id}`}>
                Run {run.attempt}, <Time iso={run.startedIso} />
              </Link>
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function RunVerdict({ run: { verdict, rejectReason, noVerdictReason } }: { run: OfferRun }) {
  if (!verdict) return <b>On the fixture</b>;
  const why = rejectReason ? rejectWords[rejectReason] : noVerdictReason ? noVerdictWords(noVerdictReason) : null;
  return (
    <span className="inline-flex items-center gap-2">
      <VerdictMark shape={shapes[verdict]} size={16} />
      <span>
        <b>{verdictWords[verdict]}</b>
        {why ? `, ${why.toLowerCase()}` : ''}
      </span>
    </span>
  );
}
