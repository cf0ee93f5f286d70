import { describe, expect, it } from 'vitest';
import { informedValue, specificRisk } from '@/lib/decision/risk-specific';
import { globalRisk, type Product } from '@/lib/decision/risk-global';
import { guardForGlobalRisk, guardForSpecificRisk } from '@/lib/decision/risk-guard-band';
import { greatestRisk } from '@/lib/decision/risk-rules';
import { testUncertaintyRatio } from '@/lib/decision/risk-test-uncertainty-ratio';
import reference from './uncertainty.json';

describe('specific risk', () => {
  it.each(reference.specific_risk_cases)('$y V with u = $u V', ({ y, u, LSL, USL, result }) => {
    const risk = specificRisk(y, u, { min: LSL, max: USL });
    expect(risk.conforming).toBeCloseTo(result.p_conform, 9);
    for (const [value, expected] of [
      [risk.below, result.p_below],
      [risk.above, result.p_above],
    ] as const)
      expect(Math.abs(value / expected - 1)).toBeLessThan(1e-8);
  });
  it('with what is known of the product', () => {
    const { y, u_m, y0, u0, LSL, USL, result } = reference.posterior_case;
    const informed = informedValue(y, u_m, { mean: y0, deviation: u0 });
    expect(informed.value).toBeCloseTo(result.mean, 8);
    expect(informed.standard).toBeCloseTo(result.sd, 11);
    const risk = specificRisk(informed.value, informed.standard, { min: LSL, max: USL });
    expect(risk.conforming).toBeCloseTo(result.p_conform, 9);
    expect(risk.above).toBeCloseTo(result.p_above, 9);
  });
  it('examples of JCGM 106:2012: zener, oil viscosity, radar', () => {
    const [zener, oil, radar] = reference.JCGM106_examples;
    const ofZener = specificRisk(zener!.y!, zener!.u!, { min: null, max: zener!.TU! }).conforming;
    expect(ofZener).toBeCloseTo(zener!.pc!, 7);
    expect(ofZener).toBeCloseTo(zener!.published, 2);
    const ofOil = specificRisk(oil!.y!, oil!.u!, { min: oil!.TL!, max: oil!.TU! }).conforming;
    expect(ofOil).toBeCloseTo(oil!.pc!, 7);
    const { vmax, v0, u_rel, p } = radar!;
    expect(specificRisk(vmax!, u_rel! * vmax!, { min: null, max: v0! }).above).toBeCloseTo(p!, 6);
  });
});

describe('global risk, tolerance ±1', () => {
  const limits = { min: -1, max: 1 };
  it.each(reference.globalRisk.cases)('$id: TUR $TUR, $guard, $prior', (c) => {
    const product: Product =
      c.prior === 'normal'
        ? { kind: 'normal', mean: c.prior_offset_over_T!, deviation: c.prior_sd_over_T! }
        : { kind: 'uniform', min: -c.uniform_halfwidth_over_T!, max: c.uniform_halfwidth_over_T! };
    const acceptance = { min: -c.A_over_T!, max: c.A_over_T! };
    const risk = globalRisk({ product, limits, acceptance, standard: c.u_m_over_T! });
    if (risk.kind !== 'found') throw new Error(risk.kind);
    expect(Math.abs(risk.falseAccept / c.PFA! - 1)).toBeLessThan(1e-5);
    expect(Math.abs(risk.falseReject / c.PFR! - 1)).toBeLessThan(1e-5);
    expect(risk.accepted).toBeCloseTo(c.P_accept!, 7);
    expect(Math.abs(risk.badAmongAccepted! / c.conditional_PFA! - 1)).toBeLessThan(1e-5);
    expect(testUncertaintyRatio(limits, 2 * c.u_m_over_T!)).toBeCloseTo(c.TUR!, 12);
  });
  it('the guard for a wanted global risk gives that risk back', () => {
    for (const c of reference.globalRisk.cases.filter(({ prior, A_over_T }) => prior === 'normal' && A_over_T! < 1)) {
      const product: Product = { kind: 'normal', mean: 0, deviation: c.prior_sd_over_T! };
      const guard = guardForGlobalRisk(c.PFA!, c.u_m_over_T!, limits, product);
      if (guard.kind !== 'found') throw new Error(guard.kind);
      expect(guard.x).toBeCloseTo(1 - c.A_over_T!, 5);
    }
  });
});

describe('guard bands of ILAC-G8', () => {
  it.each(reference.guards.cases)('$rule', ({ factor, risk }) => {
    expect(greatestRisk(factor)).toBeCloseTo(risk, 8);
    const guard = guardForSpecificRisk(risk, 0.5, { min: null, max: 10 });
    // A guard is never negative: a rule that lets the limit out cannot be reached by one.
    expect(guard.kind === 'found' && guard.x).toBeCloseTo(Math.max(0, factor), 6);
  });
});
