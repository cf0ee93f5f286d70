import { describe, expect, it } from 'vitest';
import { chartConstants } from '@/lib/statistics/charts/chart-constants';
import { checkStandardBaseline } from '@/lib/statistics/charts/check-standard';
import { countLimits } from '@/lib/statistics/charts/count-chart';
import { ewmaChart } from '@/lib/statistics/charts/ewma';
import { individualsBaseline } from '@/lib/statistics/charts/individuals';
import { placesBeyond } from '@/lib/statistics/charts/limits';
import { rangeConstants } from '@/lib/statistics/charts/range-constants';
import { shareBaseline, shareLimits } from '@/lib/statistics/charts/share-chart';
import { meanAndDeviationBaseline, meanAndRangeBaseline } from '@/lib/statistics/charts/subgroups';
import { integrate } from '@/lib/statistics/integrate';
import { normalAbove, normalBelow } from '@/lib/statistics/distributions/normal';
import reference from './charts.json';

/** Narrows a result, failing with what came instead. */
function found<T extends { kind: string }>(result: T): Extract<T, { kind: 'found' }> {
  if (result.kind !== 'found') throw new Error(result.kind);
  return result as Extract<T, { kind: 'found' }>;
}

describe('factors of control charts', () => {
  it.each(reference.constants.rows)('n = $n: seven decimals of R', ({ n, ...expected }) => {
    const constants = chartConstants(n);
    for (const [name, value] of Object.entries(expected))
      expect(constants[name as keyof typeof constants], name).toBeCloseTo(value, 7 - 0.4);
  });
  it.each(reference.published.rows)(
    'n = $n: the printed three decimals, but for a unit in the last',
    ({ n, ...expected }) => {
      const constants = chartConstants(n);
      for (const [name, value] of Object.entries(expected))
        expect(Math.abs(constants[name as keyof typeof constants] - value), name).toBeLessThan(0.0016);
    },
  );
  it('d2 is the integral that defines it', () => {
    for (const n of [2, 7, 30, 50]) {
      const integral = integrate((x) => 1 - normalAbove(x) ** n - normalBelow(x) ** n, -9, 9, 1e-11);
      expect(found(integral).value).toBeCloseTo(rangeConstants(n).d2, 8);
    }
  });
  it('refuses samples that it has no constants for', () => {
    expect(() => rangeConstants(1)).toThrow(RangeError);
    expect(() => rangeConstants(51)).toThrow(RangeError);
  });
});

describe('individuals and moving range', () => {
  it.each(reference.imr)('$id', ({ data, computed, published }) => {
    const baseline = found(individualsBaseline(data));
    expect(baseline.individuals.centre).toBeCloseTo(computed.mean, 9);
    expect(baseline.individuals.upper).toBeCloseTo(computed.UCL_X, 7);
    expect(baseline.individuals.lower).toBeCloseTo(computed.LCL_X, 7);
    expect(baseline.movingRange.centre).toBeCloseTo(computed.MRbar, 8);
    expect(baseline.movingRange.upper).toBeCloseTo(computed.UCL_MR, 7);
    expect(baseline.sigma).toBeCloseTo(computed.sigma_MR, 8);
    // The handbook rounds d2 to 1.128.
    expect(Math.abs(baseline.individuals.upper - published.UCL_X)).toBeLessThan(0.002);
  });
});

describe('EWMA', () => {
  it.each(reference.ewma)('$id', ({ data, lambda, target, sigma, L, computed, published }) => {
    const chart = ewmaChart(data, { lambda, target, sigma, width: L });
    chart.averages.forEach((average, i) => {
      expect(average).toBeCloseTo(computed.ewma[i]!, 6);
      expect(Math.abs(average - published.ewma_2dp[i]!)).toBeLessThan(0.0051);
      expect(chart.limits[i]!.upper).toBeCloseTo(computed.UCL_exact_i[i]!, 6);
      expect(chart.limits[i]!.lower).toBeCloseTo(computed.LCL_exact_i[i]!, 6);
    });
    expect(chart.steady.upper).toBeCloseTo(computed.UCL_asymptotic, 6);
    expect(chart.steady.lower).toBeCloseTo(computed.LCL_asymptotic, 6);
  });
});

