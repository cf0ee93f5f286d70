import type { TrimObservation, TrimSettings } from '../../../lib/trim/types';
import { pointsAt, wiperFor } from '../../../lib/trim/board-model';
import type { Procedure } from './bench';

/** Rounds of advice from volts per turn alone: prompt, wait out the turn, measure, judge. */
interface BaselineState {
  settings: TrimSettings;
  /** Nominal, and as used now; volts a turn. */
  nominal: number;
  slope: number;
  trip: number;
  asked: number;
  prompts: number;
  step: 'turn' | 'measure' | 'over';
  done: boolean;
}

const mostTurns = 4;

function baseline(learn: (state: BaselineState, trip: number) => number): Procedure<BaselineState> {
  const isOnTarget = ({ settings, trip }: BaselineState) =>
    Math.abs(trip - settings.targetVolts) <= settings.toleranceVolts;
  const next = (state: BaselineState): BaselineState => {
    if (isOnTarget(state)) return { ...state, step: 'over', done: true };
    if (state.prompts >= state.settings.mostRounds) return { ...state, step: 'over' };
    const wanted = (state.settings.targetVolts - state.trip) / state.slope;
    const asked = Math.max(-mostTurns, Math.min(mostTurns, wanted));
    return { ...state, asked, prompts: state.prompts + 1, step: 'turn' };
  };
  return {
    begin(settings, found) {
      const wiper = wiperFor(settings.design, settings.targetVolts);
      const at = (a: number) => pointsAt(settings.design, a).tripVolts;
      const nominal = (at(wiper - 1e-4) - at(wiper + 1e-4)) / (2e-4 * settings.trimmer.turns);
      return next({
        settings,
        nominal,
        slope: nominal,
        trip: found.tripVolts,
        asked: 0,
        prompts: 0,
        step: 'turn',
        done: false,
      });
    },
    next(state) {
      const { step, prompts, asked, settings, trip } = state;
      if (step === 'over') {
        const counts = { rounds: prompts, turnsAdvised: 0 };
        const outcome = state.done
          ? ({ kind: 'trimmed', tripVolts: trip, standardUncertaintyVolts: 0.00082, releaseVolts: 0 } as const)
          : ({ kind: 'failed', finding: 'too-many-rounds', lastTripVolts: trip } as const);
        return { kind: 'finished', outcome: { ...outcome, ...counts } };
      }
      if (step === 'measure')
        return { kind: 'search', wantedUncertaintyVolts: 0.001, prior: near(settings), check: true };
      const turnsPerSecond = settings.trimmer.turns >= 2 ? 0.5 : 45 / 360;
      const seconds = (prompts === 1 ? 6 : 1.5) + (1.4 * Math.abs(asked)) / turnsPerSecond + 0.5;
      return { kind: 'wait', milliseconds: 1000 * seconds };
    },
    observe(state, seen: TrimObservation) {
      if (seen.kind === 'waited') return { ...state, step: 'measure' };
      if (seen.kind !== 'searched' || seen.result.kind !== 'found') return state;
      const trip = seen.result.trip.volts;
      return next({ ...state, slope: learn(state, trip), trip });
    },
    view: ({ settings, step, asked, trip, prompts }) => ({
      stage: step === 'turn' ? 'turn' : 'measuring',
      direction: step === 'turn' ? (asked > 0 ? 'clockwise' : 'anticlockwise') : null,
      turns: step === 'turn' ? Math.abs(asked) : null,
      words: null,
      targetVolts: settings.targetVolts,
      toleranceVolts: settings.toleranceVolts,
      heldVolts: null,
      lastTripVolts: trip,
      lastTripIsStale: false,
      liveTripVolts: null,
      finding: null,
      findingVolts: null,
      round: prompts,
    }),
    prompts: (state) => state.prompts,
  };
}

const near = (settings: TrimSettings) => ({
  tripMeanVolts: settings.targetVolts,
  tripSdVolts: 0.03,
  hysteresisMeanVolts: 0.4,
  hysteresisSdVolts: 0.02,
});

/** The type's volts per turn at the target, whatever the board answers. */
export const fixedSlope = baseline(({ slope }) => slope);

/** Volts per turn from the last turn, where it is believable. */
export const secant = baseline(({ nominal, slope, asked, trip }, now) => {
  const seen = (now - trip) / asked;
  return seen > nominal / 3 && seen < nominal * 3 ? seen : slope;
});
