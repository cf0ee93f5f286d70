import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { RealClock } from '@/stations/clock/real-clock';
import { openBench, type Bench } from '@/stations/instruments/open-bench';
import { drawBoard } from '@/stations/simulation/draw-board';
import { serveInstrument } from '@/stations/simulation/serve-instrument';
import { simulateBench, type SimulatedBench } from '@/stations/simulation/simulated-bench';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';
import { sampleBoardType } from '../simulation/sample-board-type';
import { layCable, type PseudoTerminal } from './pseudo-terminals';

let far: SimulatedBench;
let cables: Record<'supply' | 'meter', PseudoTerminal>;
let stops: (() => Promise<void>)[];
let bench: Bench;
const clock = new RealClock();

beforeEach(async () => {
  far = simulateBench({ clock, seed: 5, hasController: false, hasWiperProbe: false });
  far.fixture.seat(new SimulatedBoard(drawBoard(sampleBoardType, 3, 'none')));
  far.fixture.setLid(true);
  cables = { supply: await layCable('supply'), meter: await layCable('meter') };
  stops = [
    await serveInstrument(cables.supply.instrument, far.instruments.supply),
    await serveInstrument(cables.meter.instrument, far.instruments.meter),
  ];
  const link = {
    kind: 'serial' as const,
    supplyPath: cables.supply.station,
    meterPath: cables.meter.station,
    controllerPath: null,
    baudRate: 115_200 as const,
  };
  bench = await openBench({ link, hasWiperProbe: false }, clock);
});

afterEach(async () => {
  await bench.close();
  await Promise.all(stops.map((stop) => stop()));
  await Promise.all([cables.supply.pull(), cables.meter.pull()]);
});

describe('a station set to serial paths, over pseudo-terminals with the real binding', () => {
  it('identifies, energises, measures and switches off with read-back', async () => {
    expect(bench.simulation).toBeNull();
    expect(bench.controller).toBeNull();
    expect(await bench.health()).toEqual([
      { instrument: 'supply', identity: 'SILLWRIGHT,SIM-SUPPLY,100005,1.0', state: 'open', problem: null },
      { instrument: 'meter', identity: 'SILLWRIGHT,SIM-METER,100005,1.0', state: 'open', problem: null },
    ]);
    await bench.supply.prepare({ currentLimitAmps: 0.2, overvoltageVolts: 12.5 });
    await bench.meter.prepare();
    await bench.supply.setVolts(11);
    await bench.supply.switchOn();
    await clock.sleep(150);
    expect(await bench.meter.readVolts(101, 1)).toBeCloseTo(11, 1);
    expect(await bench.meter.readVolts(102, 1)).toBeGreaterThan(9);
    expect(await bench.supply.measureAmps()).toBeGreaterThan(0.008);
    expect(await bench.safeOff()).toMatchObject({ confirmed: true, by: 'meter' });
  });

  it('says link-lost when a cable is pulled during a reading, and still confirms off by the supply', async () => {
    await bench.supply.prepare({ currentLimitAmps: 0.2, overvoltageVolts: 12.5 });
    await bench.meter.prepare();
    await bench.supply.setVolts(11);
    await bench.supply.switchOn();
    const reading = bench.meter.readVolts(101, 25).catch((error: unknown) => error);
    await clock.sleep(60);
    await cables.meter.pull();
    expect(await reading).toMatchObject({ code: 'link-lost', instrument: 'meter' });
    expect(await bench.safeOff()).toMatchObject({ confirmed: true, by: 'supply' });
  });
});
