import { tolerancesOf, type BoardType } from '../../contracts/board-type';
import { drawNormal, type Uniform } from '../../uncertainty/draw';
import type { BoardDesign } from '../board-design';
import { deviationOf, deviationsABoard, drawParts } from '../draw-parts';

/** How far the parts of many boards lie off, without their values: the same boards of a type before and after a change. */
export function drawDeviations(boards: number, uniform: Uniform): Float64Array {
  return Float64Array.from({ length: boards * deviationsABoard }, () => deviationOf(drawNormal(uniform)));
}

/** Parts of the first `boards` of them. */
export function* boardsOf(
  boardType: Pick<BoardType, 'design' | 'tolerances'>,
  deviations: Float64Array,
  boards = deviations.length / deviationsABoard,
): Generator<BoardDesign> {
  const tolerances = tolerancesOf(boardType);
  for (let board = 0; board < boards; board++) {
    let next = board * deviationsABoard;
    yield drawParts(boardType.design, tolerances, () => deviations[next++]!);
  }
}
