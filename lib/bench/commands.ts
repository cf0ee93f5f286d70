import type { BenchCommand } from '../contracts/bench-command';
import { confirmEmpty, notReadyToEnergise, startBoard } from './board-start';
import { printCode, readScan } from './scan-code';
import { say } from './sayings';
import { takeScan, takeTypedSerial } from './scans';
import { askServer, atRest, refuse, rest, signOut, stay } from './step';
import { endTrial, leaveTrial, offerHasEnded, startTrial } from './trial';
import type { BenchState, BenchStep } from './types';

/** What a person at the bench asked for. While an answer of the server is awaited only a run's own actions are taken. */
export function takeCommand(state: BenchState, command: BenchCommand, atIso: string): BenchStep {
  const running = state.phase.kind === 'run';
  switch (command.kind) {
    case 'stop':
      return stop(state);
    case 'will-not-turn':
    case 'screw-found':
      return running ? stay(state, { kind: 'run-event', event: { kind: command.kind } }) : notNow(state, atIso);
    case 'answer':
      return running
        ? stay(state, { kind: 'run-event', event: { kind: 'answer', ok: command.ok } })
        : notNow(state, atIso);
    case 'scheme':
      return stay(
        { ...state, station: { ...state.station, scheme: command.scheme } },
        { kind: 'save-scheme', scheme: command.scheme },
      );
    case 'locale':
      return chooseLocale(state, command.locale, atIso);
    case 'confirm':
      return confirm(state, command.what, atIso);
  }
  if (state.asked) return notNow(state, atIso);
  switch (command.kind) {
    case 'scan':
      return takeScan(state, command.text, false, atIso);
    case 'serial-by-hand':
      return takeTypedSerial(state, command.serial, command.again, atIso);
    case 'badge-by-hand':
      return takeScan(state, printCode('badge', command.number), true, atIso);
    case 'pin':
      if (state.phase.kind !== 'pin') return notNow(state, atIso);
      return askServer(state, { kind: 'pin', accountId: state.phase.accountId, digits: command.digits });
    case 'another-badge':
      return state.phase.kind === 'pin' ? stay(signOut(state)) : endShift(state, atIso);
    case 'end-shift':
      return endShift(state, atIso);
    case 'choose-lot':
      return atRest(state) ? askServer(state, { kind: 'lot', by: { lotId: command.lotId } }) : notNow(state, atIso);
    case 'leave-lot':
      return atRest(state) ? askServer(state, { kind: 'lots' }) : notNow(state, atIso);
    case 'start-trial':
      return startTrial(state, command.offerId, atIso);
    case 'leave-trial':
      return state.trial && atRest(state) ? leaveTrial(state) : notNow(state, atIso);
    case 'end-trial':
      return endTrial(state, atIso);
    case 'try-again':
      return tryAgain(state, atIso);
    case 'continue':
      return leaveResult(state, atIso);
    case 'call-engineer':
      return askServer(state, { kind: 'call-engineer' });
    case 'print-label-again':
      return printAgain(state, atIso);
    case 'component-batch':
      if (!state.lot || !state.operator) return refuse(state, say('lot-first'), atIso);
      return askServer(state, { ...command, lotId: state.lot.lotId });
    case 'start-commissioning':
      return beginCommissioning(state, atIso);
  }
}

const notNow = (state: BenchState, atIso: string) => refuse(state, say('not-now'), atIso);

/** Stop is never refused. */
function stop(state: BenchState): BenchStep {
  if (state.phase.kind === 'run') return stay(state, { kind: 'run-event', event: { kind: 'stop' } });
  if (state.phase.kind !== 'commissioning') return stay(state);
  if (state.phase.state === 'measuring') return stay(state, { kind: 'stop-commissioning' });
  return leaveResult(state, '');
}

function confirm(
  state: BenchState,
  what: Extract<BenchCommand, { kind: 'confirm' }>['what'],
  atIso: string,
): BenchStep {
  if (what === 'fixture-empty') return confirmEmpty(state, atIso);
  const { phase } = state;
  if (phase.kind === 'run') return stay(state, { kind: 'run-event', event: { kind: 'confirm', what } });
  if (phase.kind === 'commissioning' && what === 'lid-and-board' && !state.station.hasController)
    return startCommissioning(state);
  return notNow(state, atIso);
}

function chooseLocale(state: BenchState, locale: string, atIso: string): BenchStep {
  if (!state.operator) return notNow(state, atIso);
  const { accountId } = state.operator;
  return stay({ ...state, operator: { ...state.operator, locale } }, { kind: 'save-locale', accountId, locale });
}

function endShift(state: BenchState, atIso: string): BenchStep {
  const { phase, operator } = state;
  if (!operator) return stay(signOut(state));
  if (phase.kind === 'run') return refuse(state, say('finish-board-first', { serial: phase.serial }), atIso);
  if (phase.kind === 'bin') return refuse(state, say('bin-first', { bin: readScan(phase.bin.binCode).short }), atIso);
  if (phase.kind === 'commissioning' && phase.state === 'measuring') return notNow(state, atIso);
  return stay(signOut(state), { kind: 'end-session', sessionId: operator.sessionId });
}

function tryAgain(state: BenchState, atIso: string): BenchStep {
  const { phase } = state;
  if (phase.kind !== 'over' || phase.verdict !== 'no-verdict') return notNow(state, atIso);
  return startBoard(state, phase.serial, false, atIso);
}

function leaveResult(state: BenchState, atIso: string): BenchStep {
  const { phase } = state;
  const leavable =
    phase.kind === 'over' ||
    phase.kind === 'daily-check' ||
    (phase.kind === 'commissioning' && phase.state !== 'measuring');
  if (!leavable) return notNow(state, atIso);
  if (offerHasEnded(state)) return leaveTrial(state, { ...say('offer-ended'), atIso });
  if (state.lot || state.trial) return stay({ ...rest(state), refusal: null }, { kind: 'read-standing' });
  return askServer(state, { kind: 'lots' });
}

function printAgain(state: BenchState, atIso: string): BenchStep {
  if (state.trial) return notNow(state, atIso);
  const serial = state.standing.label?.serial ?? (state.last?.verdict === 'pass' ? state.last.serial : null);
  return serial ? askServer(state, { kind: 'print-label', serial }) : notNow(state, atIso);
}

function beginCommissioning(state: BenchState, atIso: string): BenchStep {
  if (!atRest(state)) return notNow(state, atIso);
  if (!state.operator?.mayCommission) return refuse(state, say('not-permitted'), atIso);
  const problem = notReadyToEnergise(state);
  if (problem) return refuse(state, problem, atIso);
  return stay({
    ...state,
    refusal: null,
    phase: {
      kind: 'commissioning',
      state: 'seat',
      reference: null,
      what: say('commissioning-scan-reference'),
      done: 0,
      of: 0,
      values: null,
    },
  });
}

/** Begins to measure once the reference board is known and seated. */
export function startCommissioning(state: BenchState): BenchStep {
  const { phase } = state;
  if (phase.kind !== 'commissioning' || phase.state !== 'seat' || !phase.reference) return stay(state);
  return stay(
    {
      ...state,
      phase: { ...phase, state: 'measuring' },
      fixture: { ...state.fixture, seenEmpty: false, heldSerial: null },
      ready: { ...state.ready, supplyOff: false },
    },
    { kind: 'start-commissioning', reference: phase.reference },
  );
}
