import type { Pair } from './assumptions';
import type { Belief } from './belief';
import { type EndCheck, checkIsComplete, guardVolts, mostFailedChecks, planCheck } from './end-check';
import { type Move, planMove } from './plan-move';
import type { SearchState } from './state';
import { allowedSetpoint, highestLevel } from './supply-range';
import type { PointEstimate, SearchCommand, SearchResult } from './types';

/** A supply this near its lowest or highest level can go no further. */
const endVolts = 0.02;
const settlesForStuckOff = 2;

const estimated = (point: PointEstimate) => (point.standardUncertaintyVolts < 0.02 ? point : null);

function conclude(state: SearchState): SearchResult {
  const { trip, release } = state.estimates;
  const { noiseVolts } = state.settings;
  const steady = release.volts - trip.volts >= 4 * noiseVolts + 2e-3;
  return { kind: steady ? 'found' : 'chatter', trip, release, ...state.counts };
}

const unresolved = (state: SearchState): SearchResult => ({
  kind: 'unresolved',
  trip: estimated(state.estimates.trip),
  release: estimated(state.estimates.release),
  ...state.counts,
});

/** What to do next, from the state and the beliefs it implies: an exit, a check move, or the most telling move. */
export function decide(state: SearchState, beliefs: Pair<Belief>): { command: SearchCommand; check: EndCheck } {
  const { settings, supply, check, estimates, counts } = state;
  const noise = settings.noiseVolts;
  const wanted = settings.wantedUncertaintyVolts;
  const armed = state.output === 'on' ? 'trip' : 'release';
  const sign = armed === 'trip' ? 1 : -1;
  const from = sign * state.level;
  const top = highestLevel(settings, supply, state.level);
  const lowest = sign > 0 ? settings.supplyMinVolts : -top;
  const highest = sign > 0 ? top : -settings.supplyMinVolts;

  const finish = (result: SearchResult) => ({ command: { kind: 'finished' as const, result }, check });
  const apply = (move: Move, next: EndCheck) => {
    const volts = allowedSetpoint(settings, supply, state.level, sign * move.to);
    return { command: { kind: 'apply' as const, volts, dwell: move.dwell }, check: next };
  };

  if (state.settlesAtBottom > 0) return finish({ kind: 'stuck-on', ...counts });
  if (state.settlesAtTop >= settlesForStuckOff) return finish({ kind: 'stuck-off', ...counts });

  const own = beliefs[armed];
  const beyondReach = own.mean < (sign > 0 ? settings.supplyMinVolts : -settings.supplyMaxVolts) + endVolts / 2;
  if (beyondReach) return apply({ to: lowest, dwell: 'settle' }, { ...check, expected: null });

  const sds = { trip: estimates.trip.standardUncertaintyVolts, release: estimates.release.standardUncertaintyVolts };
  const spent = counts.settles >= settings.mostSettles;
  const enough = (sd: number) => sd <= (spent ? 2 * wanted : wanted);
  const other = armed === 'trip' ? 'release' : 'trip';
  if (check.failures >= mostFailedChecks) return finish(unresolved(state));
  if (enough(sds.trip) && enough(sds.release)) {
    if (!settings.endCheck || checkIsComplete(check)) return finish(conclude(state));
    const guard = guardVolts(estimates[armed], noise);
    const planned = planCheck(check, armed, from, own.mean, guard);
    return apply(planned.move, planned.check);
  }
  if (spent) return finish(unresolved(state));
  const searching = { ...check, expected: null };
  if (enough(sds[armed])) {
    const beyond = own.mean - 4 * own.sd - 4 * noise - 4e-3;
    return apply({ to: Math.max(lowest, beyond), dwell: 'settle' }, searching);
  }
  return apply(planMove(own, from, { lowest, highest }, noise, enough(sds[other])), searching);
}

/** Whether a settle at `level` was at the end of the supply's range. */
export const atTop = (state: SearchState, level: number) =>
  level >= highestLevel(state.settings, state.supply, level) - endVolts;
export const atBottom = (state: SearchState, setpoint: number) => setpoint <= state.settings.supplyMinVolts + endVolts;
