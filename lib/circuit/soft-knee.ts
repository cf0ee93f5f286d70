import type { BoardDesign } from './board-design';
import { wiperConductances } from './divider';
import { findRoot, type Root } from './find-root';
import type { Thresholds } from './thresholds';

type Reference = BoardDesign['reference'];

const toleranceVolts = 1e-9;

/** Supply that holds the reference node at `nodeVolts`: the feed resistor carries the zener's current. Rises with it. */
export function supplyForReference(reference: Reference, nodeVolts: number): number {
  return nodeVolts + reference.feedOhms * zenerAmps(reference, nodeVolts);
}

/** Soft knee, I = I0 exp((V - V0) / n). */
export function zenerAmps(reference: Reference, nodeVolts: number): number {
  return reference.ratedAmps * Math.exp((nodeVolts - reference.nominalVolts) / reference.kneeVolts);
}

/** The reference node at a supply voltage: found by root finding between ground and the supply. Volts. */
export function referenceAt(reference: Reference, supplyVolts: number): Root {
  if (supplyVolts <= 0) return { kind: 'notBracketed' };
  // Beyond this the feed resistor could not carry the zener's current, so the bracket stays free of overflow.
  const ceiling =
    reference.nominalVolts + reference.kneeVolts * Math.log(supplyVolts / (reference.feedOhms * reference.ratedAmps));
  const high = Math.min(supplyVolts, Math.max(ceiling, toleranceVolts));
  return findRoot((node) => supplyForReference(reference, node) - supplyVolts, 0, high, toleranceVolts);
}

export type ThresholdsResult =
  | ({ kind: 'found'; tripReferenceVolts: number; releaseReferenceVolts: number } & Thresholds)
  | Exclude<Root, { kind: 'found' }>;

/**
 * Trip and release with the soft-knee reference, which sags with the supply. The unknown is the reference node V: the
 * closed form gives the threshold for V, the feed resistor gives the supply for V, and both must agree. The difference
 * is concave in V, so the point wanted is the crossing above its maximum.
 */
export function softKneeThresholds(design: BoardDesign, wiper: number): ThresholdsResult {
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  const total = toSupply + toGround + feedback;
  const offset = total * (design.comparatorOffsetVolts ?? 0);
  const trip = crossing(
    design.reference,
    total / (toSupply + feedback),
    (offset + design.outputDropVolts * feedback) / (toSupply + feedback),
  );
  if (trip.kind !== 'found') return trip;
  const release = crossing(design.reference, total / toSupply, (offset - design.outputLowVolts * feedback) / toSupply);
  if (release.kind !== 'found') return release;
  return {
    kind: 'found',
    tripVolts: supplyForReference(design.reference, trip.x),
    releaseVolts: supplyForReference(design.reference, release.x),
    tripReferenceVolts: trip.x,
    releaseReferenceVolts: release.x,
  };
}

/** Node voltage where `slope` V + `offset` meets the supply that the node needs. `slope` is above 1. */
function crossing(reference: Reference, slope: number, offset: number): Root {
  const { kneeVolts, feedOhms, ratedAmps, nominalVolts } = reference;
  const excess = (node: number) => slope * node + offset - supplyForReference(reference, node);
  const top = nominalVolts + kneeVolts * Math.log(((slope - 1) * kneeVolts) / (feedOhms * ratedAmps));
  if (!(excess(top) > 0)) return { kind: 'notBracketed' };
  let above = top + kneeVolts;
  while (excess(above) > 0) above += kneeVolts;
  return findRoot(excess, top, above, toleranceVolts);
}
