import type { BoardDesign } from '@/lib/circuit/board-design';
import { deviationOf, drawParts } from '@/lib/circuit/draw-parts';
import { inferSoftKneeBoard, wiperForTrip } from '@/lib/circuit/inverse';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import type { Thresholds } from '@/lib/circuit/thresholds';
import { turnsAt, wiperAt } from '@/lib/circuit/trimmer';
import { tolerancesOf, type BoardType } from '@/lib/contracts/board-type';
import type { DefectKind } from '@/lib/contracts/bench-command';
import type { BoardTruth } from './board-truth';
import { fitDefect } from './fit-defect';
import { seededRandom, type Random } from './random';

export interface DrawOptions {
  /** What the trim aims at; the middle of the trip limits where none is given. */
  targetVolts?: number;
  /** The board's own comparator noise; the board type's where none is given. */
  noiseVolts?: number;
  /** False: as parts come, with boards among them that no screw brings inside the limits. */
  inspected?: boolean;
}

const mostDraws = 400;
/** How far off its target a board comes, least and most. */
const offTarget = { leastVolts: 0.15, mostVolts: 0.9 };
/** Part of a limits band kept free at either end by a sound board. */
const clearance = 0.15;

/**
 * Draws a board of a type: parts within their tolerances, a screw off target. Parts that could not be trimmed to meet the
 * limits are drawn again, as incoming inspection would sort them out; then the defect is fitted. Same seed, same board.
 */
export function drawBoard(
  boardType: BoardType,
  seed: number,
  defect: DefectKind,
  options: DrawOptions = {},
): BoardTruth {
  const random = seededRandom(seed);
  const { tripVolts } = boardType.limits;
  const targetVolts = options.targetVolts ?? (tripVolts.min + tripVolts.max) / 2;
  const { inspected = true } = options;
  for (let draw = 0; draw < mostDraws; draw++) {
    const design = drawParts(boardType.design, tolerancesOf(boardType), () => deviationOf(random.normal()));
    const targetWiper = wiperForTarget(design, targetVolts);
    if (inspected && (targetWiper === null || !meetsLimits(boardType, design, targetWiper))) continue;
    const drawn = drawScrew(boardType, design, targetVolts, random);
    if (inspected && drawn === null) continue;
    const screwTurns = drawn ?? boardType.trimmer.turns * random.uniform();
    const truth: BoardTruth = {
      ...sound,
      design,
      trimmer: { ...boardType.trimmer, backlashTurns: boardType.trimmer.backlashTurns * random.between(0.5, 1) },
      screwTurns,
      stops: { minTurns: 0, maxTurns: boardType.trimmer.turns },
      noiseVolts: options.noiseVolts ?? boardType.search.noiseVolts,
    };
    return fitDefect(truth, defect, { targetTurns: turnsAt(boardType.trimmer, targetWiper ?? 0.5), random });
  }
  throw new RangeError(`No parts of board type ${boardType.code} reach ${targetVolts} V within its limits.`);
}

/** A board of known points, as kept for daily checks: nominal parts, with the wiper and feedback that give the points. */
export function makeReferenceBoard(boardType: BoardType, points: Thresholds, noiseVolts?: number): BoardTruth {
  const parts = inferSoftKneeBoard(boardType.design, points);
  if (parts.kind !== 'found') throw new RangeError(`No board of type ${boardType.code} has these points.`);
  return {
    ...sound,
    design: { ...boardType.design, feedbackOhms: parts.feedbackOhms },
    trimmer: boardType.trimmer,
    screwTurns: turnsAt(boardType.trimmer, parts.wiper),
    stops: { minTurns: 0, maxTurns: boardType.trimmer.turns },
    noiseVolts: noiseVolts ?? boardType.search.noiseVolts,
  };
}

const sound = {
  wiperJumpVolts: 0,
  wiperFollows: true,
  output: 'works',
  zener: 'works',
  shortOhms: null,
  padOhms: 0,
  defect: 'none',
} as const;

function wiperForTarget(design: BoardDesign, targetVolts: number): number | null {
  const reference = referenceAt(design.reference, targetVolts);
  if (reference.kind !== 'found') return null;
  const wiper = wiperForTrip(design, targetVolts, reference.x);
  return wiper > 0.04 && wiper < 0.96 ? wiper : null;
}

function meetsLimits({ limits }: BoardType, design: BoardDesign, wiper: number): boolean {
  const points = softKneeThresholds(design, wiper);
  if (points.kind !== 'found') return false;
  const inside = (value: number, { min, max }: { min: number; max: number }) => {
    const free = (max - min) * clearance;
    return value >= min + free && value <= max - free;
  };
  return (
    inside(points.releaseVolts, limits.releaseVolts) &&
    inside(points.releaseVolts - points.tripVolts, limits.hysteresisVolts) &&
    inside(points.tripReferenceVolts, limits.referenceVolts) &&
    design.outputDropVolts < limits.outputHighDropVolts.max &&
    design.outputLowVolts < limits.outputLowVolts.max &&
    design.quiescentAmps < limits.quiescentAmps.max
  );
}

/** A screw position whose points lie off target, inside what the search may reach. */
function drawScrew(boardType: BoardType, design: BoardDesign, targetVolts: number, random: Random): number | null {
  const { trimmer, search, absoluteMaximumVolts } = boardType;
  for (let draw = 0; draw < 20; draw++) {
    const sign = random.uniform() < 0.5 ? -1 : 1;
    const startVolts = targetVolts + sign * random.between(offTarget.leastVolts, offTarget.mostVolts);
    const wiper = wiperForTarget(design, startVolts);
    if (wiper === null) continue;
    const turns = turnsAt(trimmer, wiper);
    const points = softKneeThresholds(design, wiperAt(trimmer, turns));
    if (points.kind !== 'found') continue;
    const { tripVolts, releaseVolts } = points;
    const within = tripVolts > search.tripVolts.min && tripVolts < search.tripVolts.max;
    if (within && releaseVolts < absoluteMaximumVolts * 0.97) return turns;
  }
  return null;
}
