import { describe, expect, test } from 'vitest';
import { beginSearch, nextSearchCommand, observeSearch } from '@/lib/search/search';
import { pointsOf, searchInTest, settings12 } from './search-in-test';

const board = { trip: 9.312, release: 9.934 };
const millivolts = (a: number, b: number) => Math.abs(a - b) * 1e3;

describe('a sound board', () => {
  test('is found within five of the standard uncertainties it reports', () => {
    const { trip, release } = pointsOf(searchInTest(board).result);
    expect(Math.abs(trip.volts - board.trip)).toBeLessThan(5 * trip.standardUncertaintyVolts);
    expect(Math.abs(release.volts - board.release)).toBeLessThan(5 * release.standardUncertaintyVolts);
    expect(Math.max(trip.standardUncertaintyVolts, release.standardUncertaintyVolts)).toBeLessThanOrEqual(0.5e-3);
  });

  test('counts every command once: settles with waypoints, and the end check apart', () => {
    const { result, commands } = searchInTest(board);
    expect(result.settles + result.endCheckSettles).toBe(commands.length);
    expect(result.waypoints).toBeLessThanOrEqual(commands.filter(({ dwell }) => dwell === 'waypoint').length);
    expect(result.waypoints).toBeGreaterThan(0);
    expect(result.endCheckSettles).toBeGreaterThanOrEqual(4);
  });

  test('is found from above with its output on', () => {
    const { trip, release } = pointsOf(searchInTest(board, { plant: { startVolts: 11.8, startOutput: 'on' } }).result);
    expect(millivolts(trip.volts, board.trip)).toBeLessThan(3);
    expect(millivolts(release.volts, board.release)).toBeLessThan(3);
  });

  test('skips the end check where it is not wanted', () => {
    expect(searchInTest(board, { settings: { endCheck: false } }).result).toMatchObject({
      kind: 'found',
      endCheckSettles: 0,
    });
  });

  test.each([
    ['offset 12 mV', { offsetVolts: 0.012 }],
    ['offset -12 mV, gain 0.05 %', { offsetVolts: -0.012, gain: 5e-4 }],
    ['resolution 2 mV', { resolutionVolts: 0.002, offsetVolts: 0.003 }],
    ['reading noise 0.3 mV', { readingNoiseVolts: 0.3e-3 }],
  ])('is found by the meter, not by the setpoint: %s', (_, plant) => {
    for (let seed = 1; seed <= 8; seed++) {
      const { trip, release } = pointsOf(searchInTest(board, { plant, seed }).result);
      expect(millivolts(trip.volts, board.trip)).toBeLessThan(3);
      expect(millivolts(release.volts, board.release)).toBeLessThan(3);
    }
  });
});

describe('a defective board', () => {
  test('that never goes off is stuck on', () => {
    expect(searchInTest({ trip: 0, release: 0, stuck: 'on' }).result.kind).toBe('stuck-on');
  });

  test('that never comes on is stuck off, after two settles at the top', () => {
    const { result, commands } = searchInTest({ trip: 0, release: 0, stuck: 'off' });
    expect(result.kind).toBe('stuck-off');
    expect(commands.filter(({ volts }) => volts > settings12.supplyMaxVolts - 0.05).length).toBeGreaterThanOrEqual(2);
  });

  test('without hysteresis chatters, and its points are still told', () => {
    const { result, state } = searchInTest({ trip: 9.4, release: 9.4 });
    expect(result.kind).toBe('chatter');
    expect(millivolts(pointsOf(result).trip.volts, 9.4)).toBeLessThan(5);
    expect(state.assumptions).toBe(2);
  });

  test.each([
    ['hysteresis of 0.05 V', 9.4, 9.45],
    ['hysteresis of 2 V', 8.6, 10.6],
    ['trip below its range', 7.2, 7.9],
    ['trip above its range', 11.4, 11.8],
  ])('is found where the assumptions do not look: %s', (_, trip, release) => {
    const { result, state } = searchInTest({ trip, release });
    expect(result.kind).toBe('found');
    expect(millivolts(pointsOf(result).trip.volts, trip)).toBeLessThan(3);
    expect(millivolts(pointsOf(result).release.volts, release)).toBeLessThan(3);
    expect(state.assumptions).toBeGreaterThan(0);
  });

  test('whose trip point moved by 30 mV before the end check is told where it is now, or unresolved', () => {
    const kinds = new Set<string>();
    for (let seed = 1; seed <= 8; seed++) {
      const { result } = searchInTest(board, {
        seed,
        before: (state, changing) => {
          if (state.check.expected) changing.trip = board.trip + 0.03;
        },
      });
      kinds.add(result.kind);
      if (result.kind === 'found') expect(millivolts(result.trip.volts, board.trip + 0.03)).toBeLessThan(5);
    }
    expect([...kinds].every((kind) => kind === 'found' || kind === 'unresolved')).toBe(true);
  });

  test('that needs more settles than allowed is unresolved, and says how far it came', () => {
    const { result } = searchInTest(board, { settings: { mostSettles: 12 } });
    expect(result).toMatchObject({ kind: 'unresolved', settles: 12 });
  });
});

describe('without assumptions, as a search is repeated that did not resolve', () => {
  const settings = { tripMinVolts: 6, tripMaxVolts: 12, hysteresisMinVolts: 0, hysteresisMaxVolts: 6 };

  test.each([
    ['an ordinary board', 9.312, 9.934, 'found'],
    ['a hysteresis of 2 V', 8.6, 10.6, 'found'],
    ['no hysteresis', 9.4, 9.4, 'chatter'],
    ['a trip point near the lowest supply', 6.3, 6.9, 'found'],
  ])('finds %s', (_, trip, release, kind) => {
    const { result } = searchInTest({ trip, release }, { settings });
    expect(result.kind).toBe(kind);
    expect(millivolts(pointsOf(result).trip.volts, trip)).toBeLessThan(5);
    expect(millivolts(pointsOf(result).release.volts, release)).toBeLessThan(5);
  });
});

describe('the lot prior', () => {
  const prior = { tripMeanVolts: 9.5, tripSdVolts: 0.03, hysteresisMeanVolts: 0.6, hysteresisSdVolts: 0.02 };

  test('is kept for a board of the lot', () => {
    const { result, state } = searchInTest({ trip: 9.52, release: 10.13 }, { settings: { prior } });
    expect(result.kind).toBe('found');
    expect(state.assumptions).toBe(0);
  });

  test.each([8.5, 10.5, 7.4])('does not hide a board that trips at %d V', (trip) => {
    const { result, state } = searchInTest({ trip, release: trip + 0.6 }, { settings: { prior } });
    expect(millivolts(pointsOf(result).trip.volts, trip)).toBeLessThan(3);
    expect(state.assumptions).toBeGreaterThan(0);
  });

  test('does not hide a hysteresis that the lot does not have', () => {
    const { result } = searchInTest({ trip: 9.5, release: 10.9 }, { settings: { prior } });
    expect(millivolts(pointsOf(result).release.volts, 10.9)).toBeLessThan(3);
  });
});

test('a finished search stays as it is', () => {
  const { state } = searchInTest(board);
  expect(observeSearch(state, { voltsBefore: 9, volts: 9, output: 'on' })).toBe(state);
});

test('the first command follows from the settings alone', () => {
  const first = () => nextSearchCommand(beginSearch(settings12, { volts: 6, output: 'off' }));
  expect(first()).toEqual(first());
  expect(first()).toMatchObject({ kind: 'apply' });
});
