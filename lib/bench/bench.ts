import type { BenchView } from '../contracts/bench-view';
import { seated, takeAnswer } from './answers';
import { takeCommand } from './commands';
import { say } from './sayings';
import { rest, signOut, stay } from './step';
import { leaveTrial, offerHasEnded } from './trial';
import type { BenchEvent, BenchState, BenchStep, RunEnding, Standing } from './types';

/** A bench around its runs: badge, PIN, lot, boards, bins. Decides; the station and the server do. */

const nothingKnown: Standing = {
  readiness: [],
  reasons: [],
  otherStation: null,
  signedIn: false,
  lot: null,
  next: null,
  offer: null,
  call: null,
  label: null,
};

export function beginBench(station: BenchView['station']): BenchState {
  return {
    station,
    phase: { kind: 'badge' },
    operator: null,
    lot: null,
    next: null,
    trial: null,
    standing: nothingKnown,
    pendingBin: null,
    ready: { opened: false, linksDown: [], strangers: [], supplyOff: false, databaseAway: false },
    fixture: { lidClosed: null, boardPresent: null, seenEmpty: false, heldSerial: null },
    last: null,
    refusal: null,
    asked: null,
    lastId: 0,
  };
}

export function advanceBench(state: BenchState, event: BenchEvent): BenchStep {
  switch (event.kind) {
    case 'command':
      return takeCommand(state, event.command, event.atIso);
    case 'answered':
      if (state.asked?.id !== event.id) return stay(state);
      return takeAnswer(state, state.asked.ask, event.answer, event.atIso);
    case 'standing':
      return takeStanding(state, event);
    case 'database':
      return stay({ ...state, ready: { ...state.ready, databaseAway: event.away } });
    case 'instruments':
      return takeLinks(state, event);
    case 'supply':
      return stay({ ...state, ready: { ...state.ready, supplyOff: event.confirmedOff } });
    case 'fixture':
      return takeFixture(state, event.lidClosed, event.boardPresent);
    case 'run-over':
      return endRun(state, event.ending);
    case 'commissioning-progress':
      if (state.phase.kind !== 'commissioning') return stay(state);
      return stay({
        ...state,
        phase: {
          ...state.phase,
          what: say('commissioning-step', { step: event.step }),
          done: event.done,
          of: event.of,
        },
      });
    case 'commissioning-over':
      return endCommissioning(state, event);
  }
}

function takeLinks(
  state: BenchState,
  { opened, linksDown, strangers }: Extract<BenchEvent, { kind: 'instruments' }>,
): BenchStep {
  return stay({ ...state, ready: { ...state.ready, opened, linksDown, strangers } });
}

function takeStanding(
  state: BenchState,
  { standing, pendingBin, atIso }: Extract<BenchEvent, { kind: 'standing' }>,
): BenchStep {
  const sameLot = state.lot !== null && standing.lot?.lotId === state.lot.lotId;
  const known: BenchState = {
    ...state,
    standing,
    lot: sameLot ? standing.lot : state.lot,
    next: sameLot ? standing.next : state.next,
    pendingBin: pendingBin === undefined ? state.pendingBin : pendingBin,
  };
  if (!state.operator || standing.signedIn)
    return known.phase.kind === 'idle' && !known.asked && offerHasEnded(known)
      ? leaveTrial(known, { ...say('offer-ended'), atIso })
      : stay(known);
  if (state.phase.kind === 'run') return stay(known, { kind: 'run-event', event: { kind: 'bench-lost' } });
  if (state.phase.kind === 'commissioning' && state.phase.state === 'measuring')
    return stay(known, { kind: 'stop-commissioning' });
  return stay(signOut(known));
}

/** Lid open over an empty fixture, outside a run: the next board may come. */
function takeFixture(state: BenchState, lidClosed: boolean, boardPresent: boolean): BenchStep {
  const free =
    state.phase.kind !== 'run' && !(state.phase.kind === 'commissioning' && state.phase.state === 'measuring');
  const emptied = free && !lidClosed && !boardPresent;
  const fixture = {
    lidClosed,
    boardPresent,
    seenEmpty: state.fixture.seenEmpty || emptied,
    heldSerial: emptied ? null : state.fixture.heldSerial,
  };
  return seated({ ...state, fixture });
}

function endRun(state: BenchState, ending: RunEnding): BenchStep {
  if (state.phase.kind !== 'run') return stay(state);
  const { serial } = state.phase;
  const over: BenchState = {
    ...state,
    refusal: null,
    pendingBin: ending.bin ?? state.pendingBin,
    ready: { ...state.ready, supplyOff: ending.supplyConfirmedOff },
    last: ending.reference ? state.last : { serial, verdict: ending.verdict, seconds: ending.seconds },
  };
  if (!state.operator || !state.standing.signedIn) return stay(signOut(over), { kind: 'read-standing' });
  const reread = { kind: 'read-standing' } as const;
  if (ending.reference && ending.verdict !== 'no-verdict')
    return stay({ ...over, phase: { kind: 'daily-check', ...ending.reference } }, reread);
  if (ending.bin) return stay(rest(over), reread);
  return stay({ ...over, phase: { kind: 'over', serial, verdict: ending.verdict } }, reread);
}

function endCommissioning(state: BenchState, event: Extract<BenchEvent, { kind: 'commissioning-over' }>): BenchStep {
  if (state.phase.kind !== 'commissioning') return stay(state);
  const over: BenchState = {
    ...state,
    ready: { ...state.ready, supplyOff: event.supplyConfirmedOff },
    phase: {
      ...state.phase,
      state: event.values ? 'done' : 'failed',
      what: event.problem ?? say('commissioning-done'),
      values: event.values,
    },
  };
  return stay(state.standing.signedIn ? over : signOut(over), { kind: 'read-standing' });
}
