import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { binWidth, histogramBins } from '@/lib/quality/histogram-bins';

describe('the bins of a histogram', () => {
  it('are a twentieth of the tolerance, rounded up to 1, 2 or 5', () => {
    expect(binWidth([10.8], { min: 10.7, max: 10.9 })).toBeCloseTo(0.01, 12);
    expect(binWidth([12.3], { min: 12.1, max: 12.5 })).toBeCloseTo(0.02, 12);
    expect(binWidth([1.4], { min: 1.2, max: 1.7 })).toBeCloseTo(0.05, 12);
  });

  it('follow the spread where there are no limits, and are none without one', () => {
    expect(binWidth([1, 2, 3, 4, 5, 6, 7, 8], null)).toBe(5);
    expect(binWidth([3, 3, 3], null)).toBeNull();
    expect(binWidth([], null)).toBeNull();
  });

  it('put a value on an edge above it', () => {
    expect(histogramBins([10.8, 10.809999, 10.81], 0.01).map((bin) => bin.boards)).toEqual([2, 1]);
  });

  it('lose no value within reach, and stand without gaps', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 10_700, max: 10_900 }), { minLength: 1, maxLength: 200 }),
        (millivolts) => {
          const bins = histogramBins(
            millivolts.map((each) => each / 1000),
            0.01,
          );
          expect(bins.reduce((sum, bin) => sum + bin.boards, 0)).toBe(millivolts.length);
          bins.slice(1).forEach((bin, i) => expect(bin.from).toBeCloseTo(bins[i]!.to, 10));
        },
      ),
    );
  });

  it('leave a value that is far out to the chart, which pins it', () => {
    const bins = histogramBins([10.8, 10.8, 10.81, 14], 0.01);
    expect(bins.at(-1)!.to).toBeLessThan(11);
  });
});
