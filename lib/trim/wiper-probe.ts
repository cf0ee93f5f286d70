import { wiperConductances } from '../circuit/divider';
import { releaseFor, supplyLimits } from './beep-watch';
import { designOf } from './board-estimate';
import { nodeAt, wiperFor } from './board-model';
import { adviseLive, beginGuide, foundScrew, guide, type LiveGuide } from './live-guide';
import { prompt } from './prompts';
import { nearTarget, type TrimState } from './state';
import { armOnThenHold } from './supply-path';
import type { TrimObservation } from './types';
import { askVerify, judgeVerify, relearn } from './verify';

/**
 * By the wiper probe (channel 104): the wiper's share of the supply tells the trip point at any moment while the output is
 * on. The measured trip point calibrates it while the screw rests, before each prompt.
 */
export type ProbedPhase =
  | { kind: 'probed'; step: 'arm'; scale: WiperScale | null; guide: LiveGuide | null }
  | { kind: 'probed'; step: 'calibrate'; shares: number[] }
  | { kind: 'probed'; step: 'read'; scale: WiperScale; guide: LiveGuide }
  | { kind: 'probed'; step: 'verify' };

/** At rest the board tripped at `tripVolts` while the wiper stood at `share` of the supply. */
interface WiperScale {
  tripVolts: number;
  share: number;
}

const calibrationReadings = 5;
/** Half a millivolt of reading noise at the wiper and at the supply. */
const readingSdVolts = 0.001;
/** The supply stays this far above the release point that belongs to the larger of trip point and target. */
const roomVolts = 0.3;
/** A trip point this near to the supply is about to switch the board off. */
const leastRoomVolts = 0.1;

export function beginProbed(state: TrimState): TrimState {
  return arm(state, state.trip.volts, { scale: null, guide: null });
}

function arm(
  state: TrimState,
  tripVolts: number,
  live: { scale: WiperScale | null; guide: LiveGuide | null },
): TrimState {
  const highest = Math.max(tripVolts, state.settings.targetVolts);
  const volts = releaseFor(state, highest) + roomVolts;
  const limits = supplyLimits(state);
  const path = armOnThenHold(state.supplyVolts, volts, Math.min(volts, limits.maxVolts), limits);
  return { ...state, phase: { kind: 'probed', step: 'arm', ...live }, command: { kind: 'hold', ...path } };
}

export function observeProbed(state: TrimState, phase: ProbedPhase, seen: TrimObservation): TrimState {
  switch (phase.step) {
    case 'arm':
      return seen.kind === 'held' ? armed({ ...state, supplyVolts: seen.volts, heldVolts: seen.volts }, phase) : state;
    case 'calibrate':
      return seen.kind === 'wiper' ? calibrated(state, [...phase.shares, shareOf(state, seen)]) : state;
    case 'read': {
      if (seen.kind === 'wiper') return read(state, phase, seen);
      if (seen.kind !== 'screw-found') return state;
      const found = foundScrew(state, phase.guide);
      return { ...found.state, phase: { ...phase, guide: found.guide } };
    }
    case 'verify':
      return seen.kind === 'searched'
        ? judgeVerify(state, seen.result, (judged) => beginProbed(relearn(judged)))
        : state;
  }
}

const readWiper = (state: TrimState, phase: ProbedPhase): TrimState => ({
  ...state,
  phase,
  command: { kind: 'read-wiper' },
});

function armed(
  state: TrimState,
  { scale, guide: live }: { scale: WiperScale | null; guide: LiveGuide | null },
): TrimState {
  if (scale && live) return readWiper(state, { kind: 'probed', step: 'read', scale, guide: live });
  return readWiper(state, { kind: 'probed', step: 'calibrate', shares: [] });
}

/**
 * With the output on, (wiper + b) / supply is the share of the supply that meets the reference at the trip point:
 * b = Vd Gf / (G1 + G2 + Gf), nearly constant along the travel.
 */
function shareOf(state: TrimState, seen: { wiperVolts: number; supplyVolts: number }): number {
  return (seen.wiperVolts + feedbackVolts(state)) / seen.supplyVolts;
}

function feedbackVolts({ estimate, settings, liveTripVolts, trip }: TrimState): number {
  const design = designOf(estimate.mean, settings);
  const wiper = Math.min(0.999, Math.max(0.001, wiperFor(design, liveTripVolts ?? trip.volts)));
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  return (design.outputDropVolts * feedback) / (toSupply + toGround + feedback);
}

function calibrated(state: TrimState, shares: number[]): TrimState {
  if (shares.length < calibrationReadings) return readWiper(state, { kind: 'probed', step: 'calibrate', shares });
  const share = shares.reduce((sum, value) => sum + value, 0) / shares.length;
  const scale = { tripVolts: state.trip.volts, share };
  const guiding = beginGuide(state, state.trip.volts);
  const prompted = prompt(state, 'turn', adviseLive(state, guiding, state.trip.volts));
  if (prompted.phase.kind === 'over') return prompted;
  return readWiper(
    { ...prompted, liveTripVolts: state.trip.volts },
    { kind: 'probed', step: 'read', scale, guide: guiding },
  );
}

/** T = (Vz' + b) / share with Vz' + b = share0 T0, and what the reference node itself moves between the two supplies. */
function tripFrom(state: TrimState, scale: WiperScale, share: number): number {
  const design = designOf(state.estimate.mean, state.settings);
  const node = nodeAt(design, scale.tripVolts);
  let volts = (scale.share * scale.tripVolts) / share;
  // The sag is a small part of the volts, so each pass leaves about a tenth of the error.
  for (let pass = 0; pass < 4; pass++) {
    volts = (scale.share * scale.tripVolts + nodeAt(design, volts) - node) / share;
  }
  return volts;
}

function read(
  state: TrimState,
  phase: Extract<ProbedPhase, { step: 'read' }>,
  seen: Extract<TrimObservation, { kind: 'wiper' }>,
): TrimState {
  const volts = tripFrom(state, phase.scale, shareOf(state, seen));
  const guided = guide(state, phase.guide, { volts, sdVolts: readingSdVolts, quiet: true });
  if (guided.state.phase.kind === 'over') return guided.state;
  if (guided.stopped) {
    const stopped: TrimState = { ...guided.state, stage: 'stop-turning', phase: { kind: 'probed', step: 'verify' } };
    return askVerify(stopped, { ...nearTarget(state), tripMeanVolts: volts });
  }
  if (volts > seen.supplyVolts - leastRoomVolts)
    return arm(guided.state, volts, { scale: phase.scale, guide: guided.guide });
  return readWiper(guided.state, { kind: 'probed', step: 'read', scale: phase.scale, guide: guided.guide });
}
