import type { Say } from '../contracts/bench-view';
import { say } from './sayings';
import { askServer, atRest, refuse, rest, stay } from './step';
import type { BenchState, BenchStep } from './types';

/** Engineering runs of an offered draft, begun and left between boards. */

/** Whoever is signed in asks; the server decides whether they may. */
export function startTrial(state: BenchState, offerId: string, atIso: string): BenchStep {
  if (!atRest(state) || state.trial) return refuse(state, say('not-now'), atIso);
  return askServer(state, { kind: 'offer', offerId });
}

export function endTrial(state: BenchState, atIso: string): BenchStep {
  if (!atRest(state) || !state.trial) return refuse(state, say('not-now'), atIso);
  return askServer(state, { kind: 'end-offer', offerId: state.trial.offer.offerId });
}

/** The offer was taken back while the trial went on. */
export function offerHasEnded({ trial, standing }: BenchState): boolean {
  return trial !== null && standing.offer?.offerId !== trial.offer.offerId;
}

/** Back to the lot, or to the choice of one; `because` is shown there. */
export function leaveTrial(state: BenchState, because: (Say & { atIso: string }) | null = null): BenchStep {
  const left: BenchState = { ...state, trial: null, last: null };
  const { state: next, effects } = left.lot
    ? stay(rest(left), { kind: 'read-standing' })
    : askServer({ ...left, phase: { kind: 'choose-lot', lots: [] } }, { kind: 'lots' });
  return stay({ ...next, refusal: because && { ...because, serial: null } }, ...effects);
}
