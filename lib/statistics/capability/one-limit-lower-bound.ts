import { findRoot, type Root } from '../../circuit/find-root';
import { noncentralTAbove } from '../distributions/noncentral-t';

/**
 * Exact one-sided lower bound of the index towards a single limit, from `count` normal values with their own standard
 * deviation: the index lies above it with `confidence`. Noncentral t; Kotz and Lovelace, Process Capability Indices, 1998.
 */
export function oneLimitLowerBound(index: number, count: number, confidence = 0.95): Root {
  const t = 3 * index * Math.sqrt(count);
  const beyond = (shift: number) => {
    const tail = noncentralTAbove(t, count - 1, shift);
    return tail.kind === 'found' ? tail.value - (1 - confidence) : NaN;
  };
  const reach = 6 + Math.abs(t);
  const root = findRoot(beyond, t - reach, t + reach, 1e-9 * reach);
  return root.kind === 'found' ? { kind: 'found', x: root.x / (3 * Math.sqrt(count)) } : root;
}
