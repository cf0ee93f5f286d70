import { adviseTo, type Advice } from './advice';
import { standingAt } from './board-estimate';
import { failNoEffect, foundMovement, foundNoEffect, foundWrongWay, noEffectAnswerMs } from './prompts';
import type { TrimState } from './state';

/** Follows one prompt by a live trip point: aim, findings, and whether the hand has come to rest. */
export interface LiveGuide {
  /** A point above the target is first brought below it, so that the last turn always rises (backlash). */
  aim: 'below' | 'target';
  /** Trip point when the prompt was given or last answered, and when; movement is told from it. */
  fromVolts: number;
  fromMs: number;
  promptedAtMs: number;
  moved: boolean;
  recent: { atMs: number; volts: number }[];
  /** Further wrong turning is only told again once the operator had time to take the first finding in. */
  wrongToldAtMs: number | null;
  noEffectAtMs: number | null;
  screwFound: boolean;
}

/** Tool on the screw already, or still to be fetched. */
const noEffectAfterMs = 6000;
const noEffectWithFetchAfterMs = 12_000;
const wrongWayPauseMs = 4000;
/**
 * Rest that counts as stopped: on target just longer than a regrip, elsewhere longer than a look around; longer still
 * where the dial asks to go on below the target first.
 */
const restMsOf = {
  target: { onTarget: 500, elsewhere: 2500 },
  below: { onTarget: 1500, elsewhere: 8000 },
} as const;
const leastReadings = 5;
/** A point that never rests is measured all the same, unless the operator is asked about no effect. */
const longestPromptMs = 60_000;

export function beginGuide(state: TrimState, volts: number): LiveGuide {
  return {
    aim: volts > state.settings.targetVolts ? 'below' : 'target',
    fromVolts: volts,
    fromMs: state.atMs,
    promptedAtMs: state.atMs,
    moved: false,
    recent: [],
    wrongToldAtMs: null,
    noEffectAtMs: null,
    screwFound: false,
  };
}

/** How far below the target a falling point is brought: past the backlash, and enough to come up evenly. */
function aimVolts({ settings, pace }: TrimState, aim: LiveGuide['aim']): number {
  if (aim === 'target') return settings.targetVolts;
  const takeUp = pace.voltsPerTurn * settings.trimmer.backlashTurns;
  return settings.targetVolts - Math.min(0.15, Math.max(2 * settings.toleranceVolts, 1.5 * takeUp));
}

export function adviseLive(state: TrimState, guide: LiveGuide, volts: number): Advice {
  const estimate = standingAt(state.estimate, state.settings, volts);
  return adviseTo({ ...state, estimate }, aimVolts(state, guide.aim));
}

export interface Guided {
  state: TrimState;
  guide: LiveGuide;
  stopped: boolean;
}

/** A live trip point, its standard uncertainty, and whether its source sees no movement. */
export interface LiveReading {
  volts: number;
  sdVolts: number;
  quiet: boolean;
}

/** Takes in a live trip point. May end the trim. */
export function guide(state: TrimState, before: LiveGuide, { volts, sdVolts, quiet }: LiveReading): Guided {
  const recent = [
    ...before.recent.filter((r) => state.atMs - r.atMs <= restMsOf.below.elsewhere),
    { atMs: state.atMs, volts },
  ];
  const told = tellMovement({ ...state, liveTripVolts: volts }, { ...before, recent }, volts, sdVolts);
  if (told.state.phase.kind === 'over') return { ...told, stopped: false };
  const turned = turnAim(told.state, told.guide, volts);
  const advice = adviseLive(told.state, turned, volts);
  return {
    state: { ...told.state, advice },
    guide: turned,
    stopped:
      (quiet && hasStopped(told.state, turned, volts, sdVolts)) ||
      (turned.noEffectAtMs === null && state.atMs - turned.promptedAtMs > longestPromptMs),
  };
}

function turnAim(state: TrimState, guide: LiveGuide, volts: number): LiveGuide {
  const { targetVolts, toleranceVolts } = state.settings;
  const below = aimVolts(state, 'below');
  const turns =
    guide.aim === 'target' ? volts > targetVolts + toleranceVolts : volts < below + 0.3 * (targetVolts - below);
  if (!turns) return guide;
  return { ...guide, aim: guide.aim === 'target' ? 'below' : 'target', fromVolts: volts, fromMs: state.atMs };
}

