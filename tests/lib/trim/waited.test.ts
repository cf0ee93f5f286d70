import { describe, expect, it } from 'vitest';
import { beginTrim, nextTrimCommand, viewTrim } from '../../../lib/trim/trim';
import { drive, foundAt, unresolved } from './drive';
import { plainDesign, plainSettings, pointsOf } from './trim-fixtures';

const settings = { ...plainSettings, procedure: 'prompted' as const, fastLink: false, pollMs: 110 };
const begin = (tripVolts: number, trimmer = settings.trimmer) =>
  beginTrim({ ...settings, trimmer }, pointsOf(plainDesign, tripVolts), 0);

describe('prompted on a slow link', () => {
  it('prompts at once and measures only after the time a turn takes', () => {
    const state = begin(9);
    expect(viewTrim(state)).toMatchObject({
      stage: 'turn',
      direction: 'clockwise',
      words: { unit: 'turns', whole: 1 },
    });
    const command = nextTrimCommand(state);
    if (command.kind !== 'wait') throw new Error('no wait');
    // 6 s to the screw, about 1.6 turns at half a turn a second with regrips.
    expect(command.milliseconds).toBeGreaterThan(9_500);
    expect(command.milliseconds).toBeLessThan(12_500);
  });

  it('takes the screw for stopped when two measurements agree', () => {
    const checks: boolean[] = [];
    const end = drive(begin(9), (command) => {
      if (command.kind !== 'search') return undefined;
      checks.push(command.check);
      return { kind: 'searched', result: foundAt(10.004) };
    });
    expect(checks).toEqual([false, true]);
    expect(nextTrimCommand(end)).toMatchObject({ outcome: { kind: 'trimmed', rounds: 1 } });
  });

  it('measures again while they do not', () => {
    const trips = [9.7, 9.95, 10.01, 10.01];
    const end = drive(begin(9), (command) =>
      command.kind === 'search' ? { kind: 'searched', result: foundAt(trips.shift()!) } : undefined,
    );
    expect(trips).toEqual([]);
    expect(nextTrimCommand(end)).toMatchObject({ outcome: { kind: 'trimmed', tripVolts: 10.01, rounds: 1 } });
  });

  it('looks again later when the first measurement finds the point moving', () => {
    let searches = 0;
    const end = drive(begin(9), (command) => {
      if (command.kind !== 'search') return undefined;
      return { kind: 'searched', result: searches++ < 2 ? unresolved : foundAt(10) };
    });
    expect(searches).toBe(4);
    expect(nextTrimCommand(end)).toMatchObject({ outcome: { kind: 'trimmed' } });
  });

  it('tells the wrong way with what it moved, and asks on from there', () => {
    const told = drive(
      begin(9.4),
      (command) => (command.kind === 'search' ? { kind: 'searched', result: foundAt(9.15) } : undefined),
      (state) => viewTrim(state).finding !== null,
    );
    expect(viewTrim(told)).toMatchObject({ finding: 'wrong-way', direction: 'clockwise', stage: 'turn', round: 2 });
    expect(viewTrim(told).findingVolts).toBeCloseTo(0.25, 6);
  });

  it('adds the play where the screw reverses', () => {
    const second = (trip: number, backlashTurns: number) => {
      const trips = [trip, trip];
      const state = drive(
        begin(9, { ...settings.trimmer, backlashTurns }),
        (command) => (command.kind === 'search' ? { kind: 'searched', result: foundAt(trips.shift()!) } : undefined),
        (each) => each.prompts === 2,
      );
      return viewTrim(state);
    };
    expect(second(10.1, 0).direction).toBe('anticlockwise');
    expect(second(10.1, 5 / 360).turns! - second(10.1, 0).turns!).toBeCloseTo(5 / 360, 3);
    expect(second(9.9, 0).direction).toBe('clockwise');
    expect(second(9.9, 5 / 360).turns! - second(9.9, 0).turns!).toBeCloseTo(0, 3);
  });
});
