import { normalBelow, normalDensity } from '../statistics/distributions/normal';
import { integrate } from '../statistics/integrate';
import type { Limits } from './judge-value';

/** How the true values of the product spread, before any is sorted out. */
export type Product =
  { kind: 'normal'; mean: number; deviation: number } | { kind: 'uniform'; min: number; max: number };

export interface GlobalRiskQuestion {
  product: Product;
  /** Limits of the specification, and the limits that a measured value must meet to be accepted (drawn in, or let out). */
  limits: Limits;
  acceptance: Limits;
  /** Standard uncertainty of a measured value, over 0. All in one unit. */
  standard: number;
}

export type GlobalRisk =
  | {
      kind: 'found';
      /** Share of all boards that are bad and accepted: the consumer's risk. */
      falseAccept: number;
      /** Share of all boards that are good and rejected: the producer's risk. */
      falseReject: number;
      accepted: number;
      /** Share of bad boards among the accepted; null where none is accepted. */
      badAmongAccepted: number | null;
    }
  | { kind: 'notConverged' };

/** In standard deviations: the normal distribution beyond is below 1e-22. */
const reach = 10;
const tolerance = 1e-11;

/** Global risk over a whole product. JCGM 106:2012, 9.5; NCSLI RP-18. Absolute error below 1e-10. */
export function globalRisk(question: GlobalRiskQuestion): GlobalRisk {
  const { product, limits, acceptance, standard } = question;
  const [from, to] = spanOf(product);
  const density = densityOf(product);
  const accepts = (x: number) => acceptProbability(x, acceptance, standard);
  const breaks = bends(question);
  const over = (low: number, high: number, f: (x: number) => number) =>
    high > low ? integrate(f, low, high, tolerance, breaks) : ({ kind: 'found', value: 0, error: 0 } as const);
  const min = Math.min(to, Math.max(from, limits.min ?? from));
  const max = Math.max(min, Math.min(to, limits.max ?? to));
  const parts = [
    over(from, min, (x) => density(x) * accepts(x)),
    over(max, to, (x) => density(x) * accepts(x)),
    over(min, max, (x) => density(x) * (1 - accepts(x))),
    over(min, max, (x) => density(x) * accepts(x)),
  ];
  const [below, above, falseReject, goodAccepted] = parts.map((part) => (part.kind === 'found' ? part.value : NaN));
  if (parts.some((part) => part.kind !== 'found')) return { kind: 'notConverged' };
  const falseAccept = below! + above!;
  const accepted = falseAccept + goodAccepted!;
  return {
    kind: 'found',
    falseAccept,
    falseReject: falseReject!,
    accepted,
    badAmongAccepted: accepted > 1e-10 ? falseAccept / accepted : null,
  };
}

function acceptProbability(x: number, { min, max }: Limits, standard: number): number {
  const belowMax = max === null ? 1 : normalBelow((max - x) / standard);
  const belowMin = min === null ? 0 : normalBelow((min - x) / standard);
  return Math.max(0, belowMax - belowMin);
}

const spanOf = (product: Product): [number, number] =>
  product.kind === 'uniform'
    ? [product.min, product.max]
    : [product.mean - reach * product.deviation, product.mean + reach * product.deviation];

function densityOf(product: Product): (x: number) => number {
  if (product.kind === 'uniform') return () => 1 / (product.max - product.min);
  return (x) => normalDensity((x - product.mean) / product.deviation) / product.deviation;
}

/** Where the integrands change fast: round the acceptance limits, and about the middle of the product. */
function bends({ product, acceptance, standard }: GlobalRiskQuestion): number[] {
  const edges = [acceptance.min, acceptance.max].filter((edge) => edge !== null);
  const near = edges.flatMap((edge) => [-6, -2, 0, 2, 6].map((k) => edge + k * standard));
  return product.kind === 'uniform' ? near : [...near, ...[-3, 0, 3].map((k) => product.mean + k * product.deviation)];
}
