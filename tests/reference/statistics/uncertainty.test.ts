import { describe, expect, it } from 'vitest';
import { combineBudget, type Budget, type BudgetResult } from '@/lib/uncertainty/budget';
import { budgetAgreement } from '@/lib/uncertainty/budget-agreement';
import type { BudgetLine } from '@/lib/uncertainty/budget-line';
import { firstPassage } from '@/lib/uncertainty/first-passage';
import { monteCarloBudget } from '@/lib/uncertainty/monte-carlo';
import { effectiveDegrees } from '@/lib/uncertainty/welch-satterthwaite';
import { coverageFactor } from '@/lib/uncertainty/student-t';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import reference from './uncertainty.json';

function found(result: BudgetResult): Budget {
  if (result.kind !== 'found') throw new Error(result.kind);
  return result;
}

const line = (contributor: string, spread: number, rest: Partial<BudgetLine> = {}): BudgetLine => ({
  contributor,
  distribution: 'normal',
  spread,
  divisor: 1,
  sensitivity: 1,
  degrees: Infinity,
  ...rest,
});

describe.each(reference.budgets)('budget $id', (budget) => {
  const lines = budget.components.map((c) =>
    line(c.name, c.half_width_or_s, {
      distribution: c.distribution.startsWith('normal') ? 'normal' : 'rectangular',
      divisor: c.divisor,
      sensitivity: c.c,
      degrees: c.nu === 'inf' ? Infinity : Number(c.nu),
    }),
  );
  const combined = found(combineBudget(lines, [], budget.p));
  it('rows, combined, degrees, k and U', () => {
    combined.rows.forEach((row, i) => {
      expect(row.standard).toBeCloseTo(budget.components[i]!.u, 11);
      expect(row.contribution).toBeCloseTo(budget.components[i]!.u_i, 11);
    });
    expect(combined.standard).toBeCloseTo(budget.u_c, 11);
    expect(combined.effectiveDegrees).toBe(budget.nu_eff_floor);
    expect(combined.coverageFactor).toBeCloseTo(budget.k, 7);
    expect(combined.expanded).toBeCloseTo(budget.U, 10);
    expect(combined.rows.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
  });
  it('the simulation agrees to what its t-distributions add', () => {
    const simulated = monteCarloBudget({
      value: 9,
      lines,
      trials: 40_000,
      uniform: wichmannHill(7),
      coverage: budget.p,
    });
    if (simulated.kind !== 'found') throw new Error(simulated.kind);
    // A t of nu degrees has a variance nu/(nu - 2) times larger than the budget counts.
    const variance = combined.rows.reduce(
      (sum, r) => sum + r.contribution ** 2 * (Number.isFinite(r.degrees) ? r.degrees / (r.degrees - 2) : 1),
      0,
    );
    expect(Math.abs(simulated.standard / Math.sqrt(variance) - 1)).toBeLessThan(0.02);
    expect(simulated.mean).toBeCloseTo(9, 4);
    expect(Math.abs((simulated.high - simulated.low) / 2 / combined.expanded - 1)).toBeLessThan(0.06);
  });
});

describe('GUM H.1, end gauge (nm)', () => {
  const { inputs, computed_unrounded: expected } = reference.GUM_H1;
  const root3 = Math.sqrt(3);
  const d = Math.hypot(...inputs.u_d_components_nm);
  const dDegrees = d ** 4 / inputs.u_d_components_nm.reduce((s, u, i) => s + u ** 4 / inputs.nu_d_components[i]!, 0);
  const lines = [
    line('standard', inputs.u_ls_nm, { degrees: inputs.nu_ls }),
    line('comparison', d, { degrees: dDegrees }),
    line('expansion difference', 1e-6, {
      distribution: 'rectangular',
      divisor: root3,
      sensitivity: -inputs.ls_nm * inputs.theta_C,
      degrees: inputs.nu_d_alpha,
    }),
    line('temperature difference', 0.05, {
      distribution: 'rectangular',
      divisor: root3,
      sensitivity: -inputs.ls_nm * inputs.alpha_s,
      degrees: inputs.nu_d_theta,
    }),
  ];
  const budget = found(combineBudget(lines, [], 0.99));
  it('combined, degrees of freedom and U', () => {
    expect(dDegrees).toBeCloseTo(expected.nu_d, 5);
    budget.rows.forEach((row, i) => expect(Math.abs(row.contribution)).toBeCloseTo(expected.u_i_nm[i]!, 5));
    expect(budget.standard).toBeCloseTo(expected.u_c_nm, 5);
    expect(budget.effectiveDegrees).toBe(16);
    expect(budget.coverageFactor).toBeCloseTo(expected.k_t99_16, 6);
    expect(budget.expanded).toBeCloseTo(expected.U99_nm, 4);
  });
  it('with the contributions as the GUM rounds them', () => {
    const { u_i_nm, nu } = reference.GUM_H1.computed_with_GUM_rounded_contributions;
    expect(effectiveDegrees(u_i_nm.map((standard, i) => ({ standard, degrees: nu[i]! })))).toBe(16);
    expect(coverageFactor(0.99, 16)).toBeCloseTo(2.92, 2);
  });
  it('a simulation of the whole model finds the second-order terms that the budget leaves out', () => {
    // alpha and theta themselves, in K and 1/K; theta has its cyclic part (u-shaped, 0.5) and mean (normal, 0.2): 0.41 together.
    const all = [
      ...lines.map((l) => ({ ...l, degrees: Infinity })),
      line('alpha', 2e-6, { distribution: 'rectangular', divisor: root3, sensitivity: 0 }),
      line('theta', inputs.u_theta_C, { sensitivity: 0 }),
    ];
    const { ls_nm: ls, d_nm, alpha_s, theta_C } = inputs;
    const simulated = monteCarloBudget({
      value: expected.l_nm,
      lines: all,
      model: ([ols, od, oda, odt, oa, ot]) =>
        ls + ols! + d_nm + od! - (ls + ols!) * (oda! * (theta_C + ot!) + (alpha_s + oa!) * odt!),
      trials: 60_000,
      uniform: wichmannHill(1),
      coverage: 0.99,
    });
    if (simulated.kind !== 'found') throw new Error(simulated.kind);
    expect(Math.abs(simulated.standard / reference.GUM_H1.u_c_with_second_order_nm - 1)).toBeLessThan(0.015);
    const agreement = budgetAgreement(expected.l_nm, budget, simulated);
    expect(agreement.tolerance).toBe(0.5);
    expect(agreement.agree).toBe(false);
  });
});

describe('first passage of a stepped ramp', () => {
  // Simulated in the project's search study: bias in standard deviations of the noise by step, one look a step.
  it.each([
    [0.1, 1.21],
    [0.2, 0.9],
    [0.25, 0.8],
    [0.333, 0.67],
    [0.5, 0.49],
    [0.75, 0.33],
    [1, 0.23],
    [1.5, 0.11],
    [2, 0.05],
    [3, 0.01],
  ])('step %d sigma reads %d sigma early', (step, bias) => {
    expect(Math.abs(firstPassage(step, 1).bias - bias)).toBeLessThan(0.021);
  });
  it.each([
    [0.1, 0.57],
    [0.333, 0.7],
    [0.5, 0.76],
    [1, 0.89],
  ])('step %d sigma spreads %d sigma', (step, deviation) => {
    expect(Math.abs(firstPassage(step, 1).deviation - deviation)).toBeLessThan(0.02);
  });
  it('four looks a step move the point further, so that the dwell belongs to its definition', () => {
    expect(Math.abs(firstPassage(1, 4).bias - 1.12)).toBeLessThan(0.03);
    expect(Math.abs(firstPassage(0.333, 4).bias - 1.41)).toBeLessThan(0.03);
  });
});
