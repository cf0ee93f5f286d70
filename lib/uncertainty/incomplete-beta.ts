import { logGamma } from './log-gamma';

/**
 * Regularised incomplete beta function I_x(a, b), for a, b > 0 and x from 0 to 1.
 * Continued fraction of DLMF 8.17.22, evaluated by the modified Lentz method; converges fast below the mean, so above it
 * the symmetry I_x(a, b) = 1 - I_{1-x}(b, a) is used.
 */
export function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x));
  return (front / a) * fraction(x, a, b);
}

const tiny = 1e-300;
const away = (value: number) => (Math.abs(value) < tiny ? tiny : value);

function fraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 / away(1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m <= 500; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / away(1 + even * d);
    c = away(1 + even / c);
    value *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / away(1 + odd * d);
    c = away(1 + odd / c);
    const change = d * c;
    value *= change;
    if (Math.abs(change - 1) < 1e-15) break;
  }
  return value;
}
