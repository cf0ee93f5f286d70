import { meanOf, standardDeviation } from '../statistics/summary/moments';
import type { BudgetLine } from './budget-line';
import { usualCoverage } from './combine';
import { choleskyFactor, correlationMatrix, type Correlation } from './correlation';
import { drawDeviation, drawNormal, type Uniform } from './draw';

export interface MonteCarloQuestion {
  /** The estimate, in the unit of the result. */
  value: number;
  lines: readonly BudgetLine[];
  correlations?: readonly Correlation[];
  /** The result for given deviations of the contributors; the sum of sensitivity times deviation where none is given. */
  model?: (deviations: readonly number[]) => number;
  /** At least 1,000; a million settle the second digit of U whatever it is, and take a second or two. */
  trials: number;
  uniform: Uniform;
  coverage?: number;
}

export type MonteCarlo =
  | {
      kind: 'found';
      mean: number;
      standard: number;
      /** Probabilistically symmetric interval, and the standard error of its ends from ten blocks. */
      low: number;
      high: number;
      endError: number;
      /** The shortest interval of the same coverage; another one where the distribution is skew. */
      shortest: { low: number; high: number };
    }
  | { kind: 'contradiction' };

const blocks = 10;

/**
 * Propagation of the distributions of a budget. JCGM 101:2008, 7. Rows of other than normal shape that are correlated are
 * joined by a normal copula, which leaves their correlation up to 0.02 nearer to 0.
 */
export function monteCarloBudget(question: MonteCarloQuestion): MonteCarlo {
  const { value, lines, trials, uniform, coverage = usualCoverage } = question;
  if (!(trials >= 1000)) throw new RangeError(`${trials} trials are too few.`);
  const matrix = correlationMatrix(
    lines.map(({ contributor }) => contributor),
    question.correlations ?? [],
  );
  const factor = choleskyFactor(matrix);
  if (!factor) return { kind: 'contradiction' };
  const model = question.model ?? ((d) => value + d.reduce((sum, x, i) => sum + lines[i]!.sensitivity * x, 0));
  const drawn = new Float64Array(trials);
  const isCorrelated = matrix.map((row, j) => row.some((r, k) => k !== j && r !== 0));
  const independent = new Float64Array(lines.length);
  const deviations = new Array<number>(lines.length).fill(0);
  for (let i = 0; i < trials; i++) {
    for (let j = 0; j < lines.length; j++) {
      let normal: number | null = null;
      if (isCorrelated[j]) {
        independent[j] = drawNormal(uniform);
        normal = 0;
        for (let k = 0; k <= j; k++) normal += factor[j]![k]! * independent[k]!;
      }
      deviations[j] = drawDeviation(lines[j]!, normal, uniform);
    }
    drawn[i] = model(deviations);
  }
  const size = Math.floor(trials / blocks);
  const ends = Array.from({ length: blocks }, (_, b) =>
    symmetric(drawn.slice(b * size, (b + 1) * size).sort(), coverage),
  );
  const error = (pick: (end: { low: number; high: number }) => number) =>
    standardDeviation(ends.map(pick))! / Math.sqrt(blocks);
  const all = Array.from(drawn);
  const sorted = drawn.sort();
  return {
    kind: 'found',
    mean: meanOf(all),
    standard: standardDeviation(all)!,
    ...symmetric(sorted, coverage),
    endError: Math.max(
      error((end) => end.low),
      error((end) => end.high),
    ),
    shortest: shortest(sorted, coverage),
  };
}

/** JCGM 101:2008, 7.7.2. */
function symmetric(sorted: Float64Array, coverage: number): { low: number; high: number } {
  const within = Math.round(coverage * sorted.length);
  const from = Math.round((sorted.length - within) / 2);
  return { low: sorted[from]!, high: sorted[Math.min(sorted.length - 1, from + within)]! };
}

/** JCGM 101:2008, 7.7.3. */
function shortest(sorted: Float64Array, coverage: number): { low: number; high: number } {
  const within = Math.round(coverage * sorted.length);
  let best = 0;
  for (let i = 1; i + within < sorted.length; i++)
    if (sorted[i + within]! - sorted[i]! < sorted[best + within]! - sorted[best]!) best = i;
  return { low: sorted[best]!, high: sorted[best + within]! };
}
