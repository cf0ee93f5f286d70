/** One reading of a crossed gauge study; the order of a cell's readings is the order of its trials. */
export interface GaugeReading {
  board: string;
  operator: string;
  value: number;
}

/** `values[board][operator][trial]`, boards and operators in the order of their first reading. */
export interface StudyCells {
  kind: 'found';
  boards: string[];
  operators: string[];
  trials: number;
  values: number[][][];
}

export type CellsFailure =
  /** A crossed study needs at least two boards, two operators and two trials. */
  | { kind: 'tooFew' }
  /** This operator has `readings` of this board where the others have `wanted`. */
  | { kind: 'unbalanced'; board: string; operator: string; readings: number; wanted: number }
  /** Every operator read every board the same each time: the resolution hides the repeatability. */
  | { kind: 'noSpread' };

/** Sorts readings into cells and refuses what a crossed study cannot be computed from. */
export function studyCells(readings: readonly GaugeReading[]): StudyCells | CellsFailure {
  const boards = [...new Set(readings.map(({ board }) => board))];
  const operators = [...new Set(readings.map(({ operator }) => operator))];
  const values = boards.map((board) =>
    operators.map((operator) =>
      readings.filter((r) => r.board === board && r.operator === operator).map(({ value }) => value),
    ),
  );
  const trials = Math.max(0, ...values.flat().map((cell) => cell.length));
  if (boards.length < 2 || operators.length < 2 || trials < 2) return { kind: 'tooFew' };
  for (const [i, board] of boards.entries()) {
    for (const [j, operator] of operators.entries()) {
      const { length } = values[i]![j]!;
      if (length !== trials) return { kind: 'unbalanced', board, operator, readings: length, wanted: trials };
    }
  }
  if (values.flat().every((cell) => cell.every((value) => value === cell[0]))) return { kind: 'noSpread' };
  return { kind: 'found', boards, operators, trials, values };
}
