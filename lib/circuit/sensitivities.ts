import type { PartTolerances } from '../contracts/board-type';
import type { BoardDesign } from './board-design';
import { wiperConductances } from './divider';
import { zenerAmps } from './soft-knee';
import { thresholdsAt } from './thresholds';

/** Parts that move a point. */
export const pointParts = [
  'referenceVolts',
  'referenceKnee',
  'feedOhms',
  'trimmerOhms',
  'supplyEndOhms',
  'groundEndOhms',
  'feedbackOhms',
  'outputDropVolts',
  'outputLowVolts',
  'comparatorOffsetVolts',
] as const satisfies readonly (keyof PartTolerances)[];
export type PointPart = (typeof pointParts)[number];

/** Volts for a part that is larger by its own nominal value; for the comparator's offset, volts a volt. */
export type Sensitivity = Record<PointPart, number>;

export interface PointSensitivities {
  trip: Sensitivity;
  release: Sensitivity;
  /** Volts per unit of wiper travel, the reference following the supply. */
  tripPerTravel: number;
  releasePerTravel: number;
  /** Of the reference node at the supply where the board trips, that supply held. */
  reference: Sensitivity;
}

/**
 * First-order sensitivities of both points at one wiper position, closed form: thresholdsAt differentiated by each part, and
 * the soft-knee node by its own parts and by the supply that feeds it. With V(Vs) the node and point = F(V(Vs), parts), the
 * whole derivative is (dF/dp + dF/dV dV/dp) / (1 - dF/dV dV/dVs). `nodes`: the reference node at trip and at release.
 */
export function pointSensitivities(
  design: BoardDesign,
  wiper: number,
  nodes: { tripReferenceVolts: number; releaseReferenceVolts: number },
): PointSensitivities {
  const trip = pointAt(design, wiper, nodes.tripReferenceVolts, 'trip');
  const release = pointAt(design, wiper, nodes.releaseReferenceVolts, 'release');
  return {
    trip: trip.sensitivity,
    release: release.sensitivity,
    tripPerTravel: trip.perTravel,
    releasePerTravel: release.perTravel,
    reference: { ...none, ...nodeSlopes(design.reference, nodes.tripReferenceVolts).byPart },
  };
}

/**
 * Of the release point once every board is trimmed to the same trip point: the wiper takes up what the parts do to the trip,
 * and moves the release with it.
 */
export function trimmedSensitivity({
  trip,
  release,
  tripPerTravel,
  releasePerTravel,
}: PointSensitivities): Sensitivity {
  const share = releasePerTravel / tripPerTravel;
  return mapped((part) => release[part] - share * trip[part]);
}

/** Variance that each part brings, volts squared: a tolerance is three standard deviations (GUM, JCGM 100:2008, 5.1.2). */
export function contributions(sensitivity: Sensitivity, tolerances: PartTolerances): Sensitivity {
  return mapped((part) => ((sensitivity[part] * tolerances[part]) / 3) ** 2);
}

export function largestPart(variances: Sensitivity): PointPart {
  return pointParts.reduce((largest, part) => (variances[part] > variances[largest] ? part : largest));
}

const mapped = (valueOf: (part: PointPart) => number) =>
  Object.fromEntries(pointParts.map((part) => [part, valueOf(part)])) as Sensitivity;
const none = mapped(() => 0);

function pointAt(design: BoardDesign, wiper: number, nodeVolts: number, point: 'trip' | 'release') {
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  const { trimmerOhms, supplyEndOhms, groundEndOhms, feedbackOhms, outputDropVolts, outputLowVolts } = design;
  const points = thresholdsAt(design, wiper, nodeVolts);
  const isTrip = point === 'trip';
  const volts = isTrip ? points.tripVolts : points.releaseVolts;
  const atInput = nodeVolts + (design.comparatorOffsetVolts ?? 0);
  const pull = isTrip ? toSupply + feedback : toSupply;

  const byReference = (toSupply + toGround + feedback) / pull;
  const bySupplySide = (atInput - volts) / pull;
  const byGroundSide = atInput / pull;
  const byFeedback = (atInput + (isTrip ? outputDropVolts - volts : -outputLowVolts)) / pull;
  const node = nodeSlopes(design.reference, nodeVolts);
  const whole = 1 - byReference * node.bySupply;
  const byNode = (slope: number) => (byReference * slope) / whole;
  // Conductance = 1 / ohms, so d/dOhms = -conductance squared.
  const side = (slope: number, conductance: number, ohms: number) => (-slope * conductance ** 2 * ohms) / whole;
  return {
    perTravel: ((bySupplySide * toSupply ** 2 - byGroundSide * toGround ** 2) * trimmerOhms) / whole,
    sensitivity: {
      referenceVolts: byNode(node.byPart.referenceVolts),
      referenceKnee: byNode(node.byPart.referenceKnee),
      feedOhms: byNode(node.byPart.feedOhms),
      trimmerOhms:
        side(bySupplySide, toSupply, (1 - wiper) * trimmerOhms) + side(byGroundSide, toGround, wiper * trimmerOhms),
      supplyEndOhms: side(bySupplySide, toSupply, supplyEndOhms),
      groundEndOhms: side(byGroundSide, toGround, groundEndOhms),
      feedbackOhms: side(byFeedback, feedback, feedbackOhms),
      outputDropVolts: isTrip ? ((feedback / pull) * outputDropVolts) / whole : 0,
      outputLowVolts: isTrip ? 0 : ((-feedback / pull) * outputLowVolts) / whole,
      comparatorOffsetVolts: byReference / whole,
    } satisfies Sensitivity,
  };
}

/** Vs = V + R I0 exp((V - V0) / n) differentiated, k = R I / n. */
function nodeSlopes(reference: BoardDesign['reference'], nodeVolts: number) {
  const { nominalVolts, kneeVolts, feedOhms } = reference;
  const steep = (feedOhms * zenerAmps(reference, nodeVolts)) / kneeVolts;
  const share = steep / (1 + steep);
  return {
    bySupply: 1 / (1 + steep),
    byPart: {
      referenceVolts: share * nominalVolts,
      referenceKnee: share * (nodeVolts - nominalVolts),
      feedOhms: -share * kneeVolts,
    },
  };
}
