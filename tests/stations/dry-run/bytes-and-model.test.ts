import { describe, expect, test } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { usualDryRun } from '@/lib/contracts/dry-run';
import { usualStation } from '@/lib/prediction/types';
import { outcomeOf, performDryBoard, type Trial } from '@/stations/dry-run/run-board';
import { runBoardInBytes } from './bytes-bench';

const boardsEach = 50;

const trials = sequences.map(({ name, boardTypeCode, sequence }): [string, Trial] => [
  name,
  {
    sequence,
    boardType: boardTypes.find(({ code }) => code === boardTypeCode)!,
    station: usualStation,
    settings: { ...usualDryRun, seed: 90_210, defectRate: 0.4 },
  },
]);

/** Where two plain values differ. Times are sums taken in another order, so numbers may differ in the last bits of a double. */
function differences(a: unknown, b: unknown, path = ''): string[] {
  if (typeof a === 'number' && typeof b === 'number') return Math.abs(a - b) <= 1e-8 * Math.max(1, a) ? [] : [path];
  if (a === null || b === null || typeof a !== 'object' || typeof b !== 'object') return Object.is(a, b) ? [] : [path];
  const keys = [...new Set([...Object.keys(a), ...Object.keys(b)])];
  return keys.flatMap((key) => differences(a[key as never], b[key as never], `${path}.${key}`));
}

describe.each(trials)('%s', (_, trial) => {
  test(`${boardsEach} boards get the same verdicts, reasons, values and times with bytes and without`, async () => {
    for (let index = 0; index < boardsEach; index++) {
      const { outcome, result } = await runBoardInBytes(trial, index);
      const performed = performDryBoard(trial, index);
      expect({ index, differences: differences(outcomeOf(performed), outcome) }).toEqual({ index, differences: [] });
      expect({ index, differences: differences(performed.result, result) }).toEqual({ index, differences: [] });
    }
  }, 240_000);
});
