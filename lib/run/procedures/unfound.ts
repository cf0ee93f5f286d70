import type { Ending } from '../../decision/decide-verdict';
import { firstOf } from '../../sequence/enabled-steps';
import type { SearchResult } from '../../search/types';
import type { Answer, Learned, ProcedureTurn, StepContext } from '../machine';
import { contactLost, contactMeasurement } from './contact-result';
import type { Measurement } from '../types';
import { advanceContactCheck, beginContactCheck, type ContactCheck } from './contact-check';

export type NotFound = Exclude<SearchResult, { kind: 'found' }>;
export type Unfound = { stage: 'current' } | { stage: 'contact'; check: ContactCheck };
export type UnfoundResult = Learned & { ending: Ending };
type UnfoundTurn = ProcedureTurn<Unfound, UnfoundResult>;

const reject = (rejection: Omit<Extract<Ending, { kind: 'reject' }>, 'kind'>): UnfoundTurn => ({
  result: { ending: { kind: 'reject', ...rejection } },
});

/**
 * What a search without a result says about the board. A board that is never on is asked for its supply current, an
 * unresolved one is judged only when its contacts still hold.
 */
export function beginUnfound(result: NotFound, { plan }: StepContext): UnfoundTurn {
  switch (result.kind) {
    case 'stuck-on':
      return reject({ reason: 'never-off', cause: 'output-shorted', measured: null });
    case 'chatter': {
      const volts = result.release.volts - result.trip.volts;
      const limit = plan.boardType.limits.hysteresisVolts.min;
      return reject({
        reason: 'output-chatters',
        cause: 'feedback-open',
        measured: { value: Math.max(0, volts), unit: 'V', limit },
      });
    }
    case 'stuck-off':
      return { machine: { stage: 'current' }, ask: { kind: 'measure-supply' } };
    case 'unresolved': {
      const seat = firstOf(plan.sequence, 'seat');
      if (!seat) return notSteady([]);
      const { machine, ask } = beginContactCheck(seat.contactCheck);
      return { machine: { stage: 'contact', check: machine }, ask };
    }
  }
}

/** Below this share of the board's own current, the comparator does not draw its part. */
const lowCurrentShare = 0.7;

export function advanceUnfound(machine: Unfound, answer: Answer, context: StepContext): UnfoundTurn | null {
  if (machine.stage === 'current') {
    if (answer.kind !== 'supply-measured') return null;
    const low = answer.amps < lowCurrentShare * context.plan.boardType.design.quiescentAmps;
    return reject({ reason: 'never-on', cause: low ? 'op-amp-missing-or-dead' : null, measured: null });
  }
  const turn = advanceContactCheck(machine.check, answer, context);
  if (!turn) return null;
  if ('ask' in turn) return { machine: { stage: 'contact', check: turn.machine }, ask: turn.ask };
  const measurements = [contactMeasurement(turn.result, machine.check.settings, context)];
  if (!turn.result.holds) return { result: { ending: contactLost(turn.result), measurements } };
  return notSteady(measurements);
}

function notSteady(measurements: Measurement[]): UnfoundTurn {
  return {
    result: {
      ending: { kind: 'reject', reason: 'point-not-steady', cause: 'noisy-wiper-or-contact', measured: null },
      measurements,
    },
  };
}
