'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { SerialStrip } from '@/components/ui/serial-strip';
import { useToast } from '@/components/ui/toast';
import { VerdictMark, type VerdictShape } from '@/components/ui/verdict-mark';
import type { Outcome } from '@/lib/contracts/outcome';
import type { UnitPage } from '@/lib/contracts/unit-page';
import type { Deciding } from '../decisions/deciding';
import { DispositionDialog } from '../decisions/disposition-dialog';
import { UnitDecisions, type DecisionViewer } from '../decisions/unit-decisions';
import { CertificatesSection, type CertificatesGiven } from '../certificates/certificates-section';
import { fetchJson } from '../fetch-json';
import { standingWords } from '../words';
import { RetestDialog } from './retest-dialog';
import { RunBlock } from './run-block';
import { UnitHistory } from './unit-history';
import { UnitLabel } from './unit-label';
import { UnitRails } from './unit-rails';

interface UnitLiveProps {
  initial: UnitPage;
  viewer: DecisionViewer;
  certificates: CertificatesGiven;
  may: { print: boolean; order: boolean };
  deciding: Deciding;
  actions: Record<'print' | 'order' | 'complete', (input: unknown) => Promise<Outcome>>;
}

const refreshMs = 2_500;
const moves = (unit: UnitPage) =>
  unit.runs.some((run) => run.verdict === null) ||
  unit.labels[0]?.state === 'waiting' ||
  unit.labels[0]?.state === 'failed';

/** Everything on record of one board; fetched again while it is in test or its label is on the way. */
export function UnitLive({ initial, viewer, certificates, may, deciding, actions }: UnitLiveProps) {
  const toast = useToast();
  const query = useQuery({
    queryKey: ['unit', initial.serial],
    queryFn: ({ signal }) => fetchJson<UnitPage>(`/api/units/${encodeURIComponent(initial.serial)}`, signal),
    initialData: initial,
    refetchInterval: ({ state }) => (state.data && moves(state.data) ? refreshMs : false),
  });
  const unit = query.data;
  const [asking, setAsking] = useState<'decide' | 'order' | null>(null);
  const [printing, setPrinting] = useState(false);
  const { kind } = unit.standing;
  const newest = unit.runs.find((run) => run.kind === 'production');
  const kinds = unit.decidable.filter((each) => deciding.kinds.includes(each));
  const orderable = kind === 'passed' || kind === 'waits-for-quality';
  const dialog = {
    signer: viewer.name,
    onClose: () => setAsking(null),
    onDone: (said: string) => {
      setAsking(null);
      toast(said);
      void query.refetch();
    },
  };

  async function printAgain(): Promise<void> {
    setPrinting(true);
    const outcome = await actions.print({ unitId: unit.id }).catch(() => null);
    setPrinting(false);
    toast(
      outcome?.ok ? 'One more label is on its way' : (outcome?.sentence ?? 'The server did not answer. Try again.'),
    );
    void query.refetch();
  }

  return (
    <>
      <header className="sw-screen-only mb-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-3 border-b-2 border-ink pb-3">
        <div className="flex flex-wrap items-baseline gap-x-7 gap-y-2">
          <h1 className="text-[40px] leading-none max-sm:text-[26px]">
            <SerialStrip serial={unit.serial} boardTypeCode={unit.boardTypeCode} />
          </h1>
          <Standing unit={unit} />
          <span>
            Lot{' '}
            <Link className="sw-link font-num" href={`/lots/${encodeURIComponent(unit.lotCode)}`}>
              {unit.lotCode}
            </Link>
            {unit.lotHeld ? ', on hold' : ''}
          </span>
        </div>
        <div className="flex flex-wrap gap-3">
          {may.order && orderable ? <Button onClick={() => setAsking('order')}>Test it again</Button> : null}
          {newest && kinds.length > 0 ? (
            <Button kind="filled" onClick={() => setAsking('decide')}>
              Decide
            </Button>
          ) : null}
          {unit.label && may.print ? (
            <Button kind="filled" onClick={() => void printAgain()} pending={printing ? 'Sending' : null}>
              Print label again
            </Button>
          ) : null}
        </div>
      </header>
      <div className="grid items-start gap-x-9 gap-y-8 lg:grid-cols-[minmax(0,280px)_minmax(0,1fr)_minmax(0,240px)]">
        <div className="sw-screen-only max-lg:max-w-[420px]">
          <UnitRails unit={unit} />
          <UncertaintyNote unit={unit} />
        </div>
        <div className="sw-screen-only">
          {unit.runs.length === 0 ? (
            <EmptyState title="Not tested yet.">
              The first attempt appears here as soon as the board is scanned.
            </EmptyState>
          ) : (
            <Runs unit={unit} />
          )}
          <CertificatesSection
            {...certificates}
            subject={{ unitId: unit.id }}
            what={`board ${unit.serial.slice(-5)}`}
            unavailable={
              unit.lotHeld
                ? 'Its lot is on hold.'
                : kind === 'passed' || kind === 'used-as-is'
                  ? null
                  : 'Its newest result is not a pass.'
            }
          />
        </div>
        <aside>
          <h2 className="sw-screen-only mb-1.5 font-bold">Label, 40 × 20 mm</h2>
          <UnitLabel unit={unit} />
          {unit.label ? (
            <button type="button" className="sw-link sw-screen-only mt-1" onClick={() => window.print()}>
              Print on this computer
            </button>
          ) : null}
          <div className="sw-screen-only">
            <UnitDecisions unit={unit} viewer={viewer} complete={actions.complete} onDone={dialog.onDone} />
            <h2 className="mt-4 border-t-2 border-ink pt-2.5 font-bold">History</h2>
            <UnitHistory unit={unit} />
          </div>
        </aside>
      </div>
      {asking === 'decide' && newest ? (
        <DispositionDialog
          {...dialog}
          boards={[{ unitId: unit.id, runId: newest.id, serial: unit.serial }]}
          kinds={kinds}
          reasons={deciding.reasons}
          sign={deciding.sign}
        />
      ) : null}
      {asking === 'order' ? (
        <RetestDialog {...dialog} unitId={unit.id} serial={unit.serial} order={actions.order} />
      ) : null}
    </>
  );
}

