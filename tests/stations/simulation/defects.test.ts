import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { defectKinds, type DefectKind } from '@/lib/contracts/bench-command';
import type { BoardType } from '@/lib/contracts/board-type';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { openBench } from '@/stations/instruments/open-bench';
import { OutputSensor } from '@/stations/instruments/output-sensor';
import { drawBoard } from '@/stations/simulation/draw-board';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';

/** A bench with one board of a defect, energised in the middle of its search range; everything below goes through bytes. */
async function benchWith(boardType: BoardType, defect: DefectKind, seed: number) {
  const clock = new VirtualClock();
  const link = { kind: 'simulated', seed: 3, baudRate: 115_200, hasController: true } as const;
  const bench = await openBench({ link, hasWiperProbe: true }, clock);
  const { fixture } = bench.simulation!;
  const sound = new SimulatedBoard(drawBoard(boardType, seed, 'none')).thresholds();
  const board = new SimulatedBoard(drawBoard(boardType, seed, defect));
  fixture.seat(board);
  fixture.setLid(true);
  const limitAmps = 2 * (boardType.absoluteMaximumVolts / boardType.design.loadOhms);
  await bench.supply.prepare({ currentLimitAmps: limitAmps, overvoltageVolts: boardType.absoluteMaximumVolts * 1.05 });
  await bench.meter.prepare();
  const sensor = new OutputSensor(boardType.sensing, bench.supply, bench.meter);
  const settle = async (volts: number) => {
    await bench.supply.setVolts(volts);
    await clock.sleep(250);
    return sensor.read();
  };
  await bench.supply.switchOn();
  const top = boardType.absoluteMaximumVolts * 0.96;
  /** First supply that changes the output, falling from the top or rising from the bottom; null when none does. */
  const walk = async (way: 'down' | 'up') => {
    const [from, to] = way === 'down' ? [top, boardType.search.supplyMinVolts] : [boardType.search.supplyMinVolts, top];
    const first = await settle(from);
    for (let i = 1; i <= 120; i++) {
      const volts = from + ((to - from) * i) / 120;
      if ((await settle(volts)) !== first) return bench.meter.readVolts(101, 1);
    }
    return null;
  };
  return { bench, clock, fixture, board, sound, settle, walk, top, limitAmps };
}

type Setup = Awaited<ReturnType<typeof benchWith>>;