describe('p chart', () => {
  it('NIST 6.3.3.2, wafers', () => {
    const { x, n, computed } = reference.p[0] as unknown as {
      x: number[];
      n: number;
      computed: Record<string, number>;
    };
    const baseline = shareBaseline(x.map((defective) => ({ defective, tested: n })))!;
    const limits = shareLimits(baseline, n);
    expect(baseline.share).toBeCloseTo(computed.pbar!, 9);
    expect(limits.upper).toBeCloseTo(computed.UCL!, 8);
    expect(limits.lower).toBeCloseTo(computed.LCL!, 8);
    expect(
      placesBeyond(
        x.map((d) => d / n),
        limits,
      ),
    ).toEqual([14, 22]);
  });
  it('lots of different size each have their limits', () => {
    const { x, n, computed } = reference.p[1] as unknown as {
      x: number[];
      n: number[];
      computed: { UCL: number[]; pbar: number };
    };
    const lots = x.map((defective, i) => ({ defective, tested: n[i]! }));
    const baseline = shareBaseline(lots)!;
    const limits = lots.map((lot) => shareLimits(baseline, lot.tested));
    limits.forEach((limit, i) => {
      expect(limit.upper).toBeCloseTo(computed.UCL[i]!, 8);
      expect(limit.lower).toBeNull();
    });
    expect(
      placesBeyond(
        lots.map((lot) => lot.defective / lot.tested),
        limits,
      ),
    ).toEqual([]);
  });
});

describe('c chart', () => {
  it('NIST 6.3.3.1: a count on the limit is not beyond it', () => {
    const { x: c, computed } = reference.c[0]!;
    const limits = countLimits(c)!;
    expect([limits.centre, limits.upper, limits.lower]).toEqual([computed.cbar, computed.UCL, computed.LCL]);
    expect(placesBeyond(c, limits)).toEqual([23]);
  });
  it('Dataplot CCC: no lower limit below zero', () => {
    const { c, computed } = reference.dataplot;
    const limits = countLimits(c)!;
    expect(limits.upper).toBeCloseTo(computed.UCL, 7);
    expect(limits.lower).toBeNull();
    expect(placesBeyond(c, limits)).toEqual([19]);
  });
});

describe('charts of subgroups', () => {
  const { rows, computed } = reference.xbar;
  it('mean and range', () => {
    const { means, spread, sigma } = found(meanAndRangeBaseline(rows));
    expect(means.centre).toBeCloseTo(computed.Xbarbar, 8);
    expect(means.upper).toBeCloseTo(computed.UCL_X_R, 5);
    expect(means.lower).toBeCloseTo(computed.LCL_X_R, 5);
    expect(spread.upper).toBeCloseTo(computed.UCL_R, 5);
    expect(spread.lower).toBeNull();
    expect(sigma).toBeCloseTo(computed.sigma_Rbar_d2, 5);
  });
  it('mean and standard deviation', () => {
    const { means, spread, sigma } = found(meanAndDeviationBaseline(rows));
    expect(means.upper).toBeCloseTo(computed.UCL_X_S, 5);
    expect(means.lower).toBeCloseTo(computed.LCL_X_S, 5);
    expect(spread.upper).toBeCloseTo(computed.UCL_S, 5);
    expect(sigma).toBeCloseTo(computed.sigma_Sbar_c4, 5);
  });
});

describe('check standard', () => {
  it('NIST 2.6.2, resistivity of wafer 137', () => {
    const { values, short_term_sd: sds, df_each: degrees, computed } = reference.checkStandard;
    const baseline = found(checkStandardBaseline(values, sds, degrees));
    expect(baseline.values.centre).toBeCloseTo(computed.mean, 8);
    expect(baseline.values.sigma).toBeCloseTo(computed.level2_sd, 9);
    expect(baseline.values.upper).toBeCloseTo(computed.UCL_3sd, 7);
    expect(baseline.values.lower).toBeCloseTo(computed.LCL_3sd, 7);
    expect(baseline.precision.pooled).toBeCloseTo(computed.level1_pooled, 9);
    expect(baseline.precision.degrees).toBe(computed.df1);
    expect(baseline.precision.upper).toBeCloseTo(computed.UCL_shortterm_F99, 8);
    const usual = found(checkStandardBaseline(values, sds, degrees, { width: 2, confidence: 0.95 }));
    expect(usual.values.upper).toBeCloseTo(computed.UCL_2sd, 7);
    expect(usual.precision.upper).toBeCloseTo(computed.UCL_shortterm_F95, 8);
  });
});