function Runs({ unit }: { unit: UnitPage }) {
  const longest = Math.max(
    ...unit.runs.flatMap((run) => run.traces.map((trace) => (trace.atMs.at(-1) ?? 0) / 1000)),
    1,
  );
  return (
    <>
      {unit.runs.map((run) => (
        <RunBlock key={run.id} run={run} mostSeconds={longest} />
      ))}
      <p className="flex flex-wrap justify-between gap-4 border-t-2 border-ink pt-2 text-ink-2">
        <span>▽ trip seen while trimming, ▼ ▲ recorded points</span>
        <a className="sw-link" href={`/api/units/${encodeURIComponent(unit.serial)}/readings`} download>
          Export the readings
        </a>
      </p>
    </>
  );
}

function Standing({ unit }: { unit: UnitPage }) {
  const { kind } = unit.standing;
  const production = unit.runs.filter((run) => run.kind === 'production');
  const decided = production.find((run) => run.verdict === 'pass' || run.verdict === 'reject');
  const shape: VerdictShape | null =
    kind === 'passed'
      ? 'pass'
      : kind === 'needs-disposition' || kind === 'scrapped' || kind === 'attempts-used'
        ? 'reject'
        : kind === 'waits-for-quality'
          ? 'check'
          : null;
  const tone = shape === 'pass' ? 'text-pass' : shape === 'reject' ? 'text-reject' : '';
  const words =
    kind === 'passed'
      ? `Passed on attempt ${decided?.attempt ?? 1}`
      : kind === 'needs-disposition'
        ? 'Rejected, needs a decision'
        : kind === 'may-be-tested' && production.length > 0
          ? 'To be tested again'
          : standingWords[kind];
  return (
    <span className={`inline-flex items-center gap-2.5 text-lede font-bold ${tone}`}>
      {shape ? <VerdictMark shape={shape} size={26} /> : null}
      {words}
    </span>
  );
}

function UncertaintyNote({ unit }: { unit: UnitPage }) {
  const measured = unit.runs
    .filter((run) => run.kind === 'production')
    .flatMap((run) => run.measurements)
    .find((m) => m.quantity === 'trip-volts' && m.phase === 'verified' && m.expandedUncertainty !== null);
  if (!measured?.expandedUncertainty) return null;
  const millivolts = Math.ceil(measured.expandedUncertainty * 10_000) / 10;
  return (
    <p className="mt-2 text-cap text-ink-2">Uncertainty of the trip point {millivolts.toFixed(1)} mV, about 95 %.</p>
  );
}
