import { boardTypeSchema } from '@/lib/contracts/board-type';
import type { Measurement, RejectReason } from '@/lib/run/types';
import { judgeValue } from '@/lib/decision/judge-value';
import { normalQuantile } from '@/lib/statistics/distributions/normal-quantile';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { cb1210 } from './board-types';

/** One attempt of an invented board: what a station would have measured, and what follows from it. */
export interface DemoAttempt {
  verdict: 'pass' | 'reject';
  rejectReason: RejectReason | null;
  measurements: Measurement[];
  trimRounds: number;
  turnsAdvised: number;
  seconds: number;
}

export interface DemoBoard {
  /** Place in the lot and in test order, from 1. */
  place: number;
  station: 'S1' | 'S2';
  /** Oldest first; a second one follows a rework. */
  attempts: DemoAttempt[];
}

export const driftingBoards = 240;
/** From here on station 2 tests alone, and ten boards later its trip points rise. */
const aloneFrom = 191;
const driftFrom = 201;

const { limits } = boardTypeSchema.parse(cb1210);

/** Boards that fail, by place: at find, at trim, or with a value beyond trimming. */
const failing: Record<number, { reason: RejectReason; reworked: boolean; hysteresisVolts?: number }> = {
  9: { reason: 'never-on', reworked: true },
  20: { reason: 'output-chatters', reworked: true },
  22: { reason: 'release-too-high', reworked: false, hysteresisVolts: 1.742 },
  27: { reason: 'trim-no-effect', reworked: true },
  38: { reason: 'release-too-high', reworked: false, hysteresisVolts: 1.728 },
  42: { reason: 'never-on', reworked: true },
  63: { reason: 'trim-cannot-reach', reworked: true },
  65: { reason: 'trim-cannot-reach', reworked: false },
  89: { reason: 'never-off', reworked: false },
  100: { reason: 'ride-through', reworked: true },
  104: { reason: 'reference-out-of-limits', reworked: true },
  122: { reason: 'release-too-high', reworked: false, hysteresisVolts: 1.757 },
  136: { reason: 'output-chatters', reworked: true },
  152: { reason: 'trim-cannot-reach', reworked: false },
  159: { reason: 'trim-no-effect', reworked: true },
  177: { reason: 'release-too-high', reworked: false, hysteresisVolts: 1.858 },
  184: { reason: 'hysteresis-too-small', reworked: false, hysteresisVolts: 1.118 },
  199: { reason: 'never-on', reworked: true },
  206: { reason: 'release-too-high', reworked: false, hysteresisVolts: 1.739 },
  215: { reason: 'never-off', reworked: false },
  228: { reason: 'trim-cannot-reach', reworked: false },
  229: { reason: 'ride-through', reworked: true },
  232: { reason: 'trim-no-effect', reworked: true },
};

const beforeTrim: readonly RejectReason[] = ['never-on', 'never-off', 'output-chatters', 'reference-out-of-limits'];
/** U near the points: two and a bit standard uncertainties of a 6½-digit multimeter, and the repeats. */
const standardUncertainty = 0.002;
const expandedUncertainty = 0.0041;

/** The boards of a finished lot whose trip points rise from board 201 on. The same numbers every time. */
export function drawDriftingBoards(seed = 34): DemoBoard[] {
  const uniform = wichmannHill(seed);
  const normal = (mean: number, sigma: number) => mean + sigma * normalQuantile(uniform() || 0.5);
  return Array.from({ length: driftingBoards }, (_, i): DemoBoard => {
    const place = i + 1;
    const fault = failing[place];
    const first = drawAttempt(place, normal, fault);
    const again = fault?.reworked ? [drawAttempt(place, normal)] : [];
    return { place, station: place >= aloneFrom || place % 2 === 0 ? 'S2' : 'S1', attempts: [first, ...again] };
  });
}

type Normal = (mean: number, sigma: number) => number;

