import { meanOf, standardDeviation } from '../summary/moments';
import { chartConstants } from './chart-constants';
import type { ChartLimits, NoBaseline } from './limits';

export interface SubgroupBaseline {
  kind: 'found';
  means: ChartLimits;
  /** Of the ranges, or of the standard deviations. */
  spread: ChartLimits;
  /** Within subgroups, in the unit of the values. */
  sigma: number;
}

type Subgroups = readonly (readonly number[])[];

/** x̄-R limits from subgroups of one size, 2 to 50 (ranges serve up to about 10). NIST/SEMATECH e-Handbook 6.3.2.1. */
export const meanAndRangeBaseline = (subgroups: Subgroups) => baseline(subgroups, 'range');

/** x̄-s limits from subgroups of one size, 2 to 50. NIST/SEMATECH e-Handbook 6.3.2.1. */
export const meanAndDeviationBaseline = (subgroups: Subgroups) => baseline(subgroups, 'deviation');

/** Throws for subgroups of unequal size. */
function baseline(subgroups: Subgroups, by: 'range' | 'deviation'): SubgroupBaseline | NoBaseline {
  const size = subgroups[0]?.length ?? 0;
  if (subgroups.length < 2 || size < 2) return { kind: 'tooFew', needed: 2 };
  if (subgroups.some((group) => group.length !== size)) throw new RangeError('Subgroups of unequal size.');
  const spreads = subgroups.map((group) =>
    by === 'range' ? Math.max(...group) - Math.min(...group) : standardDeviation(group)!,
  );
  const centre = meanOf(subgroups.map(meanOf));
  const spread = meanOf(spreads);
  if (!(spread > 0)) return { kind: 'noSpread' };
  const k = chartConstants(size);
  const factors = by === 'range' ? [k.A2, k.D3, k.D4, k.d2] : [k.A3, k.B3, k.B4, k.c4];
  const [reach, low, high, divisor] = factors as [number, number, number, number];
  return {
    kind: 'found',
    means: { centre, lower: centre - reach * spread, upper: centre + reach * spread },
    spread: { centre: spread, lower: low > 0 ? low * spread : null, upper: high * spread },
    sigma: spread / divisor,
  };
}
