import { beforeEach, describe, expect, it } from 'vitest';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { openBench, type Bench } from '@/stations/instruments/open-bench';
import { OutputSensor } from '@/stations/instruments/output-sensor';
import { safeOff } from '@/stations/instruments/safe-off';
import { ScpiMultimeter } from '@/stations/instruments/scpi-multimeter';
import { SerialLink } from '@/stations/link/serial-link';
import { defaultCommandSet, knownCommandSets } from '@/stations/scpi/command-set';
import { ScpiSession } from '@/stations/scpi/scpi-session';
import { scpiSync } from '@/stations/scpi/scpi-sync';
import { drawBoard } from '@/stations/simulation/draw-board';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';
import { sampleBoardType } from '../simulation/sample-board-type';

const link = { kind: 'simulated', seed: 11, baudRate: 115_200, hasController: true } as const;
const limits = { currentLimitAmps: 0.2, overvoltageVolts: 12.5 };

let clock: VirtualClock;
let bench: Bench;
let board: SimulatedBoard;

async function energise(volts: number): Promise<void> {
  await bench.supply.setVolts(volts);
  await bench.supply.switchOn();
  await clock.sleep(150);
}

beforeEach(async () => {
  clock = new VirtualClock();
  bench = await openBench({ link, hasWiperProbe: true }, clock);
  board = new SimulatedBoard(drawBoard(sampleBoardType, 3, 'none'));
  bench.simulation!.fixture.seat(board);
  bench.simulation!.fixture.setLid(true);
  await bench.supply.prepare(limits);
  await bench.meter.prepare();
});

