import { describe, expect, it } from 'vitest';
import { capabilityStudy, type CapabilityStudy } from '@/lib/statistics/capability/capability-study';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { drawNormal } from '@/lib/uncertainty/draw';

const limits = { min: 10.7, max: 10.9 };

function study(values: number[], breaksBefore: number[] = []): CapabilityStudy {
  const found = capabilityStudy(values, limits, { breaksBefore });
  if (found.kind !== 'found') throw new Error(found.kind);
  return found;
}

describe('capability study', () => {
  const uniform = wichmannHill(77);
  const stable = Array.from({ length: 200 }, () => 10.8 + 0.02 * drawNormal(uniform));
  it('short and long term agree for a stable lot, within their intervals', () => {
    const { shortTerm, longTerm, quoted } = study(stable);
    expect(quoted).toBe('normal');
    for (const { cp, cpk, cpInterval, cpkInterval } of [shortTerm!, longTerm]) {
      expect(cpInterval!.low < 5 / 3 && 5 / 3 < cpInterval!.high).toBe(true);
      expect(cpkInterval.low < cpk && cpk < cpkInterval.high).toBe(true);
      expect(cpk).toBeLessThanOrEqual(cp!);
    }
    expect(shortTerm!.cpInterval!.high - shortTerm!.cpInterval!.low).toBeGreaterThan(
      longTerm.cpInterval!.high - longTerm.cpInterval!.low,
    );
  });
  it('a drift lowers the long term only', () => {
    const { shortTerm, longTerm } = study(stable.map((v, i) => v + (i - 100) * 0.0004));
    expect(shortTerm!.cp!).toBeGreaterThan(1.4 * longTerm.cp!);
  });
  it('a jump between lots is no moving range', () => {
    const lots = [...stable.slice(0, 100), ...stable.slice(100).map((v) => v + 5)];
    expect(study(lots, [100]).shortTerm!.cp!).toBeGreaterThan(study(lots).shortTerm!.cp!);
  });
  it('quotes the percentiles of a skew lot, and says that they rest on extremes', () => {
    const skew = Array.from({ length: 200 }, () => 10.75 - 0.02 * Math.log(1 - uniform()));
    const { quoted, percentile, longTerm } = study(skew);
    expect(quoted).toBe('percentile');
    expect(percentile!.restsOnExtremes).toBe(true);
    expect(percentile!.upper!).toBeLessThan(longTerm.upper!);
  });
  it('refuses one value, no spread and no limits', () => {
    expect(capabilityStudy([1], limits)).toEqual({ kind: 'tooFew' });
    expect(capabilityStudy([1, 1], limits)).toEqual({ kind: 'noSpread' });
    expect(capabilityStudy([1, 2], { min: null, max: null })).toEqual({ kind: 'noLimits' });
  });
});
