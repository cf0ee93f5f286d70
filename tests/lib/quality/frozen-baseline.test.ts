import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { baselineCandidate } from '@/lib/quality/baseline-candidate';
import { firstBoardsBaseline, limitsOfFrozen, lotsBaseline } from '@/lib/quality/frozen-baseline';
import { individualsBaseline } from '@/lib/statistics/charts/individuals';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { normalQuantile } from '@/lib/statistics/distributions/normal-quantile';

const volts = fc.double({ min: 10.5, max: 11.1, noNaN: true });

describe('the frozen baseline of a lot', () => {
  it('is not there before the thirtieth value', () => {
    expect(firstBoardsBaseline(Array.from({ length: 29 }, (_, i) => 10.8 + (i % 2) / 100))).toBeNull();
  });

  it('does not change with what comes after, so that a drift cannot widen it', () => {
    fc.assert(
      fc.property(
        fc.array(volts, { minLength: 30, maxLength: 30 }),
        fc.array(volts, { maxLength: 40 }),
        (first, later) => {
          expect(firstBoardsBaseline([...first, ...later])).toEqual(firstBoardsBaseline(first));
        },
      ),
    );
  });

  it('gives the limits of the individuals and moving-range chart back from what is stored', () => {
    fc.assert(
      fc.property(fc.array(volts, { minLength: 30, maxLength: 30 }), (values) => {
        const direct = individualsBaseline(values);
        const stored = firstBoardsBaseline(values);
        if (direct.kind !== 'found') return expect(stored).toBeNull();
        const limits = limitsOfFrozen(stored!);
        expect(limits.individuals.upper).toBeCloseTo(direct.individuals.upper, 10);
        expect(limits.movingRange.centre).toBeCloseTo(direct.movingRange.centre, 10);
        expect(limits.movingRange.upper).toBeCloseTo(direct.movingRange.upper, 10);
      }),
    );
  });

  it('is null of values without a spread', () => {
    expect(firstBoardsBaseline(Array(40).fill(10.8))).toBeNull();
  });

  it('of several lots takes no range from one lot to the next', () => {
    const low = [10.79, 10.81, 10.79, 10.81];
    const high = [11.79, 11.81, 11.79, 11.81];
    expect(lotsBaseline([low, high])!.sigma).toBeCloseTo(lotsBaseline([low])!.sigma, 12);
  });
});

describe('a lot that a baseline may come from', () => {
  const uniform = wichmannHill(7);
  const stable = Array.from({ length: 120 }, () => 10.8 + 0.02 * normalQuantile(uniform()));
  it('is called stable while the usual hold rules are quiet, and not when it drifts', () => {
    expect(baselineCandidate(stable)).toMatchObject({ boards: 120, stable: true });
    const drifting = stable.map((value, i) => value + (i > 90 ? 0.05 : 0));
    expect(baselineCandidate(drifting)).toMatchObject({ stable: false });
  });
  it('needs thirty values', () => {
    expect(baselineCandidate(stable.slice(0, 29))).toBeNull();
  });
});
