import { type Pair, assumedMass } from './assumptions';
import type { Belief } from './belief';
import { atBottom, atTop, decide } from './decide';
import { freshCheck, observeCheck } from './end-check';
import { believeSides, fitSides, gridsOf } from './fit-sides';
import { type Probe, absorbProbe, flatPosterior } from './grid-posterior';
import { levelRanges, wideWindow } from './level-ranges';
import { type MoveValue, valueMove } from './move-value';
import { overshootPrior } from './overshoot-range';
import type { SearchState, Side } from './state';
import { beginSupplyModel, learnSupplyLevel } from './supply-level';
import type { OutputState, PointEstimate, SearchCommand, SearchObservation, SearchSettings } from './types';
import { windowOver } from './window';

export type { SearchState } from './state';

/** An outcome less likely than this means that the fine window lost the threshold. */
const surprising = 0.015;

const pointOf = (belief: Belief, sign: number): PointEstimate => ({
  volts: sign * belief.mean,
  standardUncertaintyVolts: belief.sd,
});

/** Completes a state whose outcomes are in: windows and assumptions that fit them, estimates and the next command. */
function complete(state: SearchState, lost: Pair<boolean>): SearchState {
  const { sides, assumptions, beliefs } = fitSides(state, lost);
  const estimates = { trip: pointOf(beliefs.trip, 1), release: pointOf(beliefs.release, -1) };
  const fitted = { ...state, sides, assumptions, estimates };
  return { ...fitted, ...decide(fitted, beliefs) };
}

/**
 * The joint threshold search. Trip is only found from the ON side, falling, and release from the OFF side, rising; so the
 * supply alternates, and every command is chosen for the most information per settle (greedy maximisation of mutual
 * information, the Bayesian form of probabilistic bisection), waypoints and the way back included.
 *
 * - Each threshold has a posterior of its own on a grid, by overshoot as a nuisance parameter (`grid-posterior.ts`).
 * - A large step toward an armed threshold undershoots and trips falsely: 5 % of 1 V is 50 mV. Waypoints are therefore
 *   part of the plan (`plan-move.ts`); without regard to overshoot bisection misjudges nearly every board.
 * - Ranges, coupling and lot prior only speed it up and are dropped on evidence (`level-drop.ts`).
 * - The meter's reading is the value; the supply's own errors are learnt on the way (`supply-level.ts`).
 * - A result is told only after its end check (`end-check.ts`).
 *
 * Bounds (own study, simulation): telling 3000 x 1300 cells of 1 mV takes 21.9 settles of one bit; with 1 mV of noise an
 * ideal supply needs 30 settles for 0.5 mV.
 *
 * Begins a search from where the supply stands. `start.volts` is the meter's reading at the board, or the setpoint
 * when there is none; `start.output` the output's state there.
 */
export function beginSearch(settings: SearchSettings, start: { volts: number; output: OutputState }): SearchState {
  const overshoot = overshootPrior(settings.overshoot);
  const wide = wideWindow(settings);
  const ranges = levelRanges(settings, 0);
  const side = (name: 'trip' | 'release'): Side => ({
    wide: flatPosterior(wide[name], overshoot),
    fine: flatPosterior(windowOver(ranges[name].low, ranges[name].high, settings.noiseVolts), overshoot),
    history: [],
  });
  const sides = { trip: side('trip'), release: side('release') };
  const nowhere = { volts: Number.NaN, standardUncertaintyVolts: Infinity };
  const state: SearchState = {
    settings,
    supply: beginSupplyModel(settings.supplyMinVolts, settings.supplyMaxVolts),
    level: start.volts,
    lastReading: null,
    output: start.output,
    sides,
    assumptions: 0,
    overshoot,
    unseenMass: assumedMass(settings, 0, gridsOf(sides, 'wide')),
    counts: { settles: 0, waypoints: 0, endCheckSettles: 0 },
    settlesAtTop: 0,
    settlesAtBottom: 0,
    check: freshCheck(0),
    estimates: { trip: nowhere, release: nowhere },
    command: { kind: 'apply', volts: start.volts, dwell: 'settle' },
  };
  return complete(state, { trip: false, release: false });
}

/** The next command; the same one until its outcome is observed. */
export const nextSearchCommand = (state: SearchState): SearchCommand => state.command;

const outcome: MoveValue = { flipChance: 0, information: 0 };

/** The state after the pending command was applied and `seen` was read. A finished search stays as it is. */
export function observeSearch(state: SearchState, seen: SearchObservation): SearchState {
  const { command, settings, sides } = state;
  if (command.kind === 'finished') return state;
  const armed = state.output === 'on' ? 'trip' : 'release';
  const sign = armed === 'trip' ? 1 : -1;
  // The last reading still held some ring of its step; where none was taken since, the supply went on to its level.
  const before = seen.voltsBefore === state.lastReading ? state.level : seen.voltsBefore;
  const learnt = learnSupplyLevel(state.supply, {
    setpoint: command.volts,
    before,
    reading: seen.volts,
    dwell: command.dwell,
  });
  const flipped = seen.output !== state.output;
  const probe: Probe = {
    from: sign * before,
    to: sign * learnt.level,
    flipped,
    extraVariance: learnt.extraVariance,
  };

  const believed = believeSides(settings, state.assumptions, sides)[armed];
  valueMove(believed, probe.from, probe.to, Math.hypot(settings.noiseVolts, Math.sqrt(probe.extraVariance)), outcome);
  const predicted = flipped ? outcome.flipChance : 1 - outcome.flipChance;

  const side = sides[armed];
  const history = [...side.history, probe];
  const updated: Side = {
    wide: absorbProbe(side.wide, probe, settings.noiseVolts),
    fine: absorbProbe(side.fine, probe, settings.noiseVolts),
    history,
  };
  const checking = state.check.expected !== null;
  const isSettle = command.dwell === 'settle';
  const next: SearchState = {
    ...state,
    supply: learnt.model,
    level: learnt.level,
    lastReading: seen.volts,
    output: seen.output,
    sides: { ...sides, [armed]: updated },
    counts: {
      settles: state.counts.settles + (checking ? 0 : 1),
      waypoints: state.counts.waypoints + (checking || isSettle ? 0 : 1),
      endCheckSettles: state.counts.endCheckSettles + (checking ? 1 : 0),
    },
    settlesAtTop: seen.output === 'on' ? 0 : state.settlesAtTop + (isSettle && atTop(state, learnt.level) ? 1 : 0),
    settlesAtBottom: isSettle && seen.output === 'on' && atBottom(state, command.volts) ? 1 : 0,
    check: observeCheck(state.check, armed, flipped),
  };
  const surprised = predicted < surprising;
  return complete(next, { trip: surprised && armed === 'trip', release: surprised && armed === 'release' });
}
