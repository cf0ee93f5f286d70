import { cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import type { DefectKind } from '@/lib/contracts/bench-command';
import type { BenchView } from '@/lib/contracts/bench-view';
import type { RunPlan } from '@/lib/run/types';
import type { Clock } from '@/stations/clock/clock';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { openBench, type Bench } from '@/stations/instruments/open-bench';
import { Station } from '@/stations/run/station';
import { drawBoard } from '@/stations/simulation/draw-board';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';
import type { SimulatedFixture } from '@/stations/simulation/simulated-fixture';
import { FakePorts } from './fake-ports';
import { Person } from './person';

export function planFor(serial: string, runId: string, over: Partial<RunPlan> = {}): RunPlan {
  return {
    runId,
    serial,
    attempt: 1,
    boardType: cb1210,
    sequence: sequences[0]!.sequence,
    sequenceRevision: 'r1',
    commissioning: { overshoot: 0.05, settleMs: 60, waypointMs: 30, noiseVolts: 0.0005 },
    hasController: true,
    hasWiperProbe: false,
    pollMs: 40,
    fastLink: true,
    prior: null,
    meter: { gain: 2.6e-5, offsetVolts: 3.5e-4, resolutionVolts: 1e-4 },
    seed: 7,
    ...over,
  };
}

export interface BenchInTest {
  clock: Clock;
  bench: Bench;
  ports: FakePorts;
  station: Station;
  views: BenchView[];
  problems: unknown[];
  view(): BenchView;
  /** Resolves with the first view that fits, from now on. */
  until(fits: (view: BenchView) => boolean, withinMs?: number): Promise<BenchView>;
  seat(seed: number, defect?: DefectKind): void;
  signIn(): Promise<void>;
}

export interface BenchInTestOptions {
  hasController?: boolean;
  plan?: Partial<RunPlan>;
  /** Another bench than the simulated one on a virtual clock; `fixture` is where its board lies. */
  made?: { clock: Clock; bench: Bench; fixture: SimulatedFixture };
  instead?: (view: BenchView, test: BenchInTest) => boolean;
}

async function simulatedOnVirtualClock(hasController: boolean) {
  const clock = new VirtualClock();
  const bench = await openBench(
    { link: { kind: 'simulated', seed: 11, baudRate: 115_200, hasController }, hasWiperProbe: false },
    clock,
  );
  return { clock, bench, fixture: bench.simulation!.fixture };
}

/** A station with the real engine over real bytes on a virtual clock, a server in memory and an obedient operator. */
export async function benchInTest(options: BenchInTestOptions = {}): Promise<BenchInTest> {
  const { hasController = true } = options;
  const { clock, bench, fixture } = options.made ?? (await simulatedOnVirtualClock(hasController));
  const ports = new FakePorts((serial, runId) => planFor(serial, runId, { hasController, ...options.plan }));
  const views: BenchView[] = [];
  const problems: unknown[] = [];
  const watchers = new Set<(view: BenchView) => void>();
  const station: Station = new Station({
    station: {
      code: 'S1',
      name: 'Station 1',
      fixture: 'F1',
      simulated: true,
      hasController,
      hasWiperProbe: false,
      scheme: 'day',
    },
    binCode: 'SWN-R1',
    open: async () => bench,
    expected: {},
    clock,
    watchdogMs: 20_000,
    ports,
    commission: async () => {
      throw new Error('not commissioned in this test');
    },
    onView(view) {
      views.push(view);
      person.see(view);
      watchers.forEach((watch) => watch(view));
    },
    onReading() {},
    onProblem: (error) => problems.push(error),
  });
  const person = new Person(
    clock,
    fixture,
    (command) => void station.command(command),
    (view) => options.instead?.(view, test) ?? false,
  );
  const test: BenchInTest = {
    clock,
    bench,
    ports,
    station,
    views,
    problems,
    view: () => station.view(),
    until(fits, withinMs = 600_000) {
      return new Promise((resolve, reject) => {
        const cancel = clock.after(withinMs, () => {
          watchers.delete(watch);
          reject(new Error(`Not seen within ${withinMs} ms: ${JSON.stringify(station.view())}`));
        });
        const watch = (view: BenchView) => {
          if (!fits(view)) return;
          watchers.delete(watch);
          cancel();
          resolve(view);
        };
        watchers.add(watch);
        watch(station.view());
      });
    },
    seat(seed, defect = 'none') {
      fixture.seat(new SimulatedBoard(drawBoard(cb1210, seed, defect)));
    },
    async signIn() {
      await station.command({ kind: 'scan', text: 'SWB-14' });
      await station.command({ kind: 'pin', digits: '1234' });
      await station.command({ kind: 'scan', text: 'SWL-2649-A' });
      if (!hasController) await station.command({ kind: 'confirm', what: 'fixture-empty' });
    },
  };
  await station.start();
  return test;
}

export const ended = (view: BenchView) =>
  view.run !== null &&
  ['pass', 'reject', 'no-verdict'].includes(view.run.screen.kind) &&
  view.screen.kind !== 'starting';
