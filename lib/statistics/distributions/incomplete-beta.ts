import { binomialWeight } from './saddle-point';

const tiny = 1e-300;
const away = (value: number) => (Math.abs(value) < tiny ? tiny : value);

/**
 * Regularised incomplete beta function I_x(a, b), for a, b > 0 and x from 0 to 1; `y` is 1 - x where the caller knows it
 * more exactly. Continued fraction of DLMF 8.17.22, evaluated by the modified Lentz method; converges fast below the mean,
 * so above it the symmetry I_x(a, b) = 1 - I_y(b, a) is used. Throws where it does not converge (parameters over 1e9).
 */
export function incompleteBeta(x: number, a: number, b: number, y = 1 - x): number {
  if (!(a > 0 && b > 0) || Number.isNaN(x)) throw new RangeError(`Incomplete beta function of ${x}, ${a}, ${b}.`);
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(y, b, a, x);
  return ((binomialWeight(x, y, a, b) * b) / (a + b)) * fraction(x, a, b);
}

function fraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 / away(1 - ((a + b) * x) / (a + 1));
  let value = d;
  // The number of steps grows with the square root of the larger parameter.
  const most = 500 + 10 * Math.sqrt(Math.max(a, b));
  for (let m = 1; m <= most; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / away(1 + even * d);
    c = away(1 + even / c);
    value *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / away(1 + odd * d);
    c = away(1 + odd / c);
    const change = d * c;
    value *= change;
    if (Math.abs(change - 1) < 1e-15) return value;
  }
  throw new RangeError(`The incomplete beta function of ${x}, ${a}, ${b} did not converge.`);
}