function drawAttempt(place: number, normal: Normal, fault?: (typeof failing)[number]): DemoAttempt {
  const drift = place < driftFrom ? 0 : 0.028 + 0.0007 * (place - driftFrom);
  const foundTrip = Math.min(12.3, Math.max(8.7, normal(10.4, 0.7)));
  const hysteresis = fault?.hysteresisVolts ?? normal(1.49, 0.033);
  const trip = normal(10.796, 0.017) + drift;
  const rounds = normal(0, 1) > 0.9 ? 2 : 1;
  const ends = fault && beforeTrim.includes(fault.reason) ? 'find' : fault?.reason.startsWith('trim-') ? 'trim' : null;
  const measurements: Measurement[] = [
    check('contact-milliohms', normal(180, 30), { min: null, max: 5_000 }, 0),
    check(
      'reference-volts',
      normal(5.02, 0.03) - (fault?.reason === 'reference-out-of-limits' ? 0.6 : 0),
      limits.referenceVolts,
      2,
    ),
  ];
  const turns = Math.abs(10.8 - foundTrip) / 0.16;
  if (ends !== 'find') measurements.push(...points('found', foundTrip, hysteresis, 3));
  if (ends === null) {
    measurements.push(
      ...points('verified', trip, hysteresis, 6),
      { ...check('trip-spread-volts', Math.abs(normal(0.002, 0.001)), { min: null, max: 0.01 }, 6), phase: 'verified' },
      check('output-high-drop-volts', normal(1.31, 0.05), { min: null, max: limits.outputHighDropVolts.max }, 7),
      check('output-low-volts', normal(0.06, 0.01), { min: null, max: limits.outputLowVolts.max }, 7),
      check('quiescent-amps', normal(0.0056, 0.0003), { min: null, max: limits.quiescentAmps.max }, 8),
      check(
        'ride-through-seconds',
        fault?.reason === 'ride-through' ? 0.002 : 0.01,
        { min: limits.rideThroughSeconds.min, max: null },
        9,
      ),
    );
  }
  const failed = measurements.find((measurement) => measurement.phase === 'verified' && measurement.passed === false);
  const reason = fault?.reason ?? (failed ? reasonOf(failed) : null);
  const trimmed = ends !== 'find' && fault?.reason !== 'trim-cannot-reach';
  return {
    verdict: reason ? 'reject' : 'pass',
    rejectReason: reason,
    measurements,
    trimRounds: trimmed ? rounds : 0,
    turnsAdvised: trimmed ? turns : 0,
    seconds: Math.max(4, ends === 'find' ? normal(7, 1) : 17 + 1.2 * Math.min(turns, 12) + 4 * rounds + normal(0, 1.5)),
  };
}

/** Board values drift only upward here. */
const reasonOf = ({ quantity }: Measurement): RejectReason =>
  quantity === 'hysteresis-volts'
    ? 'hysteresis-too-large'
    : quantity === 'trip-volts'
      ? 'trip-too-high'
      : 'release-too-high';

function points(phase: 'found' | 'verified', trip: number, hysteresis: number, stepIndex: number): Measurement[] {
  const of = [
    ['trip-volts', trip, limits.tripVolts],
    ['release-volts', trip + hysteresis, limits.releaseVolts],
    ['hysteresis-volts', hysteresis, limits.hysteresisVolts],
  ] as const;
  return of.map(([quantity, value, { min, max }]) => {
    const judged = judgeValue(value, { min, max }, expandedUncertainty, { kind: 'guard-band', factor: 1 });
    return {
      quantity,
      phase,
      value,
      standardUncertainty,
      expandedUncertainty,
      min,
      max,
      guardedMin: judged.guardedMin,
      guardedMax: judged.guardedMax,
      passed: phase === 'verified' ? judged.passed : null,
      stepIndex,
      settles: phase === 'verified' ? 60 : 25,
    };
  });
}

function check(
  quantity: Measurement['quantity'],
  value: number,
  { min, max }: { min: number | null; max: number | null },
  stepIndex: number,
): Measurement {
  return {
    quantity,
    phase: 'check',
    value,
    standardUncertainty: null,
    expandedUncertainty: null,
    min,
    max,
    guardedMin: min,
    guardedMax: max,
    passed: (min === null || value >= min) && (max === null || value <= max),
    stepIndex,
    settles: null,
  };
}
