import { poissonWeight } from './saddle-point';

const tiny = 1e-300;

/**
 * Regularised incomplete gamma functions P(a, x) and Q(a, x) = 1 - P, each without cancellation, for a > 0 and x >= 0.
 * Power series of DLMF 8.7.1 below a + 1, continued fraction of DLMF 8.9.2 (modified Lentz) above. Throws where it does not
 * converge (a over 1e9).
 */
export function incompleteGamma(a: number, x: number): { lower: number; upper: number } {
  if (!(a > 0) || !(x >= 0)) throw new RangeError(`Incomplete gamma function of ${a}, ${x}.`);
  if (x === 0) return { lower: 0, upper: 1 };
  if (x === Infinity) return { lower: 1, upper: 0 };
  const weight = poissonWeight(x, a);
  if (x < a + 1) {
    const lower = weight * series(a, x);
    return { lower, upper: 1 - lower };
  }
  const upper = weight * a * fraction(a, x);
  return { lower: 1 - upper, upper };
}

const mostSteps = (a: number) => 500 + 20 * Math.sqrt(a);

function series(a: number, x: number): number {
  let term = 1;
  let sum = 1;
  for (let k = 1; k <= mostSteps(a); k++) {
    term *= x / (a + k);
    sum += term;
    if (term < sum * 1e-17) return sum;
  }
  throw new RangeError(`The incomplete gamma function of ${a}, ${x} did not converge.`);
}

function fraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1 / tiny;
  let d = 1 / b;
  let value = d;
  for (let k = 1; k <= mostSteps(a); k++) {
    const numerator = -k * (k - a);
    b += 2;
    d = 1 / (numerator * d + b || tiny);
    c = b + numerator / c || tiny;
    const change = d * c;
    value *= change;
    if (Math.abs(change - 1) < 1e-15) return value;
  }
  throw new RangeError(`The incomplete gamma function of ${a}, ${x} did not converge.`);
}
