import type { Level, Pair } from './assumptions';
import type { Window } from './grid-posterior';
import type { SearchSettings } from './types';

const wideCells = 200;
/** The wide grids reach past the supply's range, where a threshold that no command can reach gathers its mass. */
const beyondVolts = 0.1;

interface Range {
  low: number;
  high: number;
}

/** The whole range of each threshold in fall coordinates. */
export function wideWindow({ supplyMinVolts, supplyMaxVolts }: SearchSettings): Pair<Window> {
  const cell = (supplyMaxVolts - supplyMinVolts + 2 * beyondVolts) / wideCells;
  return {
    trip: { low: supplyMinVolts - beyondVolts, cell, cells: wideCells },
    release: { low: -supplyMaxVolts - beyondVolts, cell, cells: wideCells },
  };
}

/** Where each threshold may lie at a level of assumptions, in fall coordinates. */
export function levelRanges(settings: SearchSettings, level: Level): Pair<Range> {
  const lowest = settings.supplyMinVolts - beyondVolts;
  const highest = settings.supplyMaxVolts + beyondVolts;
  const whole = { trip: { low: lowest, high: highest }, release: { low: -highest, high: -lowest } };
  if (level > 0) return whole;
  const { prior } = settings;
  const trip = prior
    ? { low: prior.tripMeanVolts - 4.5 * prior.tripSdVolts, high: prior.tripMeanVolts + 4.5 * prior.tripSdVolts }
    : { low: settings.tripMinVolts, high: settings.tripMaxVolts };
  const hysteresis = prior
    ? {
        low: prior.hysteresisMeanVolts - 5 * prior.hysteresisSdVolts,
        high: prior.hysteresisMeanVolts + 5 * prior.hysteresisSdVolts,
      }
    : { low: settings.hysteresisMinVolts, high: settings.hysteresisMaxVolts };
  const clip = (low: number, high: number, within: Range): Range => {
    const range = { low: Math.max(low, within.low), high: Math.min(high, within.high) };
    return range.high - range.low > 0.01 ? range : within;
  };
  return {
    trip: clip(trip.low, trip.high, whole.trip),
    release: clip(-trip.high - hysteresis.high, -trip.low - hysteresis.low, whole.release),
  };
}
