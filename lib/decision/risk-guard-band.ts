import { findRoot, type Root } from '../circuit/find-root';
import { drawIn, type Limits } from './judge-value';
import { globalRisk, type Product } from './risk-global';
import { specificRisk } from './risk-specific';

/**
 * Width w of the guard band at which a value on a drawn-in limit has the probability `risk` of being outside the limits; 0
 * where even simple acceptance has no more. `notBracketed`: so narrow a tolerance, or so large an uncertainty, reaches the
 * risk nowhere. JCGM 106:2012, 8.3.2.
 */
export function guardForSpecificRisk(risk: number, standard: number, limits: Limits): Root {
  const ends = [
    ...(limits.min === null ? [] : [(w: number) => limits.min! + w]),
    ...(limits.max === null ? [] : [(w: number) => limits.max! - w]),
  ];
  const worst = (w: number) => Math.max(0, ...ends.map((end) => 1 - specificRisk(end(w), standard, limits).conforming));
  return smallestGuard(worst, risk, standard, limits);
}

/**
 * Width w of the guard band at which the consumer's risk over the whole product is `risk`; 0 where simple acceptance has no
 * more, `notBracketed` where no width brings it down that far. JCGM 106:2012, 9.5.
 */
export function guardForGlobalRisk(risk: number, standard: number, limits: Limits, product: Product): Root {
  const consumers = (w: number) => {
    const found = globalRisk({ product, limits, acceptance: drawIn(limits, w), standard });
    return found.kind === 'found' ? found.falseAccept : NaN;
  };
  return smallestGuard(consumers, risk, standard, limits);
}

function smallestGuard(riskAt: (w: number) => number, risk: number, standard: number, { min, max }: Limits): Root {
  const atNone = riskAt(0);
  if (Number.isNaN(atNone)) return { kind: 'notConverged' };
  if (atNone <= risk) return { kind: 'found', x: 0 };
  const most = min === null || max === null ? 10 * standard : Math.min(10 * standard, (max - min) / 2);
  // Logarithms, so that a wanted risk of 1e-6 is met to as many digits as one of a half.
  const root = findRoot((w) => Math.log(Math.max(riskAt(w), 1e-300) / risk), 0, most, 1e-9 * standard);
  return root;
}
