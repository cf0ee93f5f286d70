import type { BenchReading, RailFlag, RailsView } from '@/lib/contracts/bench-view';
import type { TrimView } from '@/lib/trim/types';
import type { RailsInside } from '@/lib/rails/inside-blocks';

/** The held supply as a reading that stands still. */
export function heldReading(trim: TrimView): BenchReading | null {
  return trim.heldVolts === null ? null : { volts: trim.heldVolts, output: null, rail: 'falling' };
}

/** What a trim adds between the rails: the held supply and how far the trip point still is from its target. */
export function trimInside(trim: TrimView): Partial<RailsInside> {
  const from = trim.liveTripVolts ?? trim.lastTripVolts;
  return { heldVolts: trim.heldVolts, shiftVolts: from === null ? null : trim.targetVolts - from };
}

/** Two values that would be printed alike. Volts. */
const alike = (a: number, b: number) => Math.abs(a - b) < 0.005;

/**
 * The rails of a run while it is trimmed: the trip point as it is known now, solid while it is true and hollow once the screw
 * moved, over those of before. No hysteresis: the release point of before is not of this setting.
 */
export function trimRails(rails: RailsView, trim: TrimView): RailsView {
  const { liveTripVolts, lastTripVolts, lastTripIsStale } = trim;
  const volts = liveTripVolts ?? lastTripVolts;
  const before = rails.flags
    .filter((flag) => flag.side === 'release' || volts === null || !alike(flag.volts, volts))
    .map((flag): RailFlag => ({
      ...flag,
      hollow: true,
      note: volts === null && flag.side === 'trip' ? 'before' : null,
    }));
  const now = volts === null ? [] : [tripNow(rails, trim, volts, liveTripVolts === null && lastTripIsStale)];
  return { ...rails, flags: [...before, ...now], hysteresisVolts: null };
}

/** The last trip point was measured after the first beep, and not before the trim. */
export function isAfterBeep1({ flags }: RailsView, { stage, lastTripVolts }: TrimView): boolean {
  if (stage !== 'beep-2' || lastTripVolts === null) return false;
  return !flags.some((flag) => flag.side === 'trip' && alike(flag.volts, lastTripVolts));
}

function tripNow(rails: RailsView, trim: TrimView, volts: number, stale: boolean): RailFlag {
  if (stale) return { side: 'trip', volts, hollow: true, note: isAfterBeep1(rails, trim) ? 'after-beep-1' : 'before' };
  if (trim.finding === 'no-effect') return { side: 'trip', volts, hollow: false, note: 'no-change' };
  const limits = rails.tripLimits;
  const note = !limits ? null : volts < limits.min ? 'too-low' : volts > limits.max ? 'too-high' : null;
  return { side: 'trip', volts, hollow: false, note };
}
