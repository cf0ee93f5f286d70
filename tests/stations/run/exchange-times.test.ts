import { describe, expect, it } from 'vitest';
import { cb1210, cb2420 } from '@/db/seed/board-types';
import { usualStation } from '@/lib/prediction/types';
import { TypicalBench } from '@/lib/prediction/typical-bench';
import type { Ask } from '@/lib/run/machine';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { openBench } from '@/stations/instruments/open-bench';
import { performEffect, type Effect } from '@/stations/run/perform-effect';
import { drawBoard } from '@/stations/simulation/draw-board';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';

/** In an order in which a run could ask for them; relays and integration are remembered from one to the next. */
const asks: Ask[] = [
  { kind: 'read-fixture' },
  { kind: 'prepare-supply', currentLimitAmps: 0.3, overvoltageVolts: 15 },
  { kind: 'supply-on', volts: 13.5, settleMs: 250 },
  { kind: 'probe', volts: 12.5, dwellMs: 40, readBefore: false },
  { kind: 'probe', volts: 12.25, dwellMs: 30, readBefore: true },
  { kind: 'sense' },
  { kind: 'measure', channel: 103, integrationCycles: 1 },
  { kind: 'measure-supply' },
  { kind: 'measure-wiper' },
  { kind: 'pulse', seconds: 0.01 },
  { kind: 'wait', milliseconds: 120 },
  { kind: 'supply-off' },
];

describe.each([
  { boardType: cb1210, baudRate: 115_200 },
  { boardType: cb1210, baudRate: 9_600 },
  { boardType: cb2420, baudRate: 115_200 },
] as const)('predicted times of what a station does, $boardType.code at $baudRate baud', ({ boardType, baudRate }) => {
  it('are those of the station with bytes, within 2 %', async () => {
    const clock = new VirtualClock();
    const link = { kind: 'simulated', seed: 3, baudRate, hasController: true } as const;
    const bench = await openBench({ link, hasWiperProbe: true }, clock);
    await bench.health();
    const { fixture } = bench.simulation!;
    fixture.seat(new SimulatedBoard(drawBoard(boardType, 1, 'none')));
    fixture.setLid(true);
    const typical = new TypicalBench(
      boardType,
      { ...usualStation, baudRate },
      {
        supplyOn: false,
        setVolts: 0,
        output: 'off',
        screwTurns: boardType.trimmer.turns / 2,
        relays: { channel: null, cycles: null },
        lidClosed: true,
      },
    );
    const performing = {
      bench,
      clock,
      sensing: boardType.sensing,
      signal: new AbortController().signal,
      onReading: () => undefined,
    };
    for (const ask of asks) {
      const fromMs = clock.now();
      await performEffect({ ...ask, id: 1 } as Effect, performing);
      const measuredMs = clock.now() - fromMs;
      const before = typical.nowMs;
      typical.perform(ask);
      const predictedMs = typical.nowMs - before;
      expect(Math.abs(predictedMs - measuredMs), `${ask.kind}: ${predictedMs} for ${measuredMs} ms`).toBeLessThan(
        0.02 * measuredMs + 0.5,
      );
    }
    await bench.close();
  });
});
