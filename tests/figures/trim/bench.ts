import { beginTrim, nextTrimCommand, observeTrim, viewTrim } from '../../../lib/trim/trim';
import type { SearchResult } from '../../../lib/search/types';
import type { TrimCommand, TrimObservation, TrimOutcome, TrimSettings, TrimView } from '../../../lib/trim/types';
import type { Random } from '../random';
import type { Hand } from './hand';
import type { TrimmedBoard } from './trimmed-board';

/** What a station with this link takes and how well it measures: the studies' figures. Seconds, volts. */
export interface Link {
  name: string;
  commandSeconds: number;
  pollSeconds: number;
  wiperSeconds: number;
  /** A search by wanted uncertainty (0.5, 1, 2.5 mV), with the end check, and with a prior of 30 mV. */
  searchSeconds: { mV05: number; mV1: number; mV25: number; mV05Prior: number; mV1Prior: number; mV25Prior: number };
}

export const fastLink: Link = {
  name: '115200',
  commandSeconds: 0.01,
  pollSeconds: 0.04,
  wiperSeconds: 0.04,
  searchSeconds: { mV05: 2.69, mV1: 1.9, mV25: 1.56, mV05Prior: 2.2, mV1Prior: 1.42, mV25Prior: 1.2 },
};
export const slowLink: Link = {
  name: '9600',
  commandSeconds: 0.11,
  pollSeconds: 0.11,
  wiperSeconds: 0.077,
  searchSeconds: { mV05: 8.33, mV1: 5.86, mV25: 4.83, mV05Prior: 6.9, mV1Prior: 4.5, mV25Prior: 3.9 },
};

const settleSeconds = 0.04;
const waypointSeconds = 0.03;
const overshoot = 0.05;
const tickSeconds = 0.01;

export interface TrimRun {
  outcome: TrimOutcome;
  seconds: number;
  /** The true trip point was inside the tolerance when it was first judged. */
  rightAtFirstStop: boolean;
  /** Judged against the truth although that was over 5 standard uncertainties from the tolerance's edge. */
  misjudged: boolean;
  /** True trip point at the end. */
  tripVolts: number;
  findings: string[];
  prompts: number;
}

/** Anything that answers like lib/trim, so that the baselines run on the same bench. */
export interface Procedure<State> {
  begin(
    settings: TrimSettings,
    found: { tripVolts: number; tripUncertaintyVolts: number; releaseVolts: number },
  ): State;
  next(state: State): TrimCommand;
  observe(state: State, seen: TrimObservation): State;
  view(state: State): TrimView;
  prompts(state: State): number;
}

export const productTrim: Procedure<ReturnType<typeof beginTrim>> = {
  begin: (settings, found) => beginTrim(settings, found, 0),
  next: nextTrimCommand,
  observe: observeTrim,
  view: viewTrim,
  prompts: (state) => state.prompts,
};

