import { afterAll, beforeAll, expect, test } from 'vitest';
import { sequences } from '@/db/seed/sequences';
import { ScaledClock } from '@/stations/clock/scaled-clock';
import { openBench } from '@/stations/instruments/open-bench';
import { serveInstrument } from '@/stations/simulation/serve-instrument';
import { simulateBench } from '@/stations/simulation/simulated-bench';
import { layCable, type PseudoTerminal } from '../instruments/pseudo-terminals';
import { benchInTest, type BenchInTest } from './bench-in-test';

/** Somewhat faster than real time: the bytes themselves travel at the terminals' own speed. */
const clock = new ScaledClock(3);
const stops: (() => Promise<void>)[] = [];
let cables: PseudoTerminal[];
let bench: BenchInTest;

beforeAll(async () => {
  const far = simulateBench({ clock, seed: 5, hasController: false, hasWiperProbe: false });
  const [supply, meter] = [await layCable('supply'), await layCable('meter')];
  cables = [supply, meter];
  stops.push(await serveInstrument(supply.instrument, far.instruments.supply));
  stops.push(await serveInstrument(meter.instrument, far.instruments.meter));
  const link = {
    kind: 'serial' as const,
    supplyPath: supply.station,
    meterPath: meter.station,
    controllerPath: null,
    baudRate: 115_200 as const,
  };
  const opened = await openBench({ link, hasWiperProbe: false }, clock);
  const [{ sequence: whole }] = sequences as [(typeof sequences)[0]];
  const sequence = { ...whole, steps: whole.steps.filter((step) => step.kind !== 'ride-through') };
  bench = await benchInTest({
    hasController: false,
    plan: { sequence },
    made: { clock, bench: opened, fixture: far.fixture },
  });
});
afterAll(async () => {
  await bench?.station.stop();
  await Promise.all(stops.map((stop) => stop()));
  await Promise.all(cables.map((cable) => cable.pull()));
});

test(
  'a station on serial paths without a controller takes a board to a pass over pseudo-terminals',
  { timeout: 180_000 },
  async () => {
    await bench.signIn();
    bench.seat(8);
    expect(await bench.station.command({ kind: 'scan', text: 'CB1210264900004' })).toEqual({ ok: true });
    await bench.until(
      (view) => view.screen.kind === 'run' && bench.ports.runs[0]!.closed === 1 && view.run!.screen.kind === 'pass',
    );
    expect(bench.problems).toEqual([]);
    expect(bench.ports.runs[0]!.result).toMatchObject({ verdict: 'pass', supplyOff: { confirmed: true } });
  },
);
