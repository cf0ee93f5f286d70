'use client';

import { useState } from 'react';
import { createReadingStore } from '@/components/bench/live/reading-store';
import { Rails } from '@/components/bench/rails/rails';
import type { RailFlag, RailsView } from '@/lib/contracts/bench-view';
import type { UnitPage, UnitRun } from '@/lib/contracts/unit-page';
import { English } from '../english';

type Measured = { trip: number; release: number };

const marginVolts = 1;
const half = (volts: number) => Math.round(volts * 2) / 2;

/** What a run measured last, and what it found before its trim. */
function pointsOf(run: UnitRun | undefined, phases: string[]): Measured | null {
  const last = (quantity: string) =>
    run?.measurements.findLast((m) => m.quantity === quantity && phases.includes(m.phase))?.value ?? null;
  const [trip, release] = [last('trip-volts'), last('release-volts')];
  return trip === null || release === null ? null : { trip, release };
}

/** The rails of a board: solid what its newest judged run measured, hollow the attempt before or what was found before the trim. */
export function railsOfUnit(unit: UnitPage): { rails: RailsView; hollowIs: string | null } | null {
  const judged = unit.runs.filter((run) => run.kind === 'production' && run.limits && run.verdict !== null);
  const newest = judged.find((run) => run.verdict !== 'no-verdict') ?? judged[0];
  if (!newest?.limits) return null;
  const solid = pointsOf(newest, ['verified']) ?? pointsOf(newest, ['trimmed']) ?? pointsOf(newest, ['found']);
  const earlier = judged.find((run) => run !== newest && run.attempt < newest.attempt);
  const before = pointsOf(earlier, ['verified', 'trimmed', 'found']);
  const found = pointsOf(newest, ['found']);
  const hollow = before ?? (solid && found && found.trip !== solid.trip ? found : null);
  const { tripVolts, releaseVolts } = newest.limits;
  const guarded = (quantity: string) =>
    newest.measurements.findLast((m) => m.quantity === quantity && m.phase === 'verified') ?? null;
  const [tripGuard, releaseGuard] = [guarded('trip-volts'), guarded('release-volts')];
  const note = (volts: number, { min, max }: { min: number; max: number }) =>
    volts < min ? 'too-low' : volts > max ? 'too-high' : null;
  const flags: RailFlag[] = [
    ...(hollow
      ? ([
          { side: 'trip', volts: hollow.trip, hollow: true, note: null },
          { side: 'release', volts: hollow.release, hollow: true, note: null },
        ] satisfies RailFlag[])
      : []),
    ...(solid
      ? ([
          { side: 'trip', volts: solid.trip, hollow: false, note: note(solid.trip, tripVolts) },
          { side: 'release', volts: solid.release, hollow: false, note: note(solid.release, releaseVolts) },
        ] satisfies RailFlag[])
      : []),
  ];
  const scaleMinVolts = half(tripVolts.min - marginVolts);
  return {
    hollowIs: !hollow ? null : before ? `hollow: attempt ${earlier!.attempt}` : 'hollow: before the trim',
    rails: {
      scaleMinVolts,
      scaleMaxVolts: half(releaseVolts.max + marginVolts),
      tripLimits: tripVolts,
      releaseLimits: releaseVolts,
      guardVolts:
        tripGuard?.guardedMin != null &&
        tripGuard.guardedMax !== null &&
        releaseGuard?.guardedMin != null &&
        releaseGuard.guardedMax !== null
          ? {
              tripMin: tripGuard.guardedMin,
              tripMax: tripGuard.guardedMax,
              releaseMin: releaseGuard.guardedMin,
              releaseMax: releaseGuard.guardedMax,
            }
          : null,
      targetVolts: null,
      flags,
      travelled: {
        fallingOnToVolts: solid?.trip ?? null,
        fallingOffToVolts: solid ? scaleMinVolts : null,
        risingOffToVolts: solid?.release ?? null,
        risingOn: solid !== null,
      },
      hysteresisVolts: solid ? solid.release - solid.trip : null,
    },
  };
}

export function UnitRails({ unit }: { unit: UnitPage }) {
  const [readings] = useState(createReadingStore);
  const drawn = railsOfUnit(unit);
  if (!drawn) return null;
  return (
    <English>
      <Rails rails={drawn.rails} readings={readings} />
      {drawn.hollowIs ? <p className="text-center text-cap text-ink-2">{drawn.hollowIs}</p> : null}
    </English>
  );
}
