import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { drawDeviations, boardsOf } from '@/lib/circuit/monte-carlo/boards';
import { applyFix, valueOf } from '@/lib/circuit/monte-carlo/apply-fix';
import { trimBoards } from '@/lib/circuit/monte-carlo/trimmed-boards';
import { wiperForTrip } from '@/lib/circuit/inverse';
import {
  contributions,
  largestPart,
  pointParts,
  pointSensitivities,
  trimmedSensitivity,
  type PointPart,
} from '@/lib/circuit/sensitivities';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import type { BoardDesign } from '@/lib/circuit/board-design';
import { tolerancesOf, usualTolerances, type BoardType } from '@/lib/contracts/board-type';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

function pointsOf(design: BoardDesign, wiper: number) {
  const points = softKneeThresholds(design, wiper);
  if (points.kind !== 'found') throw new Error('These parts have no points.');
  return points;
}

function moved(boardType: BoardType, part: PointPart, share: number): BoardDesign {
  if (part === 'comparatorOffsetVolts') return { ...boardType.design, comparatorOffsetVolts: share };
  const change = { part, value: valueOf(boardType.design, part) * (1 + share) };
  return applyFix(boardType, { kind: 'parts', changes: [change] }).design;
}

const deviationOf = (values: Iterable<number>) => {
  const all = [...values];
  const mean = all.reduce((sum, value) => sum + value, 0) / all.length;
  return Math.sqrt(all.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (all.length - 1));
};

describe.each(boardTypes)('sensitivities of $code, closed form', (boardType) => {
  const wiper = 0.45;
  const points = pointsOf(boardType.design, wiper);
  const closed = pointSensitivities(boardType.design, wiper, points);

  it.each(pointParts)('%s: as finite differences of the soft-knee points', (part) => {
    const share = 1e-4;
    const up = pointsOf(moved(boardType, part, share), wiper);
    const down = pointsOf(moved(boardType, part, -share), wiper);
    expect(closed.trip[part]).toBeCloseTo((up.tripVolts - down.tripVolts) / (2 * share), 4);
    expect(closed.release[part]).toBeCloseTo((up.releaseVolts - down.releaseVolts) / (2 * share), 4);
  });

  it('of the reference node at a supply that is held', () => {
    for (const part of ['referenceVolts', 'referenceKnee', 'feedOhms'] as const) {
      const nodeOf = (share: number) => {
        const node = referenceAt(moved(boardType, part, share).reference, points.tripVolts);
        return node.kind === 'found' ? node.x : NaN;
      };
      expect(closed.reference[part]).toBeCloseTo((nodeOf(1e-4) - nodeOf(-1e-4)) / 2e-4, 4);
    }
  });

  it('per travel, with the reference following the supply', () => {
    const up = pointsOf(boardType.design, wiper + 1e-5);
    const down = pointsOf(boardType.design, wiper - 1e-5);
    expect(closed.tripPerTravel).toBeCloseTo((up.tripVolts - down.tripVolts) / 2e-5, 3);
    expect(closed.releasePerTravel).toBeCloseTo((up.releaseVolts - down.releaseVolts) / 2e-5, 3);
  });

  // GUM (JCGM 100:2008) 5.1.2 against JCGM 101:2008: the law of propagation and the propagation of distributions.
  it('give the standard deviation of the Monte Carlo within 3 %, untrimmed and trimmed', () => {
    const tolerances = { ...usualTolerances, comparatorOffsetVolts: 0.003 };
    const type = { ...boardType, tolerances };
    const deviations = drawDeviations(20_000, wichmannHill(5));
    const propagated = (variances: Record<PointPart, number>) =>
      Math.sqrt(pointParts.reduce((sum, part) => sum + variances[part], 0));

    const trips = Array.from(boardsOf(type, deviations, 4000), (parts) => pointsOf(parts, wiper).tripVolts);
    expect(deviationOf(trips) / propagated(contributions(closed.trip, tolerances))).toBeCloseTo(1, 1.2);

    const targetVolts = (boardType.limits.tripVolts.min + boardType.limits.tripVolts.max) / 2;
    const node = referenceAt(boardType.design.reference, targetVolts);
    if (node.kind !== 'found') throw new Error('No reference.');
    const trimmedWiper = wiperForTrip(boardType.design, targetVolts, node.x);
    const trimmed = trimmedSensitivity(
      pointSensitivities(boardType.design, trimmedWiper, pointsOf(boardType.design, trimmedWiper)),
    );
    const { releaseVolts } = trimBoards(type, targetVolts, deviations);
    const ratio = deviationOf(releaseVolts) / propagated(contributions(trimmed, tolerances));
    expect(Math.abs(ratio - 1)).toBeLessThan(0.03);
  });

  it('name the feedback resistor once its tolerance is ten times as wide', () => {
    const tolerances = { ...tolerancesOf(boardType), feedbackOhms: 0.1 };
    expect(largestPart(contributions(trimmedSensitivity(closed), tolerances))).toBe('feedbackOhms');
  });
});
