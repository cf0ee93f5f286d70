import { describe, expect, it } from 'vitest';
import { boardTypes, cb0612, cb1210 } from '@/db/seed/board-types';
import { applyFix } from '@/lib/circuit/monte-carlo/apply-fix';
import { boardsOf, drawDeviations } from '@/lib/circuit/monte-carlo/boards';
import { driverSentence, fixLabel, fixSentence, missSentence } from '@/lib/circuit/monte-carlo/finding-words';
import { nodesNear } from '@/lib/circuit/monte-carlo/node-voltage';
import { predictBoardType } from '@/lib/circuit/monte-carlo/predict-board-type';
import { histogramOf, trimBoards } from '@/lib/circuit/monte-carlo/trimmed-boards';
import { softKneeThresholds } from '@/lib/circuit/soft-knee';
import { usualTolerances, type BoardType } from '@/lib/contracts/board-type';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

const predict = (boardType: BoardType, targetVolts?: number) =>
  predictBoardType(boardType, { random: wichmannHill(1), ...(targetVolts === undefined ? {} : { targetVolts }) });

/** Feedback too large for the release limits, and loose. */
const looseFeedback: BoardType = {
  ...cb1210,
  design: { ...cb1210.design, feedbackOhms: 91_000 },
  tolerances: { ...usualTolerances, feedbackOhms: 0.1 },
};
const narrowTravel: BoardType = { ...cb1210, design: { ...cb1210.design, trimmerOhms: 1000 } };

describe('prediction of a board type', () => {
  it('gives the same for the same random numbers', () => {
    expect(predict(cb0612)).toEqual(predict(cb0612));
  });

  it.each(boardTypes)('finds that the demo type $code meets its limits', (boardType) => {
    const { findings, travel, cannotPass } = predict(boardType);
    expect(findings).toEqual([]);
    expect(cannotPass).toBeLessThan(0.001);
    for (const { bands, typical } of travel) {
      expect(bands!.trip.lowVolts).toBeLessThan(typical!.tripVolts);
      expect(bands!.trip.highVolts).toBeGreaterThan(typical!.tripVolts);
      expect(bands!.release.lowVolts).toBeLessThan(typical!.releaseVolts);
      expect(bands!.release.highVolts).toBeGreaterThan(typical!.releaseVolts);
    }
  });

  it('solves every board as the bracketed soft-knee model does', () => {
    const deviations = drawDeviations(300, wichmannHill(3));
    for (const boardType of boardTypes) {
      const tolerances = { ...usualTolerances, comparatorOffsetVolts: 0.005 };
      for (const parts of boardsOf({ ...boardType, tolerances }, deviations)) {
        for (const wiper of [0, 0.4, 1]) {
          const points = softKneeThresholds(parts, wiper);
          if (points.kind !== 'found') throw new Error('These parts have no points.');
          const nodes = nodesNear(parts, wiper, 0, 0);
          expect(Math.abs(nodes.trip - points.tripReferenceVolts)).toBeLessThan(1e-8);
          expect(Math.abs(nodes.release - points.releaseReferenceVolts)).toBeLessThan(1e-8);
        }
      }
    }
  });

  it('counts the bands: 98 of 100 boards lie between', () => {
    const { travel } = predict(cb1210);
    const { wiper, bands } = travel[15]!;
    const fresh = [...boardsOf(cb1210, drawDeviations(6000, wichmannHill(77)))];
    const inside = fresh.filter((parts) => {
      const points = softKneeThresholds(parts, wiper);
      return (
        points.kind === 'found' && points.tripVolts >= bands!.trip.lowVolts && points.tripVolts <= bands!.trip.highVolts
      );
    });
    expect(Math.abs(inside.length / fresh.length - 0.98)).toBeLessThan(0.008);
  });

  it('names the feedback resistor, and one change after which none misses', () => {
    const { findings } = predict(looseFeedback);
    const release = findings.find(({ quantity }) => quantity === 'release')!;
    expect(release.driver.part).toBe('feedbackOhms');
    expect(release.misses.above).toBeGreaterThan(0.5);
    expect(missSentence(release, 10.8)).toMatch(/^\d+ boards in 100 release (above|outside) /);
    expect(driverSentence(release)).toMatch(/^The feedback resistor brings 9\d % of the spread\.$/);
  });

  it.each([
    ['a loose feedback resistor', looseFeedback, undefined],
    ['a narrow travel', narrowTravel, undefined],
    ['a loose zener', { ...cb1210, tolerances: { ...usualTolerances, referenceVolts: 0.05 } }, undefined],
    ['a target near the end of the travel', cb0612, 11.7],
  ] as const)('offers only fixes that hold on boards not seen before: %s', (_name, boardType, target) => {
    const { findings, targetVolts } = predict(boardType, target);
    expect(findings.length).toBeGreaterThan(0);
    const fresh = drawDeviations(20_000, wichmannHill(99));
    for (const { quantity, fix } of findings) {
      if (!fix) continue;
      const mended = applyFix(boardType, fix);
      const aim = fix.kind === 'target' ? Math.min(fix.maxVolts, Math.max(fix.minVolts, targetVolts)) : targetVolts;
      const { misses } = trimBoards(mended, aim, fresh);
      expect(misses[quantity].below + misses[quantity].above).toBeLessThan(0.002);
    }
  });

  it('counts the boards that cannot reach the target', () => {
    const { misses, findings } = predict(cb0612, 11.62);
    const boards = Math.round((misses.target.below + misses.target.above) * 100);
    expect(boards).toBeGreaterThan(0);
    const finding = findings.find(({ quantity }) => quantity === 'target')!;
    expect(missSentence(finding, 11.62)).toBe(
      `${boards} ${boards === 1 ? 'board' : 'boards'} in 100 cannot reach 11.62 V with this trimmer.`,
    );
  });

  it('a target beyond all travel is out of reach of every board', () => {
    const { misses, typicalTurns, release } = predict(cb0612, 14);
    expect(misses.target).toEqual({ below: 1, above: 0 });
    expect(predict(cb0612, 8).misses.target).toEqual({ below: 0, above: 1 });
    expect(typicalTurns).toBeNull();
    expect(release.counts).toEqual([]);
  });

  it('takes well under a second', () => {
    const startedMs = performance.now();
    predict(cb1210);
    expect(performance.now() - startedMs).toBeLessThan(2000);
  });
});

describe('words of a finding', () => {
  it('say value and tolerance of a fix', () => {
    const fix = { kind: 'parts', changes: [{ part: 'feedbackOhms', value: 110_000, tolerance: 0.05 }] } as const;
    const both = { ...fix, changes: [...fix.changes] };
    expect(fixLabel(both)).toBe('Use 110 kΩ ± 5 %');
    expect(fixSentence(both)).toBe('With the feedback resistor at 110 kΩ ± 5 %, none would.');
  });
});

describe('histogram of the release', () => {
  it('keeps every board, in bins of a round width', () => {
    const { fromVolts, binVolts, counts } = histogramOf(Float64Array.from([12.001, 12.013, 12.38, 12.4]));
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(4);
    expect(fromVolts).toBeLessThanOrEqual(12.001);
    expect(fromVolts + binVolts * counts.length).toBeGreaterThan(12.4);
    expect(binVolts).toBe(0.01);
  });
});
