import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { wiperAt } from '@/lib/circuit/trimmer';
import { softKneeThresholds } from '@/lib/circuit/soft-knee';
import type { BoardType } from '@/lib/contracts/board-type';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { commissionBench } from '@/stations/commissioning/commission-bench';
import { openBench } from '@/stations/instruments/open-bench';
import { makeReferenceBoard } from '@/stations/simulation/draw-board';
import { simulateBench } from '@/stations/simulation/simulated-bench';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';
import type { BoardTruth } from '@/stations/simulation/board-truth';

function knownPoints({ design, trimmer }: BoardType) {
  const points = softKneeThresholds(design, wiperAt(trimmer, trimmer.turns / 2));
  if (points.kind !== 'found') throw new Error(points.kind);
  return { tripVolts: points.tripVolts, releaseVolts: points.releaseVolts };
}

async function commission(
  boardType: BoardType,
  options: {
    overshoot?: number;
    peakMs?: number;
    noiseVolts?: number;
    baudRate?: 9600 | 115200;
    board?: Partial<BoardTruth>;
    shiftVolts?: number;
    signal?: AbortSignal;
    stop?: (clock: VirtualClock) => void;
  } = {},
) {
  const clock = new VirtualClock();
  const seed = 21;
  const simulation = simulateBench({
    clock,
    seed,
    hasController: true,
    hasWiperProbe: false,
    fixture: { step: { overshoot: options.overshoot ?? 0.05, peakMs: options.peakMs ?? 30 } },
  });
  const link = { kind: 'simulated', seed, baudRate: options.baudRate ?? 115_200, hasController: true } as const;
  const bench = await openBench({ link, hasWiperProbe: false, simulation }, clock);
  const points = knownPoints(boardType);
  const truth = makeReferenceBoard(boardType, points, options.noiseVolts);
  simulation.fixture.seat(new SimulatedBoard({ ...truth, ...options.board }));
  simulation.fixture.setLid(true);
  options.stop?.(clock);
  const steps: string[] = [];
  const shift = options.shiftVolts ?? 0;
  const check = {
    tripVolts: points.tripVolts + shift,
    releaseVolts: points.releaseVolts + shift,
    toleranceVolts: 0.01,
  };
  const values = await commissionBench(
    {
      bench,
      boardType,
      check,
      signal: options.signal ?? new AbortController().signal,
      onProgress: (step) => void (steps.at(-1) === step || steps.push(step)),
    },
    clock,
  );
  return { values, steps, seconds: clock.now() / 1000, simulation };
}

const cb1210 = boardTypes[0]!;

describe('commissionBench', () => {
  it.each(boardTypes.map((boardType) => [boardType.code, boardType] as const))(
    'measures a 5 % supply with a reference board of type %s, step by step',
    async (_code, boardType) => {
      const { values, steps, seconds } = await commission(boardType);
      expect(steps).toEqual(['points', 'settling', 'noise', 'overshoot']);
      expect(values.overshoot).toBeGreaterThan(0.047);
      expect(values.overshoot).toBeLessThan(0.056);
      expect(values.settleMs).toBeGreaterThanOrEqual(40);
      expect(values.settleMs).toBeLessThanOrEqual(60);
      expect(values.waypointMs).toBeGreaterThanOrEqual(20);
      expect(values.waypointMs).toBeLessThanOrEqual(35);
      expect(values.noiseVolts).toBeGreaterThan(0.0006);
      expect(values.noiseVolts).toBeLessThan(0.0018);
      expect(seconds).toBeLessThan(300);
    },
  );

  it.each([0.02, 0.035, 0.065, 0.08, 0.11])('finds an overshoot of %f', async (overshoot) => {
    const { values } = await commission(cb1210, { overshoot });
    expect(Math.abs(values.overshoot - overshoot)).toBeLessThan(0.005);
  });

  it('finds a slower supply slower to settle', async () => {
    const { values } = await commission(cb1210, { peakMs: 60 });
    expect(values.settleMs).toBeGreaterThan(75);
    expect(values.waypointMs).toBeGreaterThan(45);
  });

  it('works over a slow link', async () => {
    const { values } = await commission(cb1210, { baudRate: 9600 });
    expect(Math.abs(values.overshoot - 0.05)).toBeLessThan(0.005);
  });

  it.each([0.0015, 0.003])('finds a noise of %f V', async (noiseVolts) => {
    const { values } = await commission(cb1210, { noiseVolts });
    expect(values.noiseVolts / noiseVolts).toBeGreaterThan(0.5);
    expect(values.noiseVolts / noiseVolts).toBeLessThan(2);
  });

  it.each([
    ['an overshoot beyond what can be measured', 'C-334', { overshoot: 0.2 }],
    ['a reference board that does not have its points', 'C-332', { shiftVolts: 0.03 }],
    ['a board that never switches on', 'C-331', { board: { output: 'dead' } }],
    ['a supply that never settles', 'C-333', { peakMs: 400 }],
    ['a board that jumps', /^C-33[25]$/, { board: { wiperJumpVolts: 0.02 } }],
    ['a board with quite lower points than recorded', 'C-332', { shiftVolts: 0.4 }],
  ] as const)('refuses %s with %s', async (_what, code, options) => {
    await expect(commission(cb1210, options)).rejects.toMatchObject({
      fault: { code: expect.stringMatching(code), reason: 'interrupted' },
    });
  });

  it('ends with the reason when aborted', async () => {
    const abort = new AbortController();
    const stop = (clock: VirtualClock) => void clock.after(5000, () => abort.abort(new Error('stopped')));
    await expect(commission(cb1210, { signal: abort.signal, stop })).rejects.toThrow('stopped');
  });
});
