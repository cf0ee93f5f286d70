import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawIn, judgeValue } from '@/lib/decision/judge-value';
import { globalRisk } from '@/lib/decision/risk-global';
import { guardForGlobalRisk, guardForSpecificRisk } from '@/lib/decision/risk-guard-band';
import { guardFactors, statementOf } from '@/lib/decision/risk-rules';
import { informedValue, specificRisk } from '@/lib/decision/risk-specific';
import { testUncertaintyRatio } from '@/lib/decision/risk-test-uncertainty-ratio';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { drawNormal } from '@/lib/uncertainty/draw';

const limits = { min: 10.7, max: 10.9 };
const range = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const product = { kind: 'normal', mean: 10.81, deviation: 0.05 } as const;

describe('specific risk', () => {
  it('adds up to 1 and mirrors about the middle', () => {
    fc.assert(
      fc.property(range(10, 12), range(0.001, 1), (value, standard) => {
        const risk = specificRisk(value, standard, limits);
        expect(risk.conforming + risk.below + risk.above).toBeCloseTo(1, 12);
        expect(specificRisk(21.6 - value, standard, limits).conforming).toBeCloseTo(risk.conforming, 9);
      }),
    );
  });
  it('what is known of the product narrows the value towards it', () => {
    fc.assert(
      fc.property(range(10, 12), range(0.001, 1), range(0.001, 1), (value, standard, deviation) => {
        const informed = informedValue(value, standard, { mean: 11, deviation });
        expect(informed.standard).toBeLessThan(Math.min(standard, deviation));
        expect(Math.abs(informed.value - 11)).toBeLessThanOrEqual(Math.abs(value - 11));
      }),
    );
  });
});

describe('global risk', () => {
  const ask = (w: number, standard = 0.005) => {
    const found = globalRisk({ product, limits, acceptance: drawIn(limits, w), standard });
    if (found.kind !== 'found') throw new Error(found.kind);
    return found;
  };
  it('a wider guard trades the consumer’s risk for the producer’s', () => {
    fc.assert(
      fc.property(range(-0.02, 0.09), range(0.0005, 0.01), (w, more) => {
        const [wide, narrow] = [ask(w), ask(w + more)];
        expect(narrow.falseAccept).toBeLessThanOrEqual(wide.falseAccept + 1e-10);
        expect(narrow.falseReject).toBeGreaterThanOrEqual(wide.falseReject - 1e-10);
        expect(narrow.accepted).toBeLessThanOrEqual(wide.accepted + 1e-10);
      }),
      { numRuns: 30 },
    );
  });
  it('agrees with a simulation of boards measured and judged', () => {
    const uniform = wichmannHill(12);
    const standard = 0.01;
    const rule = { kind: 'guard-band', factor: 1 } as const;
    let [falseAccept, falseReject] = [0, 0];
    const boards = 60_000;
    for (let i = 0; i < boards; i++) {
      const truth = product.mean + product.deviation * drawNormal(uniform);
      const { passed } = judgeValue(truth + standard * drawNormal(uniform), limits, 2 * standard, rule);
      const good = truth >= limits.min && truth <= limits.max;
      if (passed && !good) falseAccept++;
      if (!passed && good) falseReject++;
    }
    const found = ask(2 * standard, standard);
    expect(Math.abs(falseAccept / boards - found.falseAccept)).toBeLessThan(
      4 * Math.sqrt(found.falseAccept / boards) + 1e-9,
    );
    expect(Math.abs(falseReject / boards - found.falseReject)).toBeLessThan(4 * Math.sqrt(found.falseReject / boards));
  });
  it('one limit, limits beyond the product, and guards that meet in the middle', () => {
    const one = globalRisk({
      product,
      limits: { min: null, max: 10.9 },
      acceptance: { min: null, max: 10.9 },
      standard: 0.005,
    });
    expect(one.kind === 'found' && one.accepted).toBeGreaterThan(0.9);
    const wide = globalRisk({ product, limits: { min: 0, max: 99 }, acceptance: { min: 0, max: 99 }, standard: 0.005 });
    expect(wide).toMatchObject({
      kind: 'found',
      falseAccept: 0,
      falseReject: expect.closeTo(0, 9),
      accepted: expect.closeTo(1, 9),
    });
    const none = ask(0.15);
    expect(none).toMatchObject({ falseAccept: 0, accepted: 0, badAmongAccepted: null });
  });
});

describe('guard bands for a wanted risk', () => {
  it('are as wide as needed and no wider', () => {
    fc.assert(
      fc.property(range(0.0001, 0.4), range(0.001, 0.02), (risk, standard) => {
        const guard = guardForSpecificRisk(risk, standard, limits);
        if (guard.kind !== 'found') throw new Error(guard.kind);
        const onLimit = specificRisk(limits.max - guard.x, standard, limits);
        expect(1 - onLimit.conforming).toBeCloseTo(risk, 7);
      }),
    );
  });
  it('are 0 where simple acceptance is enough, and refused where the tolerance is too narrow for the risk', () => {
    expect(guardForGlobalRisk(0.5, 0.005, limits, product)).toEqual({ kind: 'found', x: 0 });
    expect(guardForSpecificRisk(0.001, 0.1, limits)).toEqual({ kind: 'notBracketed' });
    expect(guardForGlobalRisk(1e-4, 0.005, limits, product).kind).toBe('found');
  });
});

describe('statements', () => {
  it('go through pass, conditional pass, conditional fail and fail', () => {
    const values = [10.8, 10.895, 10.905, 10.92, NaN];
    expect(values.map((value) => statementOf(value, limits, 0.01))).toEqual([
      'pass',
      'conditional-pass',
      'conditional-fail',
      'fail',
      'fail',
    ]);
  });
  it('pass exactly where the guarded judgement passes', () => {
    fc.assert(
      fc.property(range(10.6, 11), range(0, 0.05), (value, expanded) => {
        const rule = { kind: 'guard-band', factor: guardFactors.guarded } as const;
        const { passed } = judgeValue(value, limits, expanded, rule);
        expect(statementOf(value, limits, expanded) === 'pass').toBe(passed);
      }),
    );
  });
  it('the test uncertainty ratio is of two limits and a known uncertainty', () => {
    expect(testUncertaintyRatio(limits, 0.025)).toBeCloseTo(4, 9);
    expect(testUncertaintyRatio({ min: 1, max: null }, 0.1)).toBeNull();
    expect(testUncertaintyRatio(limits, 0)).toBeNull();
  });
});
