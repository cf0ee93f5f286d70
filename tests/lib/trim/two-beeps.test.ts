import { describe, expect, it } from 'vitest';
import { pointsAt } from '../../../lib/trim/board-model';
import { beginTrim, nextTrimCommand, observeTrim, viewTrim, type TrimState } from '../../../lib/trim/trim';
import type { TrimOutcome } from '../../../lib/trim/types';
import { drive, foundAt, unresolved } from './drive';
import { plainDesign, plainSettings, pointsOf } from './trim-fixtures';

const begin = (tripVolts: number, changes: Partial<typeof plainSettings> = {}) => {
  const settings = { ...plainSettings, ...changes };
  return beginTrim(settings, pointsOf(settings.design, tripVolts), 1000);
};
const outcomeOf = (state: TrimState): TrimOutcome => {
  const command = nextTrimCommand(state);
  if (command.kind !== 'finished') throw new Error('not over');
  return command.outcome;
};
const prompting = (state: TrimState) => viewTrim(state).direction !== null;

describe('two beeps', () => {
  it('leaves a board found on target as it is', () => {
    expect(outcomeOf(begin(9.985))).toMatchObject({ kind: 'trimmed', tripVolts: 9.985, rounds: 0, turnsAdvised: 0 });
  });

  it('waits 0.15 V short of the target with the output on while the point rises', () => {
    const state = begin(9);
    const command = nextTrimCommand(state);
    expect(command).toMatchObject({ kind: 'hold' });
    if (command.kind !== 'hold') return;
    expect(command.volts).toBeCloseTo(9.85, 2);
    // Armed above the release point that belongs to the hold.
    expect(Math.max(...command.waypointsVolts)).toBeGreaterThan(pointsOf(plainDesign, 9.85).releaseVolts + 0.04);
    const prompted = drive(state, () => undefined, prompting);
    // 1 V on a board of 0.69 V a turn at the target, less at 9 V.
    expect(viewTrim(prompted)).toMatchObject({ stage: 'beep-1', direction: 'clockwise', round: 1 });
    expect(viewTrim(prompted).turns).toBeCloseTo(1.38, 1);
  });

  it('waits with the output off below the release point while the point falls', () => {
    const state = begin(10.6);
    const command = nextTrimCommand(state);
    if (command.kind !== 'hold') throw new Error('no hold');
    expect(command.volts).toBeCloseTo(pointsOf(plainDesign, 9.98).releaseVolts, 2);
    expect(Math.min(...command.waypointsVolts)).toBeLessThan(9.95);
    const prompted = drive(state, () => ({ kind: 'held', volts: command.volts, output: 'off' }), prompting);
    expect(viewTrim(prompted)).toMatchObject({ stage: 'beep-1', direction: 'anticlockwise' });
  });

  it('goes straight to the slow turn from a point just short of the target', () => {
    const prompted = drive(begin(9.9), () => undefined, prompting);
    expect(viewTrim(prompted)).toMatchObject({ stage: 'beep-2', direction: 'clockwise' });
    // 17 mV ahead: 0.1 turn a second for the reaction, half a poll and the settling of the hand.
    expect(viewTrim(prompted).heldVolts).toBeCloseTo(9.983, 3);
    expect(viewTrim(prompted).paceTurnsPerSecond).toBeCloseTo(0.1, 2);
  });

  it('turns back further where the release point is already below the hold', () => {
    const first = begin(9.99, { toleranceVolts: 0.005 });
    const hold = nextTrimCommand(first);
    const again = observeTrim(first, { kind: 'held', volts: 10.3, output: 'on', atMs: 2000 });
    const lower = nextTrimCommand(again);
    if (hold.kind !== 'hold' || lower.kind !== 'hold') throw new Error('no hold');
    expect(lower.volts).toBeLessThan(hold.volts - 0.09);
    expect(viewTrim(again).direction).toBeNull();
  });

  it('turns back once more where the board trips at once at the second hold', () => {
    const armed = drive(
      begin(9.9),
      (command) => (command.kind === 'hold' ? { kind: 'held', volts: command.volts, output: 'off' } : undefined),
      (state) => viewTrim(state).direction !== null,
    );
    expect(viewTrim(armed)).toMatchObject({ stage: 'beep-1', direction: 'anticlockwise' });
  });

  it('pauses after each beep, then verifies near the target with the end check', () => {
    const heard = drive(
      begin(9),
      (command) => (command.kind === 'sense' ? { kind: 'sensed', output: 'off' } : undefined),
      (state) => viewTrim(state).stage === 'beep-1-heard',
    );
    expect(nextTrimCommand(heard)).toEqual({ kind: 'wait', milliseconds: 1200 });
    const verifying = drive(
      heard,
      (command) => (command.kind === 'sense' ? { kind: 'sensed', output: 'off' } : undefined),
      (state) => nextTrimCommand(state).kind === 'search',
    );
    expect(viewTrim(verifying).stage).toBe('beep-2-heard');
    expect(nextTrimCommand(verifying)).toMatchObject({
      kind: 'search',
      check: true,
      wantedUncertaintyVolts: 0.001,
      prior: { tripMeanVolts: 10, tripSdVolts: 0.03 },
    });
    const over = drive(verifying, () => ({ kind: 'searched', result: foundAt(10.006) }));
    expect(outcomeOf(over)).toMatchObject({ kind: 'trimmed', tripVolts: 10.006, rounds: 1 });
  });
});

