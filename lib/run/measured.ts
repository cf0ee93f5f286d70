import type { Contribution } from '../uncertainty/combine';
import { combineContributions } from '../uncertainty/combine';
import { judgeValue, type Limits } from '../decision/judge-value';
import type { StepContext } from './machine';
import type { Measurement } from './types';

interface Measured {
  quantity: Measurement['quantity'];
  phase: Measurement['phase'];
  value: number;
  limits: { min?: number; max?: number };
  /** Null: no uncertainty is stated for this quantity, so its limits are not drawn in. */
  budget: Contribution[] | null;
  settles?: number;
}

const bounds = ({ min, max }: Measured['limits']): Limits => ({ min: min ?? null, max: max ?? null });

function unjudged({ quantity, phase, value, limits, budget, settles }: Measured, stepIndex: number): Measurement {
  const combined = budget && combineContributions(budget);
  return {
    quantity,
    phase,
    value,
    standardUncertainty: combined?.standard ?? null,
    expandedUncertainty: combined?.expanded ?? null,
    ...bounds(limits),
    guardedMin: null,
    guardedMax: null,
    passed: null,
    stepIndex,
    settles: settles ?? null,
  };
}

/** A measurement for the record only: trimming may still change it. */
export function noted(measured: Measured, { stepIndex }: StepContext): Measurement {
  return unjudged(measured, stepIndex);
}

/** A measurement with its verdict under the sequence's decision rule. */
export function judged(measured: Measured, { plan, stepIndex }: StepContext): Measurement {
  const measurement = unjudged(measured, stepIndex);
  const { guardedMin, guardedMax, passed } = judgeValue(
    measured.value,
    bounds(measured.limits),
    measurement.expandedUncertainty,
    plan.sequence.decisionRule,
  );
  return { ...measurement, guardedMin, guardedMax, passed };
}
