import type { BoardType } from '../../contracts/board-type';
import type { BoardDesign } from '../board-design';
import { softKneeThresholds, supplyForReference } from '../soft-knee';
import { thresholdsAt } from '../thresholds';
import { wiperAt } from '../trimmer';
import { boardsOf } from './boards';
import { nodesNear } from './node-voltage';
import { quantilesOf } from './quantiles';
import type { TravelPosition, VoltsBand } from './types';

const bandEnds = [0.01, 0.99] as const;

/** Points over the trimmer's travel: the nominal board by both models, and bands that hold 98 of 100 boards. */
export function travelBands(boardType: BoardType, deviations: Float64Array, positions: number): TravelPosition[] {
  const { design, trimmer } = boardType;
  const turns = Array.from({ length: positions }, (_, i) => (trimmer.turns * i) / (positions - 1));
  const wipers = turns.map((each) => wiperAt(trimmer, each));
  const many = [...boardsOf(boardType, deviations)];
  const trips = wipers.map(() => new Float64Array(many.length));
  const releases = wipers.map(() => new Float64Array(many.length));
  many.forEach((parts, board) => {
    let nodes = { trip: 0, release: 0 };
    wipers.forEach((wiper, i) => {
      nodes = nodesNear(parts, wiper, nodes.trip || 0, nodes.release || 0);
      trips[i]![board] = supplyForReference(parts.reference, nodes.trip);
      releases[i]![board] = supplyForReference(parts.reference, nodes.release);
    });
  });
  return wipers.map((wiper, i) => ({
    turns: turns[i]!,
    wiper,
    ideal: thresholdsAt(design, wiper, design.reference.nominalVolts),
    typical: typicalAt(design, wiper),
    bands: bandsOf(trips[i]!, releases[i]!),
  }));
}

function typicalAt(design: BoardDesign, wiper: number): TravelPosition['typical'] {
  const points = softKneeThresholds(design, wiper);
  return points.kind === 'found' ? { tripVolts: points.tripVolts, releaseVolts: points.releaseVolts } : null;
}

function bandsOf(trips: Float64Array, releases: Float64Array): TravelPosition['bands'] {
  const trip = bandOf(trips);
  const release = bandOf(releases);
  const hysteresis = bandOf(releases.map((volts, board) => volts - trips[board]!));
  return trip && release && hysteresis && { trip, release, hysteresis };
}

/** Null where more than one board in 100 has no point. */
function bandOf(volts: Float64Array): VoltsBand | null {
  const [lowVolts, highVolts] = quantilesOf(volts, bandEnds);
  return Number.isFinite(lowVolts) && Number.isFinite(highVolts)
    ? { lowVolts: lowVolts!, highVolts: highVolts! }
    : null;
}
