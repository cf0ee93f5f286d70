import type { Contribution } from './combine';

export interface MeterUncertainty {
  /** Relative standard uncertainty of a reading. */
  gain: number;
  offsetVolts: number;
  resolutionVolts: number;
}

interface Repeats {
  values: readonly number[];
  /** Standard uncertainty of the search that made each value. */
  searchUncertainties: readonly number[];
}

export const mean = (values: readonly number[]) => values.reduce((sum, v) => sum + v, 0) / values.length;

/** Standard uncertainty of the mean of searches that are independent of each other. */
function ofMean(standards: readonly number[]): number {
  return Math.sqrt(standards.reduce((sum, u) => sum + u * u, 0)) / standards.length;
}

function random({ values, searchUncertainties }: Repeats): Contribution[] {
  const search: Contribution = {
    name: 'search',
    distribution: 'normal',
    standard: ofMean(searchUncertainties),
    degrees: Infinity,
  };
  if (values.length < 2) return [search];
  const centre = mean(values);
  const variance = values.reduce((sum, v) => sum + (v - centre) ** 2, 0) / (values.length - 1);
  return [
    search,
    {
      name: 'repeatability',
      distribution: 'normal',
      standard: Math.sqrt(variance / values.length),
      degrees: values.length - 1,
    },
  ];
}

const systematic = (name: Contribution['name'], standard: number): Contribution => ({
  name,
  distribution: 'rectangular',
  standard,
  degrees: Infinity,
});

/** A trip or release point as the mean of its repeats. Volts. JCGM 100:2008; the meter's parts are common to all repeats. */
export function pointBudget(repeats: Repeats, meter: MeterUncertainty): Contribution[] {
  return [
    ...random(repeats),
    systematic('meter-gain', Math.abs(mean(repeats.values)) * meter.gain),
    systematic('meter-offset', meter.offsetVolts),
    systematic('meter-resolution', meter.resolutionVolts / Math.sqrt(12)),
  ];
}

/**
 * Release minus trip, both read on one channel and range: the offset cancels and the gain acts on the difference only.
 * Two readings are rounded, so the resolution counts twice. `repeats` holds the differences.
 */
export function hysteresisBudget(repeats: Repeats, meter: MeterUncertainty): Contribution[] {
  return [
    ...random(repeats),
    systematic('meter-gain', Math.abs(mean(repeats.values)) * meter.gain),
    systematic('meter-resolution', meter.resolutionVolts / Math.sqrt(6)),
  ];
}

/** One reading of the meter, or the difference of two on different channels. */
export function readingBudget(volts: number[], meter: MeterUncertainty): Contribution[] {
  return volts.flatMap((v) => [
    systematic('meter-gain', Math.abs(v) * meter.gain),
    systematic('meter-offset', meter.offsetVolts),
    systematic('meter-resolution', meter.resolutionVolts / Math.sqrt(12)),
  ]);
}
