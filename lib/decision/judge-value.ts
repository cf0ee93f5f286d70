import type { DecisionRule } from '../sequence/step';

export interface Limits {
  min: number | null;
  max: number | null;
}

export interface Judgement {
  guardedMin: number | null;
  guardedMax: number | null;
  passed: boolean;
  /** On which side it failed; null when it passed. */
  side: 'low' | 'high' | null;
}

/** Width of the guard band: w = factor times U (ILAC-G8:09/2019), 0 under simple acceptance. */
export function guardBandOf(rule: DecisionRule, expandedUncertainty: number | null): number {
  return rule.kind === 'simple' ? 0 : rule.factor * (expandedUncertainty ?? 0);
}

/** Limits drawn in by the guard band `w`. They may cross when w is over half the tolerance: then nothing passes. */
export function drawIn(limits: Limits, w: number): Limits {
  return { min: limits.min === null ? null : limits.min + w, max: limits.max === null ? null : limits.max - w };
}

/**
 * A value against its limits under the decision rule. A value on a guarded limit passes. NaN never passes.
 * `expandedUncertainty` is U in the unit of the value; null where none is stated, which leaves the limits as they are.
 */
export function judgeValue(
  value: number,
  limits: Limits,
  expandedUncertainty: number | null,
  rule: DecisionRule,
): Judgement {
  const guarded = drawIn(limits, guardBandOf(rule, expandedUncertainty));
  const highEnough = guarded.min === null || value >= guarded.min;
  const lowEnough = guarded.max === null || value <= guarded.max;
  return {
    guardedMin: guarded.min,
    guardedMax: guarded.max,
    passed: highEnough && lowEnough,
    side: highEnough && lowEnough ? null : failedSide(value, limits, highEnough, lowEnough),
  };
}

/** Where the drawn-in limits cross, both may be missed: the nearer limit names the side. */
function failedSide(value: number, limits: Limits, highEnough: boolean, lowEnough: boolean): 'low' | 'high' {
  if (highEnough) return 'high';
  if (lowEnough || limits.min === null || limits.max === null) return 'low';
  return value - limits.min <= limits.max - value ? 'low' : 'high';
}