/** Runs one trim in virtual time: the real stepper, a board that answers and a hand that turns while time passes. */
export function runTrim<State>(
  procedure: Procedure<State>,
  settings: TrimSettings,
  board: TrimmedBoard,
  hand: Hand,
  link: Link,
  random: Random,
  trace?: (line: string) => void,
): TrimRun {
  let at = 0;
  let supply = settings.supplyMinVolts;
  let rightAtFirstStop: boolean | null = null;
  let misjudged = false;
  const { targetVolts, toleranceVolts } = settings;
  const noise = () => random.normal(0, settings.noiseVolts);

  const pass = (seconds: number) => {
    let left = seconds;
    while (left > 1e-9) {
      const step = Math.min(tickSeconds, left);
      const turns = hand.advance(at, step);
      if (turns !== 0) {
        board.turn(turns);
        board.latch(supply, 0);
      }
      at += step;
      left -= step;
    }
  };
  const move = (volts: number, dwellSeconds: number) => {
    const peak = volts + overshoot * (volts - supply);
    const drawn = noise();
    board.latch(peak, drawn);
    supply = volts;
    board.latch(supply, drawn);
    pass(dwellSeconds + link.commandSeconds);
  };
  const search = (wantedVolts: number, prior: boolean): SearchResult => {
    const before = board.tripVolts;
    const s = link.searchSeconds;
    const [sd, seconds] =
      wantedVolts < 0.00075
        ? [0.00046, prior ? s.mV05Prior : s.mV05]
        : wantedVolts < 0.0018
          ? [0.00082, prior ? s.mV1Prior : s.mV1]
          : [0.0015, prior ? s.mV25Prior : s.mV25];
    pass(seconds);
    const counts = { settles: 30, waypoints: 8, endCheckSettles: 7 };
    board.output = 'on';
    supply = board.tripVolts + 0.01;
    if (Math.abs(board.tripVolts - before) > 0.005) {
      return { kind: 'unresolved', trip: null, release: null, ...counts };
    }
    const point = (volts: number) => ({
      volts: volts + random.normal(0, sd),
      standardUncertaintyVolts: sd,
    });
    return { kind: 'found', trip: point(board.tripVolts), release: point(board.releaseVolts), ...counts };
  };

  /** Distance of the truth from the tolerance's edge, positive inside. */
  const insideBy = () => toleranceVolts - Math.abs(board.tripVolts - targetVolts);
  const isMisjudged = (measured: number, uncertainty: number) =>
    Math.abs(insideBy()) > 5 * uncertainty && Math.abs(measured - targetVolts) <= toleranceVolts !== insideBy() > 0;
  const isWrongEnd = (outcome: TrimOutcome) =>
    outcome.kind === 'trimmed' ? insideBy() < -5 * outcome.standardUncertaintyVolts : insideBy() > 5 * 0.00082;

  const first = search(0.001, false);
  if (first.kind !== 'found') throw new Error('the board did not hold still before the trim');
  let state = procedure.begin(settings, {
    tripVolts: first.trip.volts,
    tripUncertaintyVolts: first.trip.standardUncertaintyVolts,
    releaseVolts: first.release.volts,
  });
  const findings: string[] = [];
  for (let count = 0; count < 200_000; count++) {
    const view = procedure.view(state);
    if (view.finding && findings.at(-1) !== view.finding) findings.push(view.finding);
    hand.see(view, procedure.prompts(state), at);
    const command = procedure.next(state);
    let seen: TrimObservation;
    switch (command.kind) {
      case 'finished':
        return {
          outcome: command.outcome,
          seconds: at,
          // A board found on target needs no stop.
          rightAtFirstStop: rightAtFirstStop ?? command.outcome.kind === 'trimmed',
          misjudged: misjudged || isWrongEnd(command.outcome),
          tripVolts: board.tripVolts,
          findings,
          prompts: procedure.prompts(state),
        };
      case 'search': {
        const result = search(command.wantedUncertaintyVolts, command.prior !== null);
        if (command.check && result.kind === 'found') {
          rightAtFirstStop ??= Math.abs(board.tripVolts - targetVolts) <= toleranceVolts;
          misjudged ||= isMisjudged(result.trip.volts, result.trip.standardUncertaintyVolts);
        }
        seen = { kind: 'searched', result, atMs: at * 1000 };
        break;
      }
      case 'hold':
        for (const waypoint of command.waypointsVolts) move(waypoint, waypointSeconds);
        move(command.volts, settleSeconds);
        seen = { kind: 'held', volts: supply, output: board.output, atMs: at * 1000 };
        break;
      case 'probe':
        move(command.volts, settleSeconds);
        seen = { kind: 'probed', volts: supply, output: board.output, atMs: at * 1000 };
        break;
      case 'sense':
        pass(link.pollSeconds);
        board.latch(supply, noise());
        seen = { kind: 'sensed', output: board.output, atMs: at * 1000 };
        break;
      case 'read-wiper':
        pass(link.wiperSeconds);
        seen = {
          kind: 'wiper',
          wiperVolts: board.wiperVolts(supply) + random.normal(0, 0.0005),
          supplyVolts: supply + random.normal(0, 0.0005),
          atMs: at * 1000,
        };
        break;
      case 'wait':
        pass(command.milliseconds / 1000);
        seen = { kind: 'waited', atMs: at * 1000 };
        break;
    }
    trace?.(
      `${view.finding ?? ''} ${at.toFixed(2)} T=${board.tripVolts.toFixed(4)} ${view.stage} ${view.direction ?? ''} ${view.turns?.toFixed(3) ?? ''} live=${view.liveTripVolts?.toFixed(4) ?? '-'} ${JSON.stringify(command).slice(0, 150)} -> ${'output' in seen ? seen.output : seen.kind === 'searched' ? JSON.stringify(seen.result).slice(0, 90) : ''}`,
    );
    state = procedure.observe(state, seen);
  }
  throw new Error('the trim did not end');
}
