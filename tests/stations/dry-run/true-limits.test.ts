import { describe, expect, test } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { wiperForTrip } from '@/lib/circuit/inverse';
import { referenceAt } from '@/lib/circuit/soft-knee';
import { turnsAt } from '@/lib/circuit/trimmer';
import { defectKinds, type DefectKind } from '@/lib/contracts/bench-command';
import { couldBeGood, isTrulyGood } from '@/stations/dry-run/true-limits';
import { drawBoard } from '@/stations/simulation/draw-board';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';

const boardType = boardTypes[0]!;
const { sequence } = sequences[0]!;
const targetVolts = 10.8;

const judge = (board: SimulatedBoard) => isTrulyGood(board, boardType, sequence);
const could = (seed: number, defect: DefectKind) =>
  couldBeGood(drawBoard(boardType, seed, defect), boardType, sequence);

describe('the simulated truth', () => {
  test('an inspected board is bad as it comes, could be good, and is good once its screw stands on target', () => {
    for (let seed = 1; seed <= 30; seed++) {
      const truth = drawBoard(boardType, seed, 'none');
      const node = referenceAt(truth.design.reference, targetVolts);
      if (node.kind !== 'found') throw new Error('no reference');
      const screwTurns = turnsAt(truth.trimmer, wiperForTrip(truth.design, targetVolts, node.x));
      expect([seed, judge(new SimulatedBoard(truth)), could(seed, 'none')]).toEqual([seed, false, true]);
      expect([seed, judge(new SimulatedBoard({ ...truth, screwTurns }))]).toEqual([seed, true]);
    }
  });

  test.each(defectKinds.filter((kind) => kind !== 'none' && kind !== 'lifted-contact'))(
    'no place of the screw makes a board with %s good',
    (defect) => {
      for (let seed = 1; seed <= 10; seed++) expect([seed, could(seed, defect)]).toEqual([seed, false]);
    },
  );

  test('a nail that does not reach is no fault of the board', () => {
    expect(could(1, 'lifted-contact')).toBe(true);
  });
});