/** Movement as asked, the wrong way, or none for long. */
function tellMovement(
  state: TrimState,
  guide: LiveGuide,
  volts: number,
  sdVolts: number,
): { state: TrimState; guide: LiveGuide } {
  const { pace, settings, atMs } = state;
  const asked = guide.aim === 'below' ? -1 : 1;
  const moved = (volts - guide.fromVolts) * asked;
  const enough = pace.peekVolts + 3 * sdVolts;
  const answered = { ...guide, fromVolts: volts, fromMs: atMs, moved: true, noEffectAtMs: null };
  if (moved >= enough) return { state: foundMovement(state), guide: { ...answered, wrongToldAtMs: null } };
  if (guide.wrongToldAtMs !== null && atMs - guide.wrongToldAtMs < wrongWayPauseMs) {
    // Overshoots until the finding is taken in; told from where it turns back.
    return { state, guide: moved < 0 ? { ...guide, fromVolts: volts, fromMs: atMs } : guide };
  }
  if (-moved >= enough && Math.abs(volts - settings.targetVolts) > settings.toleranceVolts) {
    const wrong = foundWrongWay(state, Math.abs(volts - state.trip.volts));
    return { state: wrong, guide: { ...answered, wrongToldAtMs: atMs } };
  }
  if (guide.noEffectAtMs !== null) {
    return { state: atMs - guide.noEffectAtMs > noEffectAnswerMs ? failNoEffect(state) : state, guide };
  }
  const waited = atMs - guide.fromMs;
  const patience = state.prompts <= 1 || guide.screwFound ? noEffectWithFetchAfterMs : noEffectAfterMs;
  // A small turn is easily lost in play and the hand's own error: that is no finding, but a stop.
  if (Math.abs(volts - settings.targetVolts) < 2 * pace.peekVolts) return { state, guide };
  if (guide.moved || waited < patience || Math.abs(moved) > pace.peekVolts / 3) return { state, guide };
  if (guide.screwFound) return { state: failNoEffect(state), guide };
  return { state: foundNoEffect(state, Math.round(waited / 1000)), guide: { ...guide, noEffectAtMs: atMs } };
}

/** Two agreeing readings within the last while, after a movement or on target. */
function hasStopped(state: TrimState, guide: LiveGuide, volts: number, sdVolts: number): boolean {
  const { targetVolts, toleranceVolts } = state.settings;
  const off = Math.abs(volts - targetVolts);
  const onTarget = off <= Math.min(0.75 * toleranceVolts, toleranceVolts - 2 * sdVolts);
  const idle = off < 2 * state.pace.peekVolts && state.atMs - guide.fromMs > noEffectWithFetchAfterMs;
  if (!onTarget && !guide.moved && !idle) return false;
  const restMs = restMsOf[guide.aim][onTarget ? 'onTarget' : 'elsewhere'];
  // A movement just told is no rest, however short beside the rest before it.
  if (state.atMs - guide.fromMs < restMs) return false;
  // The last `restMs`, or as far back as it takes for enough readings.
  const tail = guide.recent.filter(
    (reading, i) => state.atMs - reading.atMs <= restMs || i >= guide.recent.length - leastReadings,
  );
  if (tail.length < leastReadings || state.atMs - guide.recent[0]!.atMs < restMs) return false;
  // The two readings that have to agree are the means of the earlier and the later half.
  const half = tail.length >> 1;
  const earlier = meanVolts(tail.slice(0, half));
  const later = meanVolts(tail.slice(tail.length - half));
  return Math.abs(later - earlier) < (onTarget ? Math.max(0.002, Math.min(0.004, 0.3 * toleranceVolts)) : 0.003);
}

const meanVolts = (readings: { volts: number }[]) =>
  readings.reduce((sum, reading) => sum + reading.volts, 0) / readings.length;

/** The operator found the screw after no effect was told. */
export function foundScrew(state: TrimState, guide: LiveGuide): { state: TrimState; guide: LiveGuide } {
  if (guide.noEffectAtMs === null) return { state, guide };
  return {
    state: { ...state, finding: null, findingVolts: null },
    guide: { ...guide, noEffectAtMs: null, screwFound: true, fromMs: state.atMs },
  };
}
