import type { Say } from '../contracts/bench-view';
import { askServer, refuse, stay } from './step';
import { say } from './sayings';
import type { BenchState, BenchStep } from './types';

/** What about the station itself forbids energising the fixture now; null when nothing does. */
export function notReadyToEnergise(state: BenchState): Say | null {
  const { ready } = state;
  if (ready.databaseAway) return say('database-away');
  if (!ready.opened) return say('opening-instruments');
  if (ready.linksDown.length > 0) return say('instruments-away');
  const [stranger] = ready.strangers;
  if (stranger) return say('wrong-instrument', { which: stranger });
  if (!ready.supplyOff) return say('supply-not-confirmed-off');
  return null;
}

/**
 * A board was scanned, typed or is tried again. The fixture must have been seen empty since the last run, so that one good
 * board cannot be tested under many serial numbers; only the board that is still in it may go again.
 */
export function startBoard(state: BenchState, serial: string, byHand: boolean, atIso: string): BenchStep {
  const problem = notReadyToEnergise(state);
  if (problem) return refuse(state, problem, atIso, serial);
  const { fixture } = state;
  if (!fixture.seenEmpty && fixture.heldSerial !== serial) {
    if (!state.station.hasController)
      return stay({ ...state, refusal: null, phase: { kind: 'idle', next: { serial, byHand } } });
    const refusal = fixture.heldSerial
      ? say('other-board', { scanned: serial, held: fixture.heldSerial })
      : say('empty-fixture-first');
    return refuse(state, refusal, atIso, serial);
  }
  const { lot, trial } = state;
  const offerId = trial?.offer.offerId ?? null;
  return askServer(state, { kind: 'board', serial, lotId: lot?.lotId ?? null, offerId, byHand });
}

/** The operator says that the fixture is empty: only where no controller can see it. */
export function confirmEmpty(state: BenchState, atIso: string): BenchStep {
  const { phase } = state;
  if (state.station.hasController || (phase.kind !== 'idle' && phase.kind !== 'over'))
    return refuse(state, say('not-now'), atIso);
  const emptied: BenchState = {
    ...state,
    refusal: null,
    fixture: { ...state.fixture, seenEmpty: true, heldSerial: null },
    phase: { kind: 'idle', next: null },
  };
  if (phase.kind === 'idle' && phase.next) return startBoard(emptied, phase.next.serial, phase.next.byHand, atIso);
  return stay(emptied);
}
