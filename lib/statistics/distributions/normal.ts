import { incompleteGamma } from './incomplete-gamma';

export const normalDensity = (z: number) => Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);

/** Probability that a standard normal variable lies below `z`, relative error about 1e-14 in either tail. DLMF 7.11.2. */
export function normalBelow(z: number): number {
  const { lower, upper } = incompleteGamma(0.5, (z * z) / 2);
  return z < 0 ? upper / 2 : 0.5 + lower / 2;
}

/** Probability that a standard normal variable lies above `z`, relative error about 1e-14 in either tail. */
export const normalAbove = (z: number) => normalBelow(-z);
