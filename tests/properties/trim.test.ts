import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SearchResult } from '../../lib/search/types';
import { beginTrim, nextTrimCommand, observeTrim, viewTrim, type TrimState } from '../../lib/trim/trim';
import type { TrimCommand, TrimObservation, TrimSettings } from '../../lib/trim/types';
import { seededRandom, type Random } from '../figures/random';
import { plainDesign, plainSettings, pointsOf } from '../lib/trim/trim-fixtures';

const procedures = ['two-beeps', 'prompted', 'wiper-probe'] as const;

const settingsArbitrary: fc.Arbitrary<TrimSettings> = fc
  .record({
    procedure: fc.constantFrom(...procedures),
    fastLink: fc.boolean(),
    toleranceVolts: fc.constantFrom(0.005, 0.01, 0.02, 0.05),
    mostRounds: fc.integer({ min: 1, max: 8 }),
    turns: fc.constantFrom(0.75, 4, 25),
    clockwise: fc.constantFrom('raises' as const, 'lowers' as const),
    supplyMaxVolts: fc.double({ min: 10.9, max: 14, noNaN: true }),
    referenceVolts: fc.constantFrom(null, 5.5, 5.6, 5.7),
  })
  .map(({ turns, clockwise, ...rest }) => ({
    ...plainSettings,
    ...rest,
    trimmer: { turns, clockwise, backlashTurns: 0.01 },
  }));
const startVolts = fc.double({ min: 7.5, max: 11.5, noNaN: true });
const seedArbitrary = fc.integer({ min: 1, max: 1e9 });

/** Any answer that a station could give, sensible or not; time passes with every one. */
function anyAnswer(command: TrimCommand, random: Random, atMs: number): TrimObservation {
  const output = random.uniform(0, 1) < 0.5 ? 'on' : 'off';
  const later = { atMs: atMs + random.uniform(20, 4000) };
  const odd = random.uniform(0, 1);
  if (odd < 0.002) return { kind: 'screw-found', ...later };
  switch (command.kind) {
    case 'hold':
      return { kind: 'held', volts: command.volts, output, ...later };
    case 'probe':
      return { kind: 'probed', volts: command.volts, output, ...later };
    case 'sense':
      return { kind: 'sensed', output: random.uniform(0, 1) < 0.9 ? 'on' : 'off', ...later };
    case 'read-wiper':
      return {
        kind: 'wiper',
        wiperVolts: random.uniform(4.5, 6.5),
        supplyVolts: random.uniform(10.3, 10.9),
        ...later,
      };
    case 'wait':
      return { kind: 'waited', ...later };
    case 'search':
      return { kind: 'searched', result: anyResult(random, odd), ...later };
    case 'finished':
      throw new Error('nothing to answer');
  }
}

function anyResult(random: Random, odd: number): SearchResult {
  const counts = { settles: 30, waypoints: 8, endCheckSettles: 7 };
  if (odd < 0.1) return { kind: 'unresolved', trip: null, release: null, ...counts };
  if (odd < 0.13) return { kind: 'stuck-on', ...counts };
  if (odd < 0.16) return { kind: 'stuck-off', ...counts };
  const volts = random.uniform(9.5, 10.5);
  const point = (at: number) => ({ volts: at, standardUncertaintyVolts: 0.0008 });
  return { kind: 'found', trip: point(volts), release: point(volts + random.uniform(0.2, 0.6)), ...counts };
}

/** Runs a trim on arbitrary answers, showing each state to `look`; the last state is over. */
function runAny(
  settings: TrimSettings,
  tripVolts: number,
  seed: number,
  look: (state: TrimState, before: TrimState | null) => void = () => {},
): TrimState {
  const random = seededRandom(seed);
  let state = beginTrim(settings, pointsOf(plainDesign, tripVolts), 0);
  look(state, null);
  for (let count = 0; count < 30_000; count++) {
    const command = nextTrimCommand(state);
    if (command.kind === 'finished') return state;
    const before = state;
    state = observeTrim(state, anyAnswer(command, random, state.atMs));
    look(state, before);
  }
  throw new Error('the trim did not end');
}

const few = { numRuns: 60 };