describe('a simulated bench', () => {
  it('reads every channel of the board within the instruments’ errors', async () => {
    await energise(11);
    const volts = await bench.meter.readVolts(101, 1);
    expect(Math.abs(volts - 11)).toBeLessThan(0.006);
    expect(await bench.meter.readVolts(102, 1)).toBeCloseTo(volts - board.truth.design.outputDropVolts, 3);
    expect(await bench.meter.readVolts(103, 1)).toBeCloseTo(board.referenceVolts(volts), 3);
    expect(await bench.meter.readVolts(104, 1)).toBeCloseTo(board.wiperVolts(volts, true), 3);
    expect(await bench.supply.measureVolts()).toBeCloseTo(volts, 2);
    expect(await bench.supply.measureAmps()).toBeCloseTo(board.amps(volts, true), 4);
  });

  it('falls in noise with the integration time', async () => {
    await energise(11);
    await clock.sleep(500);
    const spread = async (cycles: number) => {
      const readings: number[] = [];
      for (let i = 0; i < 60; i++) readings.push(await bench.meter.readVolts(101, cycles));
      const mean = readings.reduce((sum, v) => sum + v, 0) / readings.length;
      return Math.sqrt(readings.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (readings.length - 1));
    };
    const [short, usual, long] = [await spread(0.1), await spread(1), await spread(25)];
    expect(short).toBeGreaterThan(usual * 8);
    expect(usual).toBeGreaterThan(long * 2.5);
  });

  it('shows the last channel to a meter that does not wait for the relay', async () => {
    await energise(11);
    await clock.sleep(500);
    const { path, binding } = bench.simulation!.ports.meter;
    await bench.close();
    const serial = new SerialLink({
      instrument: 'meter',
      path,
      binding,
      baudRate: 115_200,
      clock,
      sync: scpiSync,
      terminator: '\n',
    });
    await serial.open();
    const commands = knownCommandSets.meter[defaultCommandSet]!;
    const read = async (relaySettleMs: number) => {
      const meter = new ScpiMultimeter(new ScpiSession(serial, commands), { ...commands, relaySettleMs }, clock);
      await meter.readVolts(101, 0.1);
      return meter.readVolts(103, 0.1);
    };
    expect(Math.abs((await read(commands.relaySettleMs)) - board.referenceVolts(11))).toBeLessThan(0.005);
    expect(Math.abs((await read(0)) - board.referenceVolts(11))).toBeGreaterThan(0.02);
  });

  it('keeps readings of two channels apart when they are asked for at once', async () => {
    await energise(11);
    const [first, second, third] = await Promise.all([
      bench.meter.readVolts(101, 1),
      bench.meter.readVolts(103, 1),
      bench.meter.readVolts(101, 0.2),
    ]);
    expect(first).toBeCloseTo(11, 1);
    expect(second).toBeCloseTo(board.referenceVolts(11), 2);
    expect(third).toBeCloseTo(11, 1);
  });

  it('overshoots on every step by a few per cent, which a later reading no longer shows', async () => {
    await energise(9.9);
    await bench.supply.setVolts(10.9);
    const { fixture } = bench.simulation!;
    let peak = 0;
    for (let i = 0; i < 60; i++) {
      await clock.sleep(1);
      peak = Math.max(peak, fixture.senseVolts());
    }
    expect(peak - 10.9).toBeGreaterThan(0.045);
    expect(peak - 10.9).toBeLessThan(0.055);
    await clock.sleep(100);
    expect(Math.abs((await bench.meter.readVolts(101, 1)) - 10.9)).toBeLessThan(0.006);
  });

  it('tells the output’s state from channel 102 and from the load current alike', async () => {
    const byVolts = new OutputSensor({ kind: 'output-voltage', thresholdVolts: 3 }, bench.supply, bench.meter);
    const byAmps = new OutputSensor({ kind: 'load-current', thresholdAmps: 0.006 }, bench.supply, bench.meter);
    const { tripVolts, releaseVolts } = board.thresholds();
    for (const [volts, state] of [
      [releaseVolts + 0.3, 'on'],
      [(tripVolts + releaseVolts) / 2 + 0.05, 'on'],
      [tripVolts - 0.1, 'off'],
      [(tripVolts + releaseVolts) / 2 - 0.05, 'off'],
    ] as const) {
      await energise(volts);
      expect([await byVolts.read(), await byAmps.read()]).toEqual([state, state]);
    }
  });

  it('limits the current into a short and trips its overvoltage protection', async () => {
    bench.simulation!.fixture.seat(new SimulatedBoard(drawBoard(sampleBoardType, 3, 'supply-short')));
    await energise(11);
    expect(await bench.supply.measureAmps()).toBeCloseTo(limits.currentLimitAmps, 3);
    expect(await bench.supply.measureVolts()).toBeLessThan(1);
    bench.simulation!.fixture.seat(board);
    await clock.sleep(50);
    await bench.supply.setVolts(12.6);
    await clock.sleep(50);
    expect(await bench.supply.overvoltageTripped()).toBe(true);
    expect((await bench.safeOff()).confirmed).toBe(true);
    await expect(bench.supply.switchOn()).rejects.toMatchObject({ queued: [{ code: -221 }] });
    await bench.supply.clearOvervoltage();
    expect(await bench.supply.overvoltageTripped()).toBe(false);
  });

  it('cuts the supply in hardware when the lid opens, and reports lid and board', async () => {
    await energise(11);
    expect([await bench.controller!.lidClosed(), await bench.controller!.boardPresent()]).toEqual([true, true]);
    bench.simulation!.fixture.setLid(false);
    await clock.sleep(100);
    expect(await bench.supply.measureVolts()).toBeLessThan(0.1);
    expect(await bench.controller!.lidClosed()).toBe(false);
    await expect(bench.supply.switchOn()).rejects.toMatchObject({ code: 'instrument-error' });
  });

  it('interrupts the supply for the width it reports', async () => {
    await energise(11);
    const before = clock.now();
    const seconds = await bench.controller!.interruptSupply(0.02);
    expect(seconds).toBeGreaterThan(0.0199);
    expect(seconds).toBeLessThan(0.0201);
    expect(clock.now() - before).toBeGreaterThan(20);
  });

  it('refuses a value that is no programming value with the instrument’s own code', async () => {
    await expect(bench.supply.setVolts(99)).rejects.toMatchObject({ queued: [{ code: -222 }] });
  });
});