describe('findings of two beeps', () => {
  /** A hand that always stops at the beep, and a board that is `missesBy` off each time. */
  const missing = (results: () => ReturnType<typeof foundAt>) =>
    drive(begin(9), (command, state) => {
      if (command.kind === 'search') return { kind: 'searched', result: results() };
      const rising = state.phase.kind === 'beeps' && 'watch' in state.phase && state.phase.watch.rising;
      if (command.kind === 'hold') return { kind: 'held', volts: command.volts, output: rising ? 'on' : 'off' };
      if (command.kind === 'sense') return { kind: 'sensed', output: rising ? 'off' : 'on' };
      return undefined;
    });

  it('too many rounds: fails after the rounds allowed', () => {
    expect(outcomeOf(missing(() => foundAt(9.95)))).toMatchObject({
      kind: 'failed',
      finding: 'too-many-rounds',
      rounds: 8,
      lastTripVolts: 9.95,
    });
  });

  it('not steady: an unresolved verification is repeated once, without a prior', () => {
    let searches = 0;
    const end = missing(() => (searches++, unresolved));
    expect(searches).toBe(2);
    expect(outcomeOf(end)).toMatchObject({ kind: 'failed', finding: 'not-steady' });
  });

  const silent = (volts: number) => drive(begin(volts), () => undefined, prompting);

  it('wrong way: shows how far the point went, asks on from there, and ends nothing', () => {
    const told = drive(
      silent(9.5),
      // A peek at or below 9.45 V answers: the point fell there from 9.5 V.
      (command) =>
        command.kind === 'hold'
          ? { kind: 'held', volts: command.volts, output: command.volts > 9.4 ? 'on' : 'off' }
          : undefined,
      (state) => viewTrim(state).finding !== null && prompting(state),
    );
    const view = viewTrim(told);
    expect(view).toMatchObject({ finding: 'wrong-way', direction: 'clockwise', stage: 'beep-1' });
    expect(view.findingVolts).toBeGreaterThan(0.06);
    expect(view.findingVolts).toBeLessThan(0.13);
    expect(view.turns!).toBeGreaterThan(0.6);
  });

  it('wrong way twice in a row: takes the screw to work the other way round', () => {
    let at = 9.45;
    let told = silent(9.5);
    for (let time = 0; time < 2; time++) {
      const limit = at;
      const before = told.prompts;
      told = drive(
        told,
        (command) =>
          command.kind === 'hold'
            ? { kind: 'held', volts: command.volts, output: command.volts > limit ? 'on' : 'off' }
            : undefined,
        (state) => state.prompts > before,
      );
      at -= 0.4;
    }
    expect(viewTrim(told)).toMatchObject({ finding: 'wrong-way', direction: 'anticlockwise' });
  });

  /** The board trips between the places looked at: nothing moved. */
  const unmoved = (state: TrimState, until?: (state: TrimState) => boolean) =>
    drive(
      state,
      (command) =>
        command.kind === 'hold'
          ? { kind: 'held', volts: command.volts, output: command.volts > 9 ? 'on' : 'off' }
          : undefined,
      until,
    );
  const told = (state: TrimState) => viewTrim(state).finding === 'no-effect';

  it('no effect: told after twelve seconds at the first prompt, final a minute later', () => {
    const shown = unmoved(silent(9), told);
    expect(viewTrim(shown)).toMatchObject({ finding: 'no-effect', stage: 'beep-1' });
    expect(viewTrim(shown).findingVolts).toBeGreaterThanOrEqual(12);
    const end = unmoved(shown);
    expect(end.atMs - shown.atMs).toBeGreaterThan(60_000);
    expect(outcomeOf(end)).toMatchObject({ kind: 'failed', finding: 'no-effect', lastTripVolts: 9 });
  });

  it('no effect: the screw found starts the prompt again, and the second time is final', () => {
    const shown = unmoved(silent(9), told);
    const found = observeTrim(shown, { kind: 'screw-found', atMs: shown.atMs + 3000 });
    expect(viewTrim(found).finding).toBeNull();
    const end = unmoved(found);
    expect(outcomeOf(end)).toMatchObject({ kind: 'failed', finding: 'no-effect' });
    expect(end.atMs - found.atMs).toBeLessThan(20_000);
  });

  it('no effect: a beep after it clears the finding', () => {
    const shown = unmoved(silent(9), told);
    const heard = drive(
      shown,
      (command) => (command.kind === 'sense' ? { kind: 'sensed', output: 'off' } : undefined),
      (state) => viewTrim(state).stage === 'beep-1-heard',
    );
    expect(viewTrim(heard).finding).toBeNull();
  });

  it('will not turn: final at once; after no effect was measured, that is the finding', () => {
    const prompted = silent(9);
    const pressed = observeTrim(prompted, { kind: 'will-not-turn', atMs: prompted.atMs + 10 });
    expect(outcomeOf(pressed)).toMatchObject({ kind: 'failed', finding: 'will-not-turn' });
    const shown = unmoved(prompted, told);
    const after = observeTrim(shown, { kind: 'will-not-turn', atMs: shown.atMs + 10 });
    expect(outcomeOf(after)).toMatchObject({ kind: 'failed', finding: 'no-effect' });
  });

  it('end of travel: no effect with the screw at its estimated end is that finding', () => {
    // Padded so that the end that raises most trips below the target; the screw stands 2 per cent before it.
    const design = { ...plainDesign, trimmerOhms: 1200, supplyEndOhms: 2820, groundEndOhms: 5980 };
    const trip = pointsAt(design, 0.02).tripVolts;
    expect(trip).toBeLessThan(9.6);
    const state = beginTrim({ ...plainSettings, design }, pointsOf(design, trip), 0);
    const end = drive(state, (command) =>
      command.kind === 'hold'
        ? { kind: 'held', volts: command.volts, output: command.volts > trip ? 'on' : 'off' }
        : undefined,
    );
    expect(outcomeOf(end)).toMatchObject({ kind: 'failed', finding: 'end-of-travel' });
  });
});