describe('laws of a trim', () => {
  it('ends in a bounded number of prompts, whatever is observed', () => {
    fc.assert(
      fc.property(settingsArbitrary, startVolts, seedArbitrary, (settings, trip, seed) => {
        const end = runAny(settings, trip, seed);
        expect(end.prompts).toBeLessThanOrEqual(3 * settings.mostRounds + 3);
        const command = nextTrimCommand(end);
        if (command.kind === 'finished') expect(command.outcome.rounds).toBeLessThanOrEqual(settings.mostRounds);
      }),
      few,
    );
  });

  it('asks for more than nothing, never more than four turns, and shows words and direction with them', () => {
    fc.assert(
      fc.property(settingsArbitrary, startVolts, seedArbitrary, (settings, trip, seed) => {
        runAny(settings, trip, seed, (state) => {
          const view = viewTrim(state);
          if (view.turns === null) return expect(view.direction).toBeNull();
          expect(view.turns).toBeGreaterThanOrEqual(0);
          expect(view.turns).toBeLessThanOrEqual(4);
          expect(view.direction).not.toBeNull();
          expect(view.words).not.toBeNull();
          // Never past the end of the travel, by more than the play that is taken up.
          expect(view.turns).toBeLessThanOrEqual(settings.trimmer.turns * 1.4 + settings.trimmer.backlashTurns);
        });
      }),
      few,
    );
  });

  it('never commands the supply out of its range, nor peaks above the maximum', () => {
    fc.assert(
      fc.property(settingsArbitrary, startVolts, seedArbitrary, (settings, trip, seed) => {
        let at: number | null = null;
        const { supplyMinVolts: min, supplyMaxVolts: max, overshoot } = settings;
        runAny(settings, trip, seed, (state, before) => {
          const command = nextTrimCommand(state);
          if (before && nextTrimCommand(before) === command) return;
          if (command.kind === 'search') at = null;
          if (command.kind !== 'hold' && command.kind !== 'probe') return;
          const volts = command.kind === 'hold' ? [...command.waypointsVolts, command.volts] : [command.volts];
          for (const next of volts) {
            const from = at ?? min;
            expect(next).toBeGreaterThanOrEqual(min);
            expect(next + overshoot * Math.max(0, next - from)).toBeLessThanOrEqual(max + 0.0012);
            at = next;
          }
        });
      }),
      few,
    );
  });

  it('mirrors its advice where clockwise lowers, and is the same in all else', () => {
    fc.assert(
      fc.property(settingsArbitrary, startVolts, seedArbitrary, (settings, trip, seed) => {
        const record = (clockwise: 'raises' | 'lowers') => {
          const seen: unknown[] = [];
          runAny({ ...settings, trimmer: { ...settings.trimmer, clockwise } }, trip, seed, (state) => {
            const { direction, ...rest } = viewTrim(state);
            const mirrored = direction === null || clockwise === 'raises' ? direction : opposite[direction];
            seen.push({ command: nextTrimCommand(state), ...rest, direction: mirrored });
          });
          return seen;
        };
        expect(record('lowers')).toEqual(record('raises'));
      }),
      { numRuns: 25 },
    );
  });

  it('is deterministic, and goes on the same from a structured clone, leaving the state before untouched', () => {
    fc.assert(
      fc.property(settingsArbitrary, startVolts, seedArbitrary, (settings, trip, seed) => {
        const once = runAny(settings, trip, seed);
        let kept: { state: TrimState; copy: TrimState } | null = null;
        const random = seededRandom(seed);
        let state = beginTrim(settings, pointsOf(plainDesign, trip), 0);
        for (let command = nextTrimCommand(state); command.kind !== 'finished'; command = nextTrimCommand(state)) {
          if (kept) expect(kept.state).toEqual(kept.copy);
          kept = { state, copy: structuredClone(state) };
          state = observeTrim(structuredClone(state), anyAnswer(command, random, state.atMs));
        }
        expect(state).toEqual(once);
      }),
      { numRuns: 20 },
    );
  });

  it('hands on what the operator says at any moment: will not turn ends it there', () => {
    fc.assert(
      fc.property(settingsArbitrary, startVolts, seedArbitrary, fc.nat(40), (settings, trip, seed, after) => {
        let count = 0;
        runAny(settings, trip, seed, (state) => {
          if (count++ !== after || nextTrimCommand(state).kind === 'finished') return;
          const end = nextTrimCommand(observeTrim(state, { kind: 'will-not-turn', atMs: state.atMs + 1 }));
          expect(end).toMatchObject({ kind: 'finished', outcome: { kind: 'failed' } });
        });
      }),
      few,
    );
  });
});

const opposite = { clockwise: 'anticlockwise', anticlockwise: 'clockwise' } as const;
