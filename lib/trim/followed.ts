import type { OutputState } from '../search/types';
import { releaseFor, supplyLimits } from './beep-watch';
import { adviseLive, beginGuide, foundScrew, guide, type LiveGuide } from './live-guide';
import { prompt } from './prompts';
import { nearTarget, type TrimState } from './state';
import { armOnThenHold, moveWithoutPassing } from './supply-path';
import { beginTracker, track, trackedRelease, type Tracker } from './tracker';
import type { TrimCommand, TrimObservation } from './types';
import { askVerify, judgeVerify, relearn } from './verify';

/** Prompted on a fast link: look by look the tracker follows the trip point, and the dial counts down with it. */
export type FollowedPhase =
  | { kind: 'followed'; step: 'arm' }
  | { kind: 'followed'; step: 'look'; tracker: Tracker; guide: LiveGuide; stand: Stand }
  | { kind: 'followed'; step: 'verify' };
/** Where the last look left the supply and the output, and the hysteresis there. */
interface Stand {
  output: OutputState;
  volts: number;
  hysteresisVolts: number;
}
type Looking = Extract<FollowedPhase, { step: 'look' }>;

/** The first look comes from this far above the trip point, output on. */
const aboveVolts = 0.03;
/** A rest makes precise looks worth their waypoints. */
const restingShare = 0.5;
/** Share that still moves when the screw is taken for stopped. */
const stoppedShare = 0.2;
const wideMoveVolts = 0.02;

export function beginFollowed(state: TrimState): TrimState {
  const { volts } = state.trip;
  const path = armOnThenHold(
    state.supplyVolts,
    releaseFor(state, volts) + 0.05,
    volts + aboveVolts,
    supplyLimits(state),
  );
  return { ...state, phase: { kind: 'followed', step: 'arm' }, command: { kind: 'hold', ...path } };
}

export function observeFollowed(state: TrimState, phase: FollowedPhase, seen: TrimObservation): TrimState {
  if (phase.step === 'verify') return seen.kind === 'searched' ? judgeVerify(state, seen.result, again) : state;
  if (phase.step === 'arm') return seen.kind === 'held' ? promptTurn(state, seen) : state;
  if (seen.kind === 'screw-found') {
    const found = foundScrew(state, phase.guide);
    return { ...found.state, phase: { ...phase, guide: found.guide } };
  }
  return seen.kind === 'probed' || seen.kind === 'held' ? looked(state, phase, seen) : state;
}

const again = (state: TrimState) => beginFollowed(relearn(state));

function promptTurn(state: TrimState, seen: { volts: number; output: OutputState }): TrimState {
  const { volts, standardUncertaintyVolts } = state.trip;
  const guiding = beginGuide(state, volts);
  const prompted = prompt(state, 'turn', adviseLive(state, guiding, volts));
  if (prompted.phase.kind === 'over') return prompted;
  const tracker = beginTracker(volts, Math.max(0.001, standardUncertaintyVolts), 0.003, state.atMs);
  return look(prompted, {
    kind: 'followed',
    step: 'look',
    tracker,
    guide: guiding,
    stand: { output: seen.output, volts: seen.volts, hysteresisVolts: releaseFor(state, volts) - volts },
  });
}

/** The next look is where the output flips as likely as not. */
function look(state: TrimState, phase: Looking): TrimState {
  const { stand } = phase;
  const { volts: trip, movingShare } = phase.tracker.trip;
  const at = stand.output === 'on' ? trip : trackedRelease(phase.tracker, stand.hysteresisVolts);
  const limits = supplyLimits(state);
  const step = at - stand.volts;
  const precise = Math.abs(step) > wideMoveVolts && movingShare < restingShare;
  const path = moveWithoutPassing(stand.volts, at, limits);
  // Waypoints also where a single step would peak above the absolute maximum.
  const command: TrimCommand =
    precise || at + limits.overshoot * step > limits.maxVolts
      ? { kind: 'hold', ...path }
      : { kind: 'probe', volts: path.volts };
  return { ...state, phase, command };
}

function looked(state: TrimState, phase: Looking, seen: { volts: number; output: OutputState }): TrimState {
  const { settings, pace, command } = state;
  const last = command.kind === 'hold' ? command.waypointsVolts.at(-1) : undefined;
  const { stand } = phase;
  const tracker = track(
    phase.tracker,
    {
      briskVoltsPerSecond: pace.voltsPerTurn * pace.briskTurnsPerSecond,
      askedSign: (state.advice?.raises ?? true) ? 1 : -1,
      noiseVolts: settings.noiseVolts,
      overshoot: settings.overshoot,
      hysteresisVolts: stand.hysteresisVolts,
    },
    {
      fromVolts: last ?? stand.volts,
      volts: seen.volts,
      before: stand.output,
      after: seen.output,
      atMs: state.atMs,
    },
  );
  const { volts, sdVolts, movingShare } = tracker.trip;
  const guided = guide(state, phase.guide, { volts, sdVolts, quiet: movingShare < stoppedShare });
  if (guided.state.phase.kind === 'over') return guided.state;
  if (guided.stopped) {
    const stopped: TrimState = { ...guided.state, stage: 'stop-turning', phase: { kind: 'followed', step: 'verify' } };
    return askVerify(stopped, { ...nearTarget(state), tripMeanVolts: volts });
  }
  // Only looks from the off side need the hysteresis where the point is now.
  const hysteresisVolts = seen.output === 'off' ? releaseFor(state, volts) - volts : stand.hysteresisVolts;
  const next: Looking = {
    ...phase,
    tracker,
    guide: guided.guide,
    stand: { output: seen.output, volts: seen.volts, hysteresisVolts },
  };
  return look(guided.state, next);
}
