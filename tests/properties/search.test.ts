import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { beginSearch, nextSearchCommand, observeSearch, type SearchState } from '@/lib/search/search';
import { pointsOf, searchInTest, settings12 } from '../lib/search/search-in-test';

/** Boards of the 12 V type that may lie anywhere the supply reaches, with a seed for their noise. */
const anyBoard = fc
  .record({
    trip: fc.double({ min: 6.5, max: 11.5, noNaN: true }),
    share: fc.double({ min: 0, max: 1, noNaN: true }),
    seed: fc.integer({ min: 1, max: 1_000_000 }),
  })
  .map(({ trip, share, seed }) => ({ trip, release: trip + 0.02 + share * (11.93 - trip - 0.02), seed }));
const ordinaryBoard = fc
  .record({
    trip: fc.double({ min: 8.05, max: 10.3, noNaN: true }),
    hysteresis: fc.double({ min: 0.25, max: 1.45, noNaN: true }),
    seed: fc.integer({ min: 1, max: 1_000_000 }),
  })
  .map(({ trip, hysteresis, seed }) => ({ trip, release: trip + hysteresis, seed }));

const runs = { numRuns: 15 };

describe('any board that the supply can reach', () => {
  test('is found within six standard uncertainties and half a guard, or called unresolved', () => {
    fc.assert(
      fc.property(anyBoard, ({ seed, ...board }) => {
        const { result } = searchInTest(board, { seed });
        if (result.kind === 'unresolved') return;
        const { trip, release } = pointsOf(result);
        expect(Math.abs(trip.volts - board.trip)).toBeLessThan(5e-3);
        expect(Math.abs(release.volts - board.release)).toBeLessThan(5e-3);
      }),
      runs,
    );
  });

  test('is never commanded below the minimum, above the maximum, nor taken above it by an overshoot', () => {
    fc.assert(
      fc.property(
        anyBoard,
        fc.double({ min: 0.02, max: 0.08, noNaN: true }),
        fc.double({ min: -0.01, max: 0.01, noNaN: true }),
        ({ seed, ...board }, overshoot, offsetVolts) => {
          const { commands, plant } = searchInTest(board, {
            seed,
            settings: { overshoot },
            plant: { overshoot: { falling: overshoot, rising: overshoot }, offsetVolts },
          });
          for (const { volts } of commands) {
            expect(volts).toBeGreaterThanOrEqual(settings12.supplyMinVolts);
            expect(volts).toBeLessThanOrEqual(settings12.supplyMaxVolts);
          }
          expect(plant.peakVolts).toBeLessThanOrEqual(settings12.supplyMaxVolts + 1e-3);
        },
      ),
      runs,
    );
  });
});

