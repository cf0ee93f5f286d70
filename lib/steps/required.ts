import type { Measurement } from '../run/types';
import type { Required } from './step-kind';

/** Quantities that a step measures once and judges at once. */
export const checks = (...quantities: Measurement['quantity'][]): Required[] =>
  quantities.map((quantity) => ({ quantity, phase: 'check' }));
