import { beginTrim, nextTrimCommand, observeTrim, viewTrim, type TrimState } from '../../trim/trim';
import type { TrimCommand, TrimObservation, TrimOutcome } from '../../trim/types';
import { noteAdjustment } from '../../run/adjustments';
import { faultCodes } from '../../run/fault-codes';
import { newestPoints, noTravel, type Points, type RunFacts } from '../../run/facts';
import { measuring, stay, type Answer, type StepContext, type StepMachine, type StepTurn } from '../../run/machine';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { advanceSearchPoints, beginSearchPoints, type SearchPoints } from '../../run/procedures/search-points';
import {
  advanceUnfound,
  beginUnfound,
  type NotFound,
  type Unfound,
  type UnfoundResult,
} from '../../run/procedures/unfound';
import type { ProcedureTurn } from '../../run/machine';
import { pointMeasurements } from '../../run/procedures/point-measurements';
import { refuseUntrimmable } from './reach';
import { rejectForOutcome } from './outcome';
import { trimSettings } from './settings';
import { findStep } from '../../run/procedures/find-step';
import type { TrimStep } from './schema';

/** What the pending command of lib/trim is being carried out with. */
type Doing =
  | { kind: 'asked' }
  | { kind: 'searching'; points: SearchPoints; unassuming: boolean }
  | { kind: 'moving'; path: FollowPath; answers: 'held' | 'probed' }
  | { kind: 'unfound'; unfound: Unfound };
export interface TrimMachine {
  trim: TrimState;
  doing: Doing;
  /** The last search of the trim did not resolve. */
  unresolved: boolean;
  /** Turns asked for by an earlier trim of the run. */
  adjustedBefore: RunFacts['adjustments'];
}
type Turn = StepTurn<TrimMachine>;

/**
 * Carries out what lib/trim decides. A board that no setting of its trimmer brings inside all limits is rejected before
 * the first prompt.
 */
export const machine: StepMachine<TrimStep, TrimMachine> = {
  begin(step, context) {
    const found = newestPoints(context.facts);
    if (!found) return { ending: noPoints };
    if (step.procedure === 'wiper-probe' && !context.plan.hasWiperProbe) return { ending: noWiperProbe };
    const settings = trimSettings(step, context);
    const points = {
      tripVolts: found.trip.volts,
      tripUncertaintyVolts: found.trip.standardUncertaintyVolts,
      releaseVolts: found.release.volts,
    };
    const refusal = refuseUntrimmable(settings, points, context);
    if (refusal) return { ending: refusal };
    const state = beginTrim(settings, points, context.atMs);
    const turn = obey(
      { trim: state, doing: { kind: 'asked' }, unresolved: false, adjustedBefore: context.facts.adjustments },
      step,
      context,
    );
    return { ...turn, facts: { ...turn.facts, trimBegan: true, trimmed: null, verified: [] } };
  },

  advance(machine, event, step, context) {
    if (event.kind === 'will-not-turn' || event.kind === 'screw-found') {
      return hear(machine, { kind: event.kind, atMs: context.atMs }, context);
    }
    if (!('id' in event)) return stay(machine);
    const { doing } = machine;
    switch (doing.kind) {
      case 'asked': {
        const seen = observationOf(event, context.atMs);
        return seen ? observe(machine, seen, step, context) : stay(machine);
      }
      case 'moving': {
        const turn = advancePath(doing.path, event);
        if (!turn) return stay(machine);
        if ('ask' in turn) return { machine: { ...machine, doing: { ...doing, path: turn.machine } }, ask: turn.ask };
        return observe(machine, { kind: doing.answers, atMs: context.atMs, ...turn.result }, step, context);
      }
      case 'searching': {
        const turn = advanceSearchPoints(doing.points, event, context);
        if (!turn) return stay(machine);
        if ('ask' in turn) return { machine: { ...machine, doing: { ...doing, points: turn.machine } }, ask: turn.ask };
        const { result } = turn;
        if (result.kind === 'chatter') return unfound(machine, beginUnfound(result, context));
        const unresolved = result.kind === 'unresolved';
        return observe({ ...machine, unresolved }, { kind: 'searched', atMs: context.atMs, result }, step, context);
      }
      case 'unfound': {
        const turn = advanceUnfound(doing.unfound, event, context);
        return turn ? unfound(machine, turn) : stay(machine);
      }
    }
  },

  view(machine, _step, { plan }) {
    if (machine.doing.kind === 'unfound') return measuring({ code: 'run.looking-closer' });
    return {
      kind: 'trim',
      trim: viewTrim(machine.trim),
      clockwiseRaises: plan.boardType.trimmer.clockwise === 'raises',
      photo: plan.boardType.trimmerPhoto,
    };
  },
};

const noPoints = {
  kind: 'no-verdict',
  reason: 'interrupted',
  code: faultCodes.incomplete,
  detail: { code: 'run.incomplete' },
  fault: null,
} as const;
const noWiperProbe = {
  kind: 'no-verdict',
  reason: 'fixture-fault',
  code: faultCodes.noWiperProbe,
  detail: { code: 'run.no-wiper-probe' },
  fault: null,
} as const;

