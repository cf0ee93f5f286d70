/** Three-sigma limits of a chart, in the unit of what is plotted. A limit that cannot be crossed is null (a range below 0). */
export interface ChartLimits {
  centre: number;
  lower: number | null;
  upper: number | null;
}

/** Why a baseline gives no limits. */
export type NoBaseline = { kind: 'tooFew'; needed: number } | { kind: 'noSpread' };

/** Places, from 0, of the values beyond a limit; a value on it is not beyond. A `limits` per point, or one for all. */
export function placesBeyond(values: readonly number[], limits: ChartLimits | readonly ChartLimits[]): number[] {
  return values.flatMap((value, i) => {
    const { lower, upper } = Array.isArray(limits) ? (limits[i] as ChartLimits) : (limits as ChartLimits);
    return (upper !== null && value > upper) || (lower !== null && value < lower) ? [i] : [];
  });
}
