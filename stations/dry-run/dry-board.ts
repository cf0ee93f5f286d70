import { defectKinds, type DefectKind } from '@/lib/contracts/bench-command';
import type { BoardType } from '@/lib/contracts/board-type';
import type { DryRunSettings } from '@/lib/contracts/dry-run';
import { drawBoard } from '../simulation/draw-board';
import type { BoardTruth } from '../simulation/board-truth';
import { seededRandom, seedOf } from '../simulation/random';

const defects = defectKinds.filter((kind) => kind !== 'none');

/** Seeds of one board: what it is, what the bench does while it is tested, what the person does. */
export interface BoardSeeds {
  board: number;
  bench: number;
  hand: number;
}

export function seedsOf(seed: number, index: number): BoardSeeds {
  const of = (what: string) => seedOf(`${seed}:${index}:${what}`);
  return { board: of('board'), bench: of('bench'), hand: of('hand') };
}

/** Board `index` of a dry run, the same whichever sequence tests it: parts as they come, a defect at the rate asked for. */
export function dryBoard(
  boardType: BoardType,
  { seed, defectRate }: Pick<DryRunSettings, 'seed' | 'defectRate'>,
  index: number,
): BoardTruth {
  const { board } = seedsOf(seed, index);
  const random = seededRandom(seedOf(`${board}:defect`));
  const defect: DefectKind = random.uniform() < defectRate ? random.pick(defects) : 'none';
  return drawBoard(boardType, board, defect, { inspected: false });
}