const signatures: Record<DefectKind, (setup: Setup, boardType: BoardType) => Promise<void>> = {
  none: async ({ walk, sound, bench, settle, clock }, { limits }) => {
    expect(Math.abs((await walk('down'))! - sound.tripVolts)).toBeLessThan(0.15);
    expect(Math.abs((await walk('up'))! - sound.releaseVolts)).toBeLessThan(0.15);
    expect(await settle((sound.tripVolts + 3 * sound.releaseVolts) / 4)).toBe('on');
    await bench.controller!.interruptSupply(limits.rideThroughSeconds.min * 0.8);
    await clock.sleep(100);
    expect(await settle((sound.tripVolts + 3 * sound.releaseVolts) / 4)).toBe('on');
    const reference = await bench.meter.readVolts(103, 1);
    expect(reference).toBeGreaterThan(limits.referenceVolts.min);
    expect(reference).toBeLessThan(limits.referenceVolts.max);
  },
  'supply-short': async ({ bench, settle, top, limitAmps }) => {
    await settle(top);
    expect(await bench.supply.measureAmps()).toBeCloseTo(limitAmps, 3);
    expect(await bench.meter.readVolts(101, 1)).toBeLessThan(2);
  },
  'zener-open': async ({ bench, settle, walk }, boardType) => {
    await settle(10);
    expect(await bench.meter.readVolts(103, 1)).toBeCloseTo(10, 1);
    expect(await settle(boardType.absoluteMaximumVolts * 0.96)).toBe('off');
    expect(await walk('up')).toBeNull();
  },
  'zener-reversed': async ({ bench, settle, walk }) => {
    await settle(10);
    expect(await bench.meter.readVolts(103, 1)).toBeCloseTo(0.7, 1);
    expect(await walk('down')).toBeNull();
  },
  'wrong-zener': async ({ bench, settle, sound }, { limits }) => {
    await settle(sound.tripVolts);
    const volts = await bench.meter.readVolts(103, 1);
    expect(volts < limits.referenceVolts.min || volts > limits.referenceVolts.max).toBe(true);
  },
  'feedback-open': async ({ bench, clock, settle, walk, top }) => {
    await settle(top);
    const trip = (await walk('down'))!;
    await settle(trip - 0.5);
    const release = (await walk('up'))!;
    // Steps of the walk on either side of one and the same point.
    expect(release - trip).toBeLessThan(0.25);
    const states = new Set<string>();
    for (let volts = trip - 0.2; volts < trip + 0.2; volts += 0.001) {
      await bench.supply.setVolts(volts);
      await clock.sleep(20);
      states.add(`${bench.simulation!.fixture.outputOn()}`);
    }
    expect(states.size).toBe(2);
  },
  'wrong-feedback': async ({ walk }, { limits }) => {
    const trip = await walk('down');
    const release = await walk('up');
    expect(trip).not.toBeNull();
    const hysteresis = release === null ? Infinity : release - trip!;
    expect(hysteresis < limits.hysteresisVolts.min || hysteresis > limits.hysteresisVolts.max).toBe(true);
  },
  'op-amp-missing': async ({ bench, settle, walk, top }, { design }) => {
    expect(await walk('up')).toBeNull();
    await settle(top);
    expect(await bench.supply.measureAmps()).toBeLessThan(design.quiescentAmps * 0.6);
    expect(await bench.meter.readVolts(102, 1)).toBeLessThan(0.1);
  },
  'output-shorted': async ({ bench, walk, settle }, { search }) => {
    expect(await walk('down')).toBeNull();
    await settle(search.supplyMinVolts);
    expect(await bench.meter.readVolts(102, 1)).toBeGreaterThan(search.supplyMinVolts * 0.9);
  },
  'wiper-open': async (setup) => {
    const before = (await setup.walk('down'))!;
    setup.board.turnTo(setup.board.screwTurns + setup.board.truth.trimmer.turns * 0.1);
    expect(Math.abs((await setup.walk('down'))! - before)).toBeLessThan(0.1);
  },
  'trimmer-at-end': async ({ board }, boardType) => {
    const target = (boardType.limits.tripVolts.min + boardType.limits.tripVolts.max) / 2;
    const before = board.thresholds().tripVolts;
    const raising = boardType.trimmer.clockwise === 'raises' ? 1 : -1;
    const towards = Math.sign(target - before) * raising;
    const tenth = boardType.trimmer.turns / 10;
    board.turnTo(board.screwTurns + towards * tenth);
    expect(board.thresholds().tripVolts).toBe(before);
    board.turnTo(board.screwTurns - towards * tenth);
    expect(Math.abs(board.thresholds().tripVolts - before)).toBeGreaterThan(0.05);
  },
  'noisy-wiper': async ({ bench, clock, settle, top, sound }) => {
    const trips: number[] = [];
    for (let pass = 0; pass < 8; pass++) {
      expect(await settle(top)).toBe('on');
      let volts = sound.tripVolts + 0.2;
      await settle(volts + 1);
      await settle(volts);
      expect(bench.simulation!.fixture.outputOn()).toBe(true);
      while (bench.simulation!.fixture.outputOn() && volts > sound.tripVolts - 0.3) {
        volts -= 0.004;
        await bench.supply.setVolts(volts);
        await clock.sleep(60);
      }
      trips.push(volts);
    }
    expect(Math.max(...trips) - Math.min(...trips)).toBeGreaterThan(0.015);
  },
  'reservoir-missing': async ({ bench, clock, settle, top, sound }) => {
    const between = (sound.tripVolts + sound.releaseVolts) / 2;
    await settle(top);
    expect(await settle(between)).toBe('on');
    await clock.sleep(5000);
    expect(await settle(between)).toBe('on');
    await bench.controller!.interruptSupply(0.002);
    expect(await settle(between)).toBe('off');
  },
  'lifted-contact': async ({ bench, settle }) => {
    await settle(1.8);
    const [sense, board, amps] = [
      await bench.supply.measureVolts(),
      await bench.meter.readVolts(101, 1),
      await bench.supply.measureAmps(),
    ];
    expect((sense - board) / amps).toBeGreaterThan(40);
  },
};

describe.each(boardTypes.map((boardType) => [boardType.code, boardType] as const))(
  'a board of %s',
  (_code, boardType) => {
    it.each(defectKinds)('shows %s through the instruments', async (defect) => {
      for (const seed of [11, 12]) await signatures[defect](await benchWith(boardType, defect, seed), boardType);
    });
  },
);

describe('drawBoard', () => {
  it('draws the same board for the same seed and another for another', () => {
    const boardType = boardTypes[0]!;
    expect(drawBoard(boardType, 5, 'none')).toEqual(drawBoard(boardType, 5, 'none'));
    expect(drawBoard(boardType, 5, 'none').design).not.toEqual(drawBoard(boardType, 6, 'none').design);
  });

  it.each(boardTypes)(
    'draws sound $code boards that start off target and meet every limit once trimmed',
    (boardType) => {
      const { tripVolts, releaseVolts, hysteresisVolts } = boardType.limits;
      const target = (tripVolts.min + tripVolts.max) / 2;
      for (let seed = 0; seed < 20; seed++) {
        const board = new SimulatedBoard(drawBoard(boardType, seed, 'none'));
        const start = board.thresholds().tripVolts;
        expect(Math.abs(start - target)).toBeGreaterThan(0.14);
        expect(start).toBeGreaterThan(boardType.search.tripVolts.min);
        expect(start).toBeLessThan(boardType.search.tripVolts.max);
        let best = Infinity;
        let released = NaN;
        for (let i = 0; i <= 4000; i++) {
          board.turnTo((boardType.trimmer.turns * i) / 4000);
          const points = board.thresholds();
          if (Math.abs(points.tripVolts - target) >= best) continue;
          best = Math.abs(points.tripVolts - target);
          released = points.releaseVolts;
        }
        expect(best).toBeLessThan(0.005);
        expect(released).toBeGreaterThan(releaseVolts.min);
        expect(released).toBeLessThan(releaseVolts.max);
        expect(released - target).toBeGreaterThan(hysteresisVolts.min);
        expect(released - target).toBeLessThan(hysteresisVolts.max);
      }
    },
  );
});
