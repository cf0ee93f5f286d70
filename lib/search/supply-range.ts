import { overshootBound } from './overshoot-range';
import { type SupplyModel, setpointFor, supplyErrorAt } from './supply-level';
import type { SearchSettings } from './types';

/**
 * The highest level a step from `from` may aim at, so that its peak stays at or below the supply's maximum with the
 * largest overshoot considered and three standard deviations of the supply's own error. Volts.
 */
export function highestLevel(settings: SearchSettings, supply: SupplyModel, from: number): number {
  const limit = settings.supplyMaxVolts - 3 * supplyErrorAt(supply, settings.supplyMaxVolts).sd;
  return Math.max(settings.supplyMinVolts, Math.min(limit, (limit + overshootBound * from) / (1 + overshootBound)));
}

/** The setpoint for a level, never below the supply's minimum nor above what `highestLevel` allows. */
export function allowedSetpoint(settings: SearchSettings, supply: SupplyModel, from: number, level: number): number {
  const wanted = Math.min(level, highestLevel(settings, supply, from));
  const cap = (settings.supplyMaxVolts + overshootBound * from) / (1 + overshootBound);
  return Math.max(settings.supplyMinVolts, Math.min(cap, setpointFor(supply, wanted)));
}
