import { describe, expect, it } from 'vitest';
import type { BoardDesign } from '../../../lib/circuit/board-design';
import { pointsAt, wiperFor } from '../../../lib/trim/board-model';
import { canTrimReach, type PointLimits } from '../../../lib/trim/reach';
import { plainDesign, plainSettings, pointsOf } from './trim-fixtures';

const atTarget = pointsOf(plainDesign, 10);
const hysteresis = atTarget.releaseVolts - 10;
/** What a good board of the plain design shows at 10 V, with room about it. */
const limits: PointLimits = {
  tripVolts: { min: 9.9, max: 10.1 },
  releaseVolts: { min: atTarget.releaseVolts - 0.15, max: atTarget.releaseVolts + 0.15 },
  hysteresisVolts: { min: hysteresis - 0.05, max: hysteresis + 0.05 },
};
const settings = { ...plainSettings, referenceVolts: 5.6 };

/** Points of a board that differs from the design, found where it trips at `tripVolts`. */
const foundOn = (changes: Partial<BoardDesign>, tripVolts: number) => {
  const board = { ...plainDesign, ...changes };
  return { ...pointsOf(board, tripVolts), tripVolts };
};

describe('canTrimReach', () => {
  it('lets a good board be trimmed from far off, though its limits fail as found', () => {
    for (const trip of [8, 8.6, 9.4, 10.7, 11.5]) {
      expect(canTrimReach(settings, pointsOf(plainDesign, trip), limits)).toEqual({ reachable: true });
    }
  });

  it('scales the hysteresis with the setting: right at 8.5 V is too large at 10 V', () => {
    // Found with exactly the hysteresis wanted, but at 8.5 V.
    const design = plainDesign;
    const release = 8.5 + hysteresis;
    const reach = canTrimReach(
      { ...settings, design },
      { tripVolts: 8.5, tripUncertaintyVolts: 0.001, releaseVolts: release },
      limits,
    );
    expect(reach).toMatchObject({ reachable: false, finding: 'cannot-reach-limits', reason: 'hysteresis-too-large' });
    if (!reach.reachable) expect(reach.bestVolts).toBeGreaterThan(reach.limitVolts);
  });

  it('names the hysteresis of a wrong feedback resistor, whatever its setting', () => {
    for (const trip of [9.2, 10, 10.8]) {
      expect(canTrimReach(settings, foundOn({ feedbackOhms: 68_000 }, trip), limits)).toMatchObject({
        reachable: false,
        reason: 'hysteresis-too-large',
        limitVolts: limits.hysteresisVolts.max,
      });
      expect(canTrimReach(settings, foundOn({ feedbackOhms: 220_000 }, trip), limits)).toMatchObject({
        reachable: false,
        reason: 'hysteresis-too-small',
        limitVolts: limits.hysteresisVolts.min,
      });
    }
  });

  it('names the release point where it misses with trip and hysteresis inside', () => {
    const tight = { ...limits, releaseVolts: { min: 10.6, max: 10.7 } };
    expect(canTrimReach(settings, atTarget, tight)).toMatchObject({ reachable: false, reason: 'release-too-low' });
    const low = { ...limits, releaseVolts: { min: 9.9, max: 10.1 } };
    expect(canTrimReach(settings, atTarget, low)).toMatchObject({ reachable: false, reason: 'release-too-high' });
  });

  it('names the trip point where the travel ends before the limits', () => {
    const padded: BoardDesign = { ...plainDesign, trimmerOhms: 1200, supplyEndOhms: 3890, groundEndOhms: 4910 };
    const board = { ...settings, design: padded };
    const highest = pointsAt(padded, 0).tripVolts;
    const lowest = pointsAt(padded, 1).tripVolts;
    const found = pointsOf(padded, 10);
    const above = { ...limits, tripVolts: { min: highest + 0.3, max: highest + 0.5 } };
    expect(canTrimReach(board, found, above)).toMatchObject({ reachable: false, reason: 'trip-too-low' });
    const under = { ...limits, tripVolts: { min: lowest - 0.5, max: lowest - 0.3 } };
    expect(canTrimReach(board, found, under)).toMatchObject({ reachable: false, reason: 'trip-too-high' });
  });

  it('keeps a board whose end of travel is doubtful while its reference was not read', () => {
    const padded: BoardDesign = { ...plainDesign, trimmerOhms: 1200, supplyEndOhms: 3890, groundEndOhms: 4910 };
    const highest = pointsAt(padded, 0).tripVolts;
    const justAbove = { ...limits, tripVolts: { min: highest + 0.05, max: highest + 0.25 } };
    const wide = { ...justAbove, releaseVolts: { min: 5, max: 20 }, hysteresisVolts: { min: 0, max: 2 } };
    const found = pointsOf(padded, 10);
    expect(canTrimReach({ ...settings, design: padded, referenceVolts: null }, found, wide)).toEqual({
      reachable: true,
    });
    expect(canTrimReach({ ...settings, design: padded }, found, wide)).toMatchObject({ reason: 'trip-too-low' });
  });

  it('rejects a board without feedback', () => {
    const found = { tripVolts: 9.5, tripUncertaintyVolts: 0.001, releaseVolts: 9.502 };
    expect(wiperFor(plainDesign, 9.5)).toBeGreaterThan(0);
    expect(canTrimReach(settings, found, limits)).toMatchObject({ reachable: false, reason: 'hysteresis-too-small' });
  });
});
