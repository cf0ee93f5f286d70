import type { PartTolerances } from '../contracts/board-type';
import type { BoardDesign } from './board-design';

/** Numbers that `drawParts` takes for one board. */
export const deviationsABoard = 13;

/** A part lies within its tolerance, three standard deviations: a standard normal as a fraction of the tolerance, -1 to 1. */
export function deviationOf(normal: number): number {
  return Math.max(-1, Math.min(1, normal / 3));
}

/**
 * The parts of one board: every nominal value moved by its tolerance times the next deviation, asked for in a fixed order.
 * A comparator whose tolerance is 0 has no offset and asks for none.
 */
export function drawParts(nominal: BoardDesign, tolerances: PartTolerances, deviation: () => number): BoardDesign {
  const { reference } = nominal;
  const near = (value: number, tolerance: number) => value * (1 + tolerance * deviation());
  const parts: BoardDesign = {
    reference: {
      nominalVolts: near(reference.nominalVolts, tolerances.referenceVolts),
      ratedAmps: reference.ratedAmps,
      kneeVolts: near(reference.kneeVolts, tolerances.referenceKnee),
      feedOhms: near(reference.feedOhms, tolerances.feedOhms),
    },
    trimmerOhms: near(nominal.trimmerOhms, tolerances.trimmerOhms),
    supplyEndOhms: near(nominal.supplyEndOhms, tolerances.supplyEndOhms),
    groundEndOhms: near(nominal.groundEndOhms, tolerances.groundEndOhms),
    feedbackOhms: near(nominal.feedbackOhms, tolerances.feedbackOhms),
    outputDropVolts: near(nominal.outputDropVolts, tolerances.outputDropVolts),
    outputLowVolts: near(nominal.outputLowVolts, tolerances.outputLowVolts),
    loadOhms: near(nominal.loadOhms, tolerances.loadOhms),
    quiescentAmps: near(nominal.quiescentAmps, tolerances.quiescentAmps),
    reservoirFarads: near(nominal.reservoirFarads, tolerances.reservoirFarads),
  };
  const { comparatorOffsetVolts } = tolerances;
  return comparatorOffsetVolts > 0 ? { ...parts, comparatorOffsetVolts: comparatorOffsetVolts * deviation() } : parts;
}
