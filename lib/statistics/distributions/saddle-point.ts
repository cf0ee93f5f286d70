import { logGamma } from './log-gamma';

/** ln Γ(z + 1) less Stirling's formula, for z > 0. Series of DLMF 5.11.1 from 15 on, where its next term is below 1e-17. */
function stirlingError(z: number): number {
  if (z < 15) return logGamma(z + 1) - (z + 0.5) * Math.log(z) + z - 0.5 * Math.log(2 * Math.PI);
  const w = 1 / (z * z);
  return (1 / 12 - w * (1 / 360 - w * (1 / 1260 - w * (1 / 1680 - w / 1188)))) / z;
}

/** x ln(x / m) + m - x for x, m > 0, without the cancellation near x = m. */
function deviance(x: number, m: number): number {
  if (Math.abs(x - m) >= 0.1 * (x + m)) return x * Math.log(x / m) + m - x;
  const v = (x - m) / (x + m);
  let sum = (x - m) * v;
  let power = 2 * x * v;
  for (let j = 3; j < 1000; j += 2) {
    power *= v * v;
    const next = sum + power / j;
    if (next === sum) break;
    sum = next;
  }
  return sum;
}

/**
 * x^a y^b Γ(a + b + 1) / (Γ(a + 1) Γ(b + 1)) for x + y = 1 and a, b > 0, not by differences of large logarithms: it keeps
 * its digits with counts of millions. C. Loader, Fast and Accurate Computation of Binomial Probabilities, 2000.
 */
export function binomialWeight(x: number, y: number, a: number, b: number): number {
  const n = a + b;
  const error = stirlingError(n) - stirlingError(a) - stirlingError(b) - deviance(a, n * x) - deviance(b, n * y);
  return Math.exp(error) * Math.sqrt(n / (2 * Math.PI * a * b));
}

/** x^a e^-x / Γ(a + 1) for a, x > 0, in the same way. */
export function poissonWeight(x: number, a: number): number {
  return Math.exp(-stirlingError(a) - deviance(a, x)) / Math.sqrt(2 * Math.PI * a);
}
