'use client';

import Link from 'next/link';
import { useSay } from '@/components/bench/use-say';
import { Button, ButtonLink } from '@/components/ui/button';
import { LotRule } from '@/components/ui/lot-rule';
import { SerialStrip } from '@/components/ui/serial-strip';
import { TrialMark } from '@/components/ui/trial-mark';
import type { StationRow } from '@/lib/contracts/station-overview';
import { Waiting } from '../call-banner';
import { count } from '../numbers';
import { rejectWords } from '../words';
import { StateShape } from './state-shape';
import { stationStateWords } from './station-words';

interface StationLineProps {
  station: StationRow;
  /** Null: this person may not answer calls. */
  onCome: ((station: StationRow) => void) | null;
  busy: boolean;
}

/** One bench: number, shape, state and reason with its time, board and operator, lot rule, one action. */
export function StationLine({ station, onCome, busy }: StationLineProps) {
  const { state, lot, serial, operatorNumber } = station;
  const calls = state === 'calls';
  const page = `/stations/${encodeURIComponent(station.code)}`;
  return (
    <li
      className={`grid grid-cols-[48px_40px_minmax(0,1fr)] items-center gap-x-4 gap-y-2 border-b border-hair py-5 max-sm:[&>:nth-child(n+4)]:col-span-full sm:gap-x-6 sm:grid-cols-[64px_44px_minmax(0,5fr)_minmax(0,4fr)_minmax(0,8fr)_140px] ${calls ? 'sw-hold -mx-12 !px-12 max-sm:-mx-[18px] max-sm:!pr-[18px] max-sm:!pl-8' : ''}`}
    >
      <Link href={page} className="text-[44px] leading-none font-bold hover:text-accent max-sm:text-[28px]">
        {station.code}
      </Link>
      <StateShape state={state} />
      <div className="min-w-0">
        <h2 className={`text-[21px] leading-tight font-bold ${state === 'waits-for-bin' ? 'text-reject' : ''}`}>
          {stationStateWords[state]}
        </h2>
        <StateReason station={station} />
        <TrialNote station={station} />
      </div>
      <div className="min-w-0">
        {serial && station.engineering ? (
          <span className="text-[20px]">
            <SerialStrip serial={serial} />
          </span>
        ) : serial ? (
          <Link href={`/units/${encodeURIComponent(serial)}`} className="text-[20px] hover:text-accent">
            <SerialStrip serial={serial} boardTypeCode={lot?.boardTypeCode} />
          </Link>
        ) : (
          <span aria-hidden="true" className="font-num text-[20px] tracking-[0.5em] text-ink-3">
            –––––
          </span>
        )}
        <p>
          {operatorNumber ? (
            <>
              operator <b>{operatorNumber}</b>
            </>
          ) : (
            'nobody signed in'
          )}
        </p>
      </div>
      <div className="min-w-0">
        {lot ? (
          <>
            <p className="mb-1 flex flex-wrap gap-x-4">
              <span>
                Lot{' '}
                <Link className="sw-link font-num" href={`/lots/${encodeURIComponent(lot.code)}`}>
                  {lot.code}
                </Link>
              </span>
              <span>
                <b>{count(lot.tested)}</b> of <b>{count(lot.size)}</b>
              </span>
              <span className="font-num">{lot.boardTypeCode}</span>
            </p>
            <LotRule
              marks={lot.marks}
              width={640}
              label={`${lot.tested} of ${lot.size} boards tested, ${lot.rejected} rejected`}
            />
          </>
        ) : (
          <p className="text-ink-2">no lot yet</p>
        )}
      </div>
      <div className="sm:text-right">
        {calls && onCome ? (
          <Button kind="filled" pending={busy ? 'Telling the bench' : null} onClick={() => onCome(station)}>
            I am coming
          </Button>
        ) : state === 'may-not-test' ? (
          <ButtonLink href={page}>See why</ButtonLink>
        ) : (
          <Link className="sw-link" href={`/bench/${encodeURIComponent(station.code)}`}>
            Watch
          </Link>
        )}
      </div>
    </li>
  );
}

/** An engineering run is on it, or a draft waits there for somebody to try it. */
export function TrialNote({ station: { engineering, offer } }: { station: StationRow }) {
  if (!engineering && !offer) return null;
  return (
    <p className="mt-0.5 flex items-center gap-2">
      <TrialMark size={18} />
      <span>
        {engineering ? <b>Engineering run, not production. </b> : null}
        {offer ? `Draft r${offer.revisionNumber} of ${offer.sequenceName} on offer from ${offer.offeredByName}.` : ''}
      </span>
    </p>
  );
}

function StateReason({ station }: { station: StationRow }) {
  const say = useSay();
  const { state, sinceIso, reasons, rejectReason, operatorNumber } = station;
  const parts = [
    sinceIso ? (
      <span key="since">
        for <Waiting sinceIso={sinceIso} />
      </span>
    ) : null,
    state === 'may-not-test' ? <span key="why">{reasons.map(say).join(' ')}</span> : null,
    state === 'waits-for-bin' && rejectReason ? <span key="reject">{rejectWords[rejectReason]}</span> : null,
    state === 'idle' && operatorNumber ? <span key="who">operator {operatorNumber} signed in</span> : null,
  ].filter((part) => part !== null);
  return (
    <p className="text-ink-2">
      {parts.map((part, i) => (
        <span key={i}>
          {i > 0 ? ', ' : ''}
          {part}
        </span>
      ))}
    </p>
  );
}
