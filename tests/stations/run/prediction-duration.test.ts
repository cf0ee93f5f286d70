import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { usualStation } from '@/lib/prediction/types';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { measureRun } from '../../figures/dry-run/measured-run';

/** The figure of 20 boards on the real clock, here on the virtual one; one board varies by 3 to 5 %. */
const boards = 6;

describe('predicted duration against boards drawn, through the station over bytes', () => {
  it.each(sequences)('$name: the station’s part within 5 %', async ({ boardTypeCode, sequence }) => {
    const boardType = boardTypes.find(({ code }) => code === boardTypeCode)!;
    const prediction = predictSequence(sequence, boardType, usualStation);
    let stationMs = 0;
    for (let seed = 0; seed < boards; seed++) {
      const run = await measureRun(sequence, boardType, usualStation, 500 + seed, new VirtualClock());
      expect(run.verdict).toBe('pass');
      stationMs += run.stationMs / boards;
    }
    const ratio = (prediction.totalMs - prediction.personMs) / stationMs;
    expect(Math.abs(ratio - 1), `predicted over measured: ${ratio.toFixed(3)}`).toBeLessThan(0.05);
  });
});
