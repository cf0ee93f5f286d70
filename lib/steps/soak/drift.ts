import type { Contribution } from '../../uncertainty/combine';
import type { MeterUncertainty } from '../../uncertainty/point-budget';

export interface SoakReading {
  atMs: number;
  volts: number;
}

/**
 * What the least-squares straight line through the readings moves from the first to the last, with the standard uncertainty
 * that the scatter about it leaves. Volts; JCGM 100:2008, H.3.
 */
export function driftOf(readings: readonly SoakReading[]): { volts: number; standardVolts: number } {
  const n = readings.length;
  const meanMs = readings.reduce((sum, r) => sum + r.atMs, 0) / n;
  const meanVolts = readings.reduce((sum, r) => sum + r.volts, 0) / n;
  const spreadMs = readings.reduce((sum, r) => sum + (r.atMs - meanMs) ** 2, 0);
  if (n < 3 || spreadMs === 0) return { volts: 0, standardVolts: 0 };
  const slope = readings.reduce((sum, r) => sum + (r.atMs - meanMs) * (r.volts - meanVolts), 0) / spreadMs;
  const residual = readings.reduce((sum, r) => sum + (r.volts - meanVolts - slope * (r.atMs - meanMs)) ** 2, 0);
  const spanMs = readings[n - 1]!.atMs - readings[0]!.atMs;
  return { volts: slope * spanMs, standardVolts: Math.sqrt(residual / (n - 2) / spreadMs) * spanMs };
}

/** The meter's offset is common to all readings and cancels; its gain acts on what moved. */
export function driftBudget(readings: readonly SoakReading[], meter: MeterUncertainty): Contribution[] {
  const { volts, standardVolts } = driftOf(readings);
  const systematic = { distribution: 'rectangular', degrees: Infinity } as const;
  return [
    { name: 'repeatability', distribution: 'normal', standard: standardVolts, degrees: readings.length - 2 },
    { name: 'meter-gain', ...systematic, standard: Math.abs(volts) * meter.gain },
    { name: 'meter-resolution', ...systematic, standard: meter.resolutionVolts / Math.sqrt(6) },
  ];
}