describe('openBench', () => {
  it('comes up with a cable pulled, says which, and finds the instrument once asked to reopen', async () => {
    const { simulation } = bench;
    await bench.close();
    simulation!.ports.meter.setPlugged(false);
    bench = await openBench({ link, hasWiperProbe: true, simulation: simulation! }, clock);
    const health = await bench.health();
    expect(health.map(({ instrument, identity }) => [instrument, identity !== null])).toEqual([
      ['supply', true],
      ['meter', false],
      ['controller', true],
    ]);
    expect(health[1]).toMatchObject({ state: 'lost', problem: expect.stringMatching(/meter is no longer connected/) });
    simulation!.ports.meter.setPlugged(true);
    await bench.reopen();
    expect((await bench.health())[1]).toMatchObject({ state: 'open', problem: null });
  });

  it('tells when a link is lost and when it is back', async () => {
    const seen: string[] = [];
    bench.watchLinks((instrument, state) => seen.push(`${instrument} ${state}`));
    bench.simulation!.ports.supply.setPlugged(false);
    await clock.sleep(300);
    bench.simulation!.ports.supply.setPlugged(true);
    await clock.sleep(2000);
    expect(seen).toEqual(['supply reopening', 'supply open']);
  });

  it('refuses a command set that is not known', async () => {
    await expect(
      openBench({ link, hasWiperProbe: false, commandSets: { supply: 'unheard-of' } }, clock),
    ).rejects.toThrow(/unheard-of/);
  });

  it('gives the same readings at the same times for the same seed', async () => {
    const history = async () => {
      clock = new VirtualClock();
      bench = await openBench({ link, hasWiperProbe: true }, clock);
      bench.simulation!.fixture.seat(new SimulatedBoard(drawBoard(sampleBoardType, 3, 'noisy-wiper')));
      bench.simulation!.fixture.setLid(true);
      await bench.supply.prepare(limits);
      await bench.meter.prepare();
      await energise(11);
      const seen: number[] = [];
      for (let i = 0; i < 40; i++) {
        await bench.supply.setVolts(8.1 + (i % 7) * 0.2);
        seen.push(await bench.meter.readVolts(101, 1), await bench.supply.measureAmps(), clock.now());
      }
      return seen;
    };
    expect(await history()).toEqual(await history());
  });
});

describe('safeOff', () => {
  it('confirms by the meter below 2 V', async () => {
    await energise(11);
    const report = await bench.safeOff();
    expect(report).toMatchObject({ confirmed: true, by: 'meter' });
    expect(report.confirmed && report.volts).toBeLessThan(2);
  });

  it('confirms by the supply when the meter is gone', async () => {
    await energise(11);
    bench.simulation!.ports.meter.setPlugged(false);
    expect(await bench.safeOff()).toMatchObject({ confirmed: true, by: 'supply' });
  });

  it('does not confirm while the supply cannot be reached and stays on, nor throws', async () => {
    await energise(11);
    bench.simulation!.ports.supply.setPlugged(false);
    const before = clock.now();
    expect(await bench.safeOff()).toEqual({ confirmed: false });
    expect(clock.now() - before).toBeLessThan(8000);
  });

  it('does not believe a meter that touches nothing while the supply still stands', async () => {
    bench.simulation!.fixture.seat(null);
    await energise(11);
    const deaf = {
      ...bench,
      supply: { switchOff: async () => undefined, measureVolts: () => bench.supply.measureVolts() },
    };
    expect(await bench.meter.readVolts(101, 1)).toBeLessThan(2);
    expect(await safeOff(deaf, clock)).toEqual({ confirmed: false });
  });

  it('switches off even when the last answers of the supply were garbage', async () => {
    await energise(11);
    bench.simulation!.instruments.supply.spoil({ kind: 'garbled', count: 5 });
    await bench.supply.measureVolts().catch(() => undefined);
    expect((await bench.safeOff()).confirmed).toBe(true);
    expect(bench.simulation!.fixture.isOn).toBe(false);
  });
});
