import { normalAbove, normalBelow } from '../distributions/normal';
import { meanOf, standardDeviation } from '../summary/moments';

export type NormalityTest =
  /** `statistic` is A² adjusted for the sample size, `p` the probability of a larger one from normal values. */
  { kind: 'found'; statistic: number; p: number } | { kind: 'tooFew'; needed: number } | { kind: 'noSpread' };

const needed = 8;

/**
 * Are the values normal, mean and standard deviation unknown? Anderson and Darling's test with the p-values of Stephens, in
 * D'Agostino and Stephens, Goodness-of-Fit Techniques (1986), table 4.9, case 3; NIST/SEMATECH e-Handbook 7.2.1.3. At least eight
 * values. Coarse resolution counts against normality: values that share a few levels are not normal.
 */
export function andersonDarling(values: readonly number[]): NormalityTest {
  const n = values.length;
  if (n < needed) return { kind: 'tooFew', needed };
  const sigma = standardDeviation(values)!;
  if (!(sigma > 0)) return { kind: 'noSpread' };
  const centre = meanOf(values);
  const z = values.map((value) => (value - centre) / sigma).sort((a, b) => a - b);
  const sum = z.reduce(
    (total, low, i) => total + (2 * i + 1) * (Math.log(normalBelow(low)) + Math.log(normalAbove(z[n - 1 - i]!))),
    0,
  );
  const statistic = (-n - sum / n) * (1 + 0.75 / n + 2.25 / (n * n));
  return { kind: 'found', statistic, p: tail(statistic) };
}

function tail(a: number): number {
  if (a >= 10) return 3.7e-24;
  if (a >= 0.6) return Math.exp(1.2937 - 5.709 * a + 0.0186 * a * a);
  if (a >= 0.34) return Math.exp(0.9177 - 4.279 * a - 1.38 * a * a);
  if (a >= 0.2) return 1 - Math.exp(-8.318 + 42.796 * a - 59.938 * a * a);
  return 1 - Math.exp(-13.436 + 101.14 * a - 223.73 * a * a);
}
