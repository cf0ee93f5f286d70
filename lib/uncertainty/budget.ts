import { standardOf, type BudgetLine } from './budget-line';
import { usualCoverage, type CombinedUncertainty } from './combine';
import { choleskyFactor, correlationMatrix, type Correlation } from './correlation';
import { coverageFactor } from './student-t';
import { effectiveDegrees } from './welch-satterthwaite';

export interface BudgetRow extends BudgetLine {
  /** Standard uncertainty in the contributor's unit, and times its signed sensitivity in the unit of the result. */
  standard: number;
  contribution: number;
  /** Part of the variance, correlated terms shared out; all add up to 1. Below 0 where a correlation takes away. */
  share: number;
}

export interface Budget extends CombinedUncertainty {
  kind: 'found';
  rows: BudgetRow[];
  /** Correlated rows of few degrees of freedom: Welch and Satterthwaite's formula does not cover them; see below. */
  degreesAreCautious: boolean;
}

/** `contradiction`: no quantities can have these correlations together. */
export type BudgetResult = Budget | { kind: 'contradiction' };

/**
 * Combined and expanded uncertainty of a budget, correlated terms included. JCGM 100:2008, 5.2.2 (16), G.4.1. Rows that are
 * correlated with each other enter the effective degrees of freedom as one contribution with the fewest degrees among them.
 */
export function combineBudget(
  lines: readonly BudgetLine[],
  correlations: readonly Correlation[] = [],
  coverage = usualCoverage,
): BudgetResult {
  const matrix = correlationMatrix(
    lines.map(({ contributor }) => contributor),
    correlations,
  );
  if (!choleskyFactor(matrix)) return { kind: 'contradiction' };
  const parts = lines.map((line) => line.sensitivity * standardOf(line));
  const terms = parts.map((part, i) => part * matrix[i]!.reduce((sum, r, j) => sum + r * parts[j]!, 0));
  const variance = Math.max(
    0,
    terms.reduce((sum, term) => sum + term, 0),
  );
  const groups = correlatedGroups(matrix).map((members) => ({
    standard: Math.sqrt(
      Math.max(
        0,
        members.reduce((sum, i) => sum + terms[i]!, 0),
      ),
    ),
    degrees: Math.min(...members.map((i) => lines[i]!.degrees)),
    many: members.length > 1,
  }));
  const degrees = effectiveDegrees(groups);
  const k = coverageFactor(coverage, degrees);
  const standard = Math.sqrt(variance);
  return {
    kind: 'found',
    rows: lines.map((line, i) => ({
      ...line,
      standard: standardOf(line),
      contribution: parts[i]!,
      share: variance > 0 ? terms[i]! / variance : 0,
    })),
    standard,
    effectiveDegrees: degrees,
    coverageFactor: k,
    expanded: k * standard,
    degreesAreCautious: groups.some((group) => group.many && Number.isFinite(group.degrees)),
  };
}

/** Places that are linked by any correlation, straight or through others. */
function correlatedGroups(matrix: number[][]): number[][] {
  const left = new Set(matrix.keys());
  const groups: number[][] = [];
  for (const first of matrix.keys()) {
    if (!left.delete(first)) continue;
    const group = [first];
    for (const i of group) {
      for (const j of [...left]) {
        if (matrix[i]![j] === 0) continue;
        left.delete(j);
        group.push(j);
      }
    }
    groups.push(group);
  }
  return groups;
}
