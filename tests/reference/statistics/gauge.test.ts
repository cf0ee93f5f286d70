import { describe, expect, it } from 'vitest';
import { gaugeStudy, type GaugeStudy } from '@/lib/statistics/gauge/gauge-study';
import { nestedLevels } from '@/lib/statistics/gauge/nested-levels';
import { biasOf } from '@/lib/statistics/gauge/bias';
import reference from './gauge.json';

type Row = [string, string, number, number];

function study(set: (typeof reference.crossed)[number]): GaugeStudy {
  const readings = (set.data as Row[]).map(([board, operator, , value]) => ({ board, operator, value }));
  const found = gaugeStudy(readings, set.tolerance);
  if (found.kind !== 'found') throw new Error(found.kind);
  return found;
}

/** The file gives ten digits. */
const close = (value: number, expected: number, relative = 1e-8) =>
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(relative * Math.abs(expected) + 1e-15);

describe.each(reference.crossed)('crossed gauge study $id', (set) => {
  const found = study(set);
  const { computed } = set;
  it('analysis of variance', () => {
    const { full } = found.anova;
    const names = { part: 'board', op: 'operator', int: 'interaction', err: 'repeat' } as const;
    for (const [theirs, ours] of Object.entries(names)) {
      const row = full[ours];
      const expected = computed.anova as Record<string, number>;
      expect(row.degrees).toBe(expected[`df_${theirs}`]);
      close(row.squares, expected[`ss_${theirs}`]!);
      close(row.meanSquare, expected[`ms_${theirs}`]!);
    }
    close(full.board.f!, computed.anova.F_part_vs_int);
    close(full.operator.f!, computed.anova.F_op_vs_int);
    close(full.interaction.f!, computed.anova.F_int);
    close(full.interaction.p!, computed.anova.p_int);
    expect(found.quoted).toBe('withoutInteraction');
  });
  it.each([
    ['withInteraction', 'varcomp_with_interaction'],
    ['withoutInteraction', 'varcomp_pooled_no_interaction'],
  ] as const)('components %s', (ours, theirs) => {
    const expected = computed[theirs];
    const { components, figures, distinctRatio } = found[ours];
    close(components.repeatability.variance, expected.var_repeatability);
    close(components.interaction.variance, expected.var_interaction);
    close(components.operator.variance, expected.var_operator);
    close(components.reproducibility.variance, expected.var_reproducibility);
    close(components.gauge.variance, expected.var_grr);
    close(components.board.variance, expected.var_part);
    close(components.total.variance, expected.var_total);
    close(figures.gauge.shareOfVariance, expected.pct_contribution_GRR / 100);
    close(figures.gauge.shareOfSpread, expected.pct_study_GRR / 100);
    close(figures.repeatability.shareOfSpread, expected.pct_study_EV / 100);
    close(figures.reproducibility.shareOfSpread, expected.pct_study_AV / 100);
    close(figures.board.shareOfSpread, expected.pct_study_PV / 100);
    close(figures.gauge.shareOfTolerance!, expected.pct_tol_GRR / 100);
    close(distinctRatio!, expected.ndc_raw);
  });
  it('averages and ranges, to the four digits of the printed factors', () => {
    const expected = computed.average_range;
    const ours = found.averageRange;
    close(ours.meanRange, expected.Rbarbar);
    close(ours.operatorRange, expected.Xdiff);
    close(ours.boardRange, expected.Rp);
    close(ours.repeatability, expected.EV, 1e-4);
    close(ours.operator, expected.AV, 2e-4);
    close(ours.gauge, expected.GRR, 1e-4);
    close(ours.board, expected.PV, 2e-4);
    close(ours.total, expected.TV, 2e-4);
    close(ours.figures.gauge.shareOfSpread, expected.pct_GRR / 100, 3e-4);
    close(ours.rangeLimit, expected.UCL_R, 3e-4);
  });
});

describe('the AIAG example as published', () => {
  const [aiag] = reference.crossed;
  const found = study(aiag!);
  const published = aiag!.published!;
  it('five groups of boards by ranges, four by analysis of variance', () => {
    expect(found.averageRange.distinctCategories).toBe(published.average_range.ndc);
    expect(found.withoutInteraction.distinctCategories).toBe(published.anova.ndc);
    expect(found.averageRange.repeatability).toBeCloseTo(published.average_range.EV, 4);
    expect(found.averageRange.operator).toBeCloseTo(published.average_range.AV, 3);
    expect(found.averageRange.gauge).toBeCloseTo(published.average_range.GRR, 4);
  });
  it('says that the interaction came out negative', () => {
    expect(found.withInteraction.components.interaction).toMatchObject({ variance: 0, negative: true });
    expect(found.withInteraction.components.operator.negative).toBe(false);
  });
  it('has intervals round the estimates', () => {
    for (const name of ['repeatability', 'operator', 'board', 'gauge'] as const) {
      const { variance, interval } = found.withInteraction.components[name];
      expect(interval!.low).toBeLessThan(variance);
      expect(interval!.high).toBeGreaterThan(variance);
    }
  });
});

describe('nested gauge study of NIST, probe 281', () => {
  type Daily = [number, number, number, number, number];
  const days = (reference.nested.data as Daily[]).map(([run, board, , mean, deviation]) => ({
    run: String(run),
    board: String(board),
    mean,
    deviation,
    readings: 6,
  }));
  const { computed } = reference.nested;
  it('repeats, days and runs', () => {
    const levels = nestedLevels(days);
    if (levels.kind !== 'found') throw new Error(levels.kind);
    close(levels.repeats.deviation, computed.level1_pooled);
    close(levels.days.deviation, computed.level2_pooled);
    close(levels.runs.deviation, computed.level3);
    expect([levels.repeats.degrees, levels.days.degrees, levels.runs.degrees]).toEqual([300, 50, 5]);
  });
  it('each run alone', () => {
    for (const [run, repeats, ofDays] of [
      ['1', computed.level1_run1, computed.level2_run1],
      ['2', computed.level1_run2, computed.level2_run2],
    ] as const) {
      const both = days.filter((d) => d.run === run);
      expect(nestedLevels(both)).toEqual({ kind: 'tooFew', level: 'runs' });
      // A copy under another name has the same pooled deviations, and no difference between runs.
      const levels = nestedLevels([...both, ...both.map((d) => ({ ...d, run: 'copy' }))]);
      if (levels.kind !== 'found') throw new Error(levels.kind);
      close(levels.repeats.deviation, repeats);
      close(levels.days.deviation, ofDays);
      expect(levels.runs.deviation).toBe(0);
    }
  });
  it('a bias of known mean and spread', () => {
    const { mean_bias_vs_all_probes: mean, sd_bias: sd, t_bias: t } = computed;
    // Ten values with exactly that mean and standard deviation.
    const half = sd * Math.sqrt(9 / 10);
    const found = biasOf(
      Array.from({ length: 10 }, (_, i) => mean + (i % 2 ? half : -half)),
      0,
    );
    if (found.kind !== 'found') throw new Error(found.kind);
    expect(found.t).toBeCloseTo(t, 7);
    expect(found.significant).toBe(true);
  });
});
