import { integrate, type Integral } from '../integrate';
import { logGamma } from './log-gamma';
import { normalAbove } from './normal';

/**
 * Probability that a noncentral t variable of `degrees` and noncentrality `shift` lies above `t`: the normal tail averaged
 * over the distribution of the estimated standard deviation, by direct integration to 1e-10. (Series lose accuracy for
 * large shifts.) Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions 2, 31.3.
 */
export function noncentralTAbove(t: number, degrees: number, shift: number): Integral {
  const scale = Math.log(2) + (degrees / 2) * Math.log(degrees / 2) - logGamma(degrees / 2);
  const density = (s: number) => Math.exp(scale + (degrees - 1) * Math.log(s) - (degrees * s * s) / 2);
  const width = 9 / Math.sqrt(2 * degrees);
  const from = Math.max(1e-12, 1 - width);
  return integrate((s) => density(s) * normalAbove(t * s - shift), from, 1 + width + (degrees < 5 ? 3 : 0), 1e-10, [1]);
}
