import { startCommissioning } from './commands';
import { say } from './sayings';
import { refuse, rest, stay } from './step';
import { leaveTrial } from './trial';
import type { BenchAnswer, BenchAsk, BenchRefusal, BenchState, BenchStep } from './types';

/** The server's answer to the question that is open. */
export function takeAnswer(asked: BenchState, ask: BenchAsk, answer: BenchAnswer, atIso: string): BenchStep {
  const state: BenchState = { ...asked, asked: null };
  if (!answer.ok) return takeRefusal(state, ask, answer, atIso);
  switch (answer.kind) {
    case 'badge':
      return stay({
        ...state,
        phase: { kind: 'pin', ...answer.value, badgeReadIso: atIso, retryAtIso: null, problem: null },
      });
    case 'pin': {
      const signedIn = { ...state, operator: answer.value.operator, standing: answer.value.standing };
      return stay(
        state.pendingBin ? rest(signedIn) : { ...signedIn, phase: { kind: 'choose-lot', lots: answer.value.lots } },
      );
    }
    case 'lot':
      return stay(rest({ ...state, ...answer.value, trial: null, last: null }));
    case 'lots':
      return stay({
        ...state,
        lot: null,
        next: null,
        trial: null,
        last: null,
        phase: { kind: 'choose-lot', lots: answer.value.lots },
      });
    case 'board':
      return stay(
        {
          ...state,
          phase: { kind: 'run', serial: answer.value.plan.serial, check: answer.value.check },
          fixture: { ...state.fixture, seenEmpty: false, heldSerial: answer.value.plan.serial },
          ready: { ...state.ready, supplyOff: false },
        },
        { kind: 'start-run', ...answer.value },
      );
    case 'offer': {
      const { standing, ...trial } = answer.value;
      return stay(rest({ ...state, standing, trial, last: null }));
    }
    case 'end-offer':
      return leaveTrial(state);
    case 'reference':
      if (state.phase.kind !== 'commissioning') return stay(state);
      return seated({ ...state, phase: { ...state.phase, reference: answer.value, what: say('commissioning-seat') } });
    case 'bin':
      return stay(rest({ ...state, pendingBin: null, lot: answer.value.lot ?? state.lot }), { kind: 'read-standing' });
    case 'call-engineer':
      return stay({ ...state, standing: { ...state.standing, call: answer.value.call } });
    case 'print-label':
      return stay({ ...state, standing: { ...state.standing, label: answer.value.label } });
    case 'component-batch':
      return stay(state);
  }
}

/** A controller that already sees the board under a closed lid begins at once. */
export function seated(state: BenchState): BenchStep {
  const { lidClosed, boardPresent } = state.fixture;
  return state.station.hasController && lidClosed && boardPresent ? startCommissioning(state) : stay(state);
}

function takeRefusal(state: BenchState, ask: BenchAsk, answer: BenchRefusal, atIso: string): BenchStep {
  const retryAtIso = answer.retryAtIso ?? null;
  if (ask.kind === 'pin' && state.phase.kind === 'pin')
    return stay({ ...state, phase: { ...state.phase, problem: answer.refusal, retryAtIso } });
  if (state.trial && answer.refusal.code === 'offer-ended') return leaveTrial(state, { ...answer.refusal, atIso });
  return refuse(state, answer.refusal, atIso, ask.kind === 'board' ? ask.serial : null);
}
