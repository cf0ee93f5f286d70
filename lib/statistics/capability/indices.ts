/** Limits of the specification, in the unit of the values; null where there is none on that side. */
export interface SpecificationLimits {
  min: number | null;
  max: number | null;
}

export interface CapabilityIndices {
  /** Null with one limit only. */
  cp: number | null;
  /** Towards the lower and the upper limit. */
  lower: number | null;
  upper: number | null;
  /** The smaller of the two; negative when the mean is outside the limits. */
  cpk: number;
}

/**
 * Cp and Cpk where `sigma` is the spread within a stable process (MR̄/d2, pooled), Pp and Ppk where it is the standard
 * deviation of all values. Null without a limit or a spread. NIST/SEMATECH e-Handbook 6.1.6; ISO 22514-2.
 */
export function capabilityIndices(
  mean: number,
  sigma: number,
  { min, max }: SpecificationLimits,
): CapabilityIndices | null {
  if ((min === null && max === null) || !(sigma > 0)) return null;
  const lower = min === null ? null : (mean - min) / (3 * sigma);
  const upper = max === null ? null : (max - mean) / (3 * sigma);
  return {
    cp: min === null || max === null ? null : (max - min) / (6 * sigma),
    lower,
    upper,
    cpk: Math.min(lower ?? Infinity, upper ?? Infinity),
  };
}
