import type { BoardType } from '../../contracts/board-type';
import type { Uniform } from '../../uncertainty/draw';
import { deviationsABoard } from '../draw-parts';
import { wiperForTrip } from '../inverse';
import { turnsAt } from '../trimmer';
import { drawDeviations } from './boards';
import { limitFindings } from './limit-findings';
import { nodeAt } from './node-voltage';
import { travelBands } from './travel-bands';
import { histogramOf, trimBoards } from './trimmed-boards';
import type { BoardTypePrediction } from './types';

export interface PredictionOptions {
  /** Uniform in [0, 1); the same numbers give the same prediction. */
  random: Uniform;
  /** What the trim aims at; the middle of the trip limits where none is given. Volts. */
  targetVolts?: number;
  boards?: number;
  /** Positions of the screw over its travel. */
  positions?: number;
}

/** The bands need fewer boards than the shares: at 4,000 the 1st percentile is known to about a twentieth of the spread. */
const mostBandBoards = 4000;

/** What the parts of a board type make of it: points over the trimmer's travel, and what its limits cost. */
export function predictBoardType(boardType: BoardType, options: PredictionOptions): BoardTypePrediction {
  const { random, boards = 20_000, positions = 31 } = options;
  const { design, limits, trimmer } = boardType;
  const targetVolts = options.targetVolts ?? (limits.tripVolts.min + limits.tripVolts.max) / 2;
  const deviations = drawDeviations(boards, random);
  const asIs = trimBoards(boardType, targetVolts, deviations);
  const wiper = wiperForTrip(design, targetVolts, nodeAt(design.reference, targetVolts));
  const bandDeviations = deviations.subarray(0, Math.min(boards, mostBandBoards) * deviationsABoard);
  return {
    boards,
    targetVolts,
    travel: travelBands(boardType, bandDeviations, positions),
    typicalTurns: wiper >= 0 && wiper <= 1 ? turnsAt(trimmer, wiper) : null,
    misses: asIs.misses,
    cannotPass: asIs.cannotPass,
    release: histogramOf(asIs.releaseVolts),
    findings: limitFindings({ boardType, targetVolts, deviations, asIs }),
  };
}