function observationOf(event: Answer, atMs: number): TrimObservation | null {
  if (event.kind === 'sensed') return { kind: 'sensed', atMs, output: event.output };
  if (event.kind === 'waited') return { kind: 'waited', atMs };
  if (event.kind === 'wiper-measured') {
    return { kind: 'wiper', atMs, wiperVolts: event.wiperVolts, supplyVolts: event.supplyVolts };
  }
  return null;
}

/** What the operator says while a command is pending: it goes on unless the trim is over. */
function hear(machine: TrimMachine, said: TrimObservation, context: StepContext): Turn {
  const heard = { ...machine, trim: observeTrim(machine.trim, said) };
  const command = nextTrimCommand(heard.trim);
  return command.kind === 'finished' ? conclude(heard, command.outcome, context) : stay(heard);
}

function observe(machine: TrimMachine, seen: TrimObservation, step: TrimStep, context: StepContext): Turn {
  return obey({ ...machine, trim: observeTrim(machine.trim, seen) }, step, context);
}

/** Carries out the command that lib/trim has pending. */
function obey(machine: TrimMachine, step: TrimStep, context: StepContext): Turn {
  const command = nextTrimCommand(machine.trim);
  const asked = { ...machine, doing: { kind: 'asked' } as const };
  const { waypointMs, settleMs } = context.plan.commissioning;
  const view = viewTrim(machine.trim);
  const { adjustedBefore: before } = machine;
  const facts = {
    trimFailing: view.finding === 'no-effect' || view.finding === 'end-of-travel',
    adjustments: [...before, ...noteAdjustment(context.facts.adjustments.slice(before.length), view, context.atMs)],
  };
  switch (command.kind) {
    case 'finished':
      return conclude(asked, command.outcome, context);
    case 'search':
      return search(machine, command, context);
    case 'hold':
    case 'probe': {
      const volts = command.kind === 'hold' ? [...command.waypointsVolts, command.volts] : [command.volts];
      const { machine: path, ask } = beginPath(volts, { waypointMs, settleMs });
      const answers = command.kind === 'hold' ? 'held' : 'probed';
      return { machine: { ...machine, doing: { kind: 'moving', path, answers } }, ask, facts };
    }
    case 'sense':
      return { machine: asked, ask: { kind: 'sense' }, facts };
    case 'read-wiper':
      return { machine: asked, ask: { kind: 'measure-wiper' }, facts };
    case 'wait':
      return { machine: asked, ask: { kind: 'wait', milliseconds: command.milliseconds }, facts };
  }
}

function search(machine: TrimMachine, command: Extract<TrimCommand, { kind: 'search' }>, context: StepContext): Turn {
  const { windowMinVolts, windowMaxVolts, mostSettles, settleMs } = findStep(context);
  const { machine: points, ask } = beginSearchPoints(
    {
      windowMinVolts,
      windowMaxVolts,
      mostSettles,
      settleMs,
      wantedUncertaintyVolts: command.wantedUncertaintyVolts,
      prior: command.prior,
      endCheck: command.check,
      unassuming: machine.unresolved,
    },
    context,
  );
  const doing: Doing = { kind: 'searching', points, unassuming: machine.unresolved };
  return { machine: { ...machine, doing }, ask, facts: { travel: noTravel } };
}

function unfound(machine: TrimMachine, turn: ProcedureTurn<Unfound, UnfoundResult>): Turn {
  if ('ask' in turn)
    return { machine: { ...machine, doing: { kind: 'unfound', unfound: turn.machine } }, ask: turn.ask };
  return turn.result;
}

function conclude(machine: TrimMachine, outcome: TrimOutcome, context: StepContext): Turn {
  const { trimRounds, turnsAdvised } = context.facts;
  const counts = { trimRounds: trimRounds + outcome.rounds, turnsAdvised: turnsAdvised + outcome.turnsAdvised };
  if (outcome.kind === 'trimmed') {
    const trimmed: Points = {
      trip: { volts: outcome.tripVolts, standardUncertaintyVolts: outcome.standardUncertaintyVolts },
      release: { volts: outcome.releaseVolts, standardUncertaintyVolts: outcome.standardUncertaintyVolts },
      settles: 0,
    };
    const facts = { ...counts, trimmed, trimFailing: false };
    return { done: true, facts, measurements: pointMeasurements(trimmed, 'trimmed', context) };
  }
  if (outcome.finding === 'not-steady') {
    const unresolved: NotFound = {
      kind: 'unresolved',
      trip: null,
      release: null,
      settles: 0,
      waypoints: 0,
      endCheckSettles: 0,
    };
    const turn = unfound(machine, beginUnfound(unresolved, context));
    return { ...turn, facts: { ...turn.facts, ...counts } };
  }
  return { ending: rejectForOutcome(outcome, context), facts: counts };
}