describe('laws', () => {
  test('shifted by a constant: volts shift with it', () => {
    fc.assert(
      fc.property(ordinaryBoard, fc.double({ min: -2, max: 8, noNaN: true }), ({ seed, ...board }, shift) => {
        const here = pointsOf(searchInTest(board, { seed }).result);
        const there = pointsOf(
          searchInTest(
            { trip: board.trip + shift, release: board.release + shift },
            {
              seed,
              settings: {
                supplyMinVolts: settings12.supplyMinVolts + shift,
                supplyMaxVolts: settings12.supplyMaxVolts + shift,
                tripMinVolts: settings12.tripMinVolts + shift,
                tripMaxVolts: settings12.tripMaxVolts + shift,
              },
            },
          ).result,
        );
        // Rounding may turn a tie between two commands, after which the noise differs: equal within their uncertainty.
        for (const point of ['trip', 'release'] as const) {
          const apart = Math.abs(there[point].volts - shift - here[point].volts);
          const sd = Math.hypot(there[point].standardUncertaintyVolts, here[point].standardUncertaintyVolts);
          expect(apart).toBeLessThan(6 * sd);
        }
      }),
      runs,
    );
  });

  test('scaled to twice the volts: found as well, with at most a third more settles', () => {
    fc.assert(
      fc.property(ordinaryBoard, ({ seed, ...board }) => {
        const once = pointsOf(searchInTest(board, { seed }).result);
        const { supplyMinVolts, supplyMaxVolts, tripMinVolts, tripMaxVolts, hysteresisMinVolts, hysteresisMaxVolts } =
          settings12;
        const twice = pointsOf(
          searchInTest(
            { trip: 2 * board.trip, release: 2 * board.release },
            {
              seed,
              settings: {
                supplyMinVolts: 2 * supplyMinVolts,
                supplyMaxVolts: 2 * supplyMaxVolts,
                tripMinVolts: 2 * tripMinVolts,
                tripMaxVolts: 2 * tripMaxVolts,
                hysteresisMinVolts: 2 * hysteresisMinVolts,
                hysteresisMaxVolts: 2 * hysteresisMaxVolts,
                noiseVolts: 2e-3,
                wantedUncertaintyVolts: 1e-3,
              },
            },
          ).result,
        );
        expect(Math.abs(twice.trip.volts - 2 * board.trip)).toBeLessThan(6e-3);
        expect(Math.abs(twice.release.volts - 2 * board.release)).toBeLessThan(6e-3);
        expect(twice.settles).toBeLessThan(once.settles * 1.34 + 12);
      }),
      runs,
    );
  });

  test('the order of boards does not matter: no search leaves a trace in the next', () => {
    fc.assert(
      fc.property(ordinaryBoard, anyBoard, ({ seed: a, ...first }, { seed: b, ...second }) => {
        const before = [searchInTest(first, { seed: a }).result, searchInTest(second, { seed: b }).result];
        const after = [searchInTest(second, { seed: b }).result, searchInTest(first, { seed: a }).result].reverse();
        expect(after).toEqual(before);
      }),
      { numRuns: 6 },
    );
  });

  test('two searches that take turns do not disturb each other', () => {
    fc.assert(
      fc.property(ordinaryBoard, anyBoard, ({ seed: a, ...first }, { seed: b, ...second }) => {
        const alone = searchInTest(first, { seed: a });
        const other = searchInTest(second, { seed: b });
        let otherState = beginSearch(settings12, other.start);
        let at = 0;
        const turns = searchInTest(first, {
          seed: a,
          before: () => {
            if (at < other.observations.length) otherState = observeSearch(otherState, other.observations[at++]!);
          },
        });
        expect(turns.result).toEqual(alone.result);
      }),
      { numRuns: 6 },
    );
  });

  test('a search replays from its settings and observations alone', () => {
    fc.assert(
      fc.property(anyBoard, ({ seed, ...board }) => {
        const { result, start, observations, commands } = searchInTest(board, { seed });
        let state: SearchState = beginSearch(settings12, start);
        observations.forEach((seen, i) => {
          const { volts, dwell } = commands[i]!;
          expect(nextSearchCommand(state)).toEqual({ kind: 'apply', volts, dwell });
          state = observeSearch(state, seen);
        });
        expect(nextSearchCommand(state)).toEqual({ kind: 'finished', result });
      }),
      { numRuns: 8 },
    );
  });

  test('the state survives structured cloning at any moment', () => {
    fc.assert(
      fc.property(anyBoard, ({ seed, ...board }) => {
        const { result } = searchInTest(board, { seed });
        const cloned = searchInTest(board, { seed, before: (state) => structuredClone(state) });
        expect(cloned.result).toEqual(result);
      }),
      { numRuns: 6 },
    );
  });

  test('observing leaves the state it started from untouched', () => {
    const { observations, start } = searchInTest({ trip: 9.3, release: 9.9 });
    const first = observations[0]!;
    const state = beginSearch(settings12, start);
    const kept = structuredClone(state);
    observeSearch(state, first);
    expect(state).toEqual(kept);
  });
});
