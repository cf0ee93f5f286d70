import type { OutputSensing } from '../../../lib/contracts/board-type';
import type { SearchObservation } from '../../../lib/search/types';
import { VirtualClock } from '../../../stations/clock/virtual-clock';
import { openBench, type Bench } from '../../../stations/instruments/open-bench';
import { performEffect } from '../../../stations/run/perform-effect';
import { simulateBench } from '../../../stations/simulation/simulated-bench';
import { SimulatedBoard } from '../../../stations/simulation/simulated-board';
import type { Plant, SearchedBoard } from '../plant';
import { boardParts } from './board-parts';

export const settleMs = 40;
export const waypointMs = 30;

/** Load 10 mA against a board's own current of 2.5 mA. */
const sensing: OutputSensing = { kind: 'load-current', thresholdAmps: 0.005 };

/** A board whose points are given instead of following from its parts, so that any pair can be searched for. */
class BoardOfGivenPoints extends SimulatedBoard {
  constructor(
    private readonly points: SearchedBoard,
    noiseVolts: number,
  ) {
    super({ ...boardParts, noiseVolts });
  }

  override thresholds() {
    const { trip, release, stuck } = this.points;
    if (!stuck) return { tripVolts: trip, releaseVolts: release };
    const never = stuck === 'off' ? Infinity : -Infinity;
    return { tripVolts: never, releaseVolts: never };
  }
}

export interface StackOptions {
  seed: number;
  baudRate: 9600 | 115200;
  overshoot: number;
  supplyMinVolts: number;
  /** Protection of the supply: a peak above it ends the search as a fault. */
  overvoltageVolts: number;
}

/** Time a command takes, by its dwell, summed over all commands. */
export interface CommandTimes {
  settle: { count: number; ms: number };
  waypoint: { count: number; ms: number };
}

/**
 * The whole stack under a search: the station's own probe effect, instruments in SCPI over mock serial lines with their
 * bytes' time, simulated supply, meter, fixture and board, on a virtual clock.
 */
export class StackPlant implements Plant {
  readonly times: CommandTimes = { settle: { count: 0, ms: 0 }, waypoint: { count: 0, ms: 0 } };
  private volts = 0;
  private readonly signal = new AbortController().signal;

  private constructor(
    private readonly clock: VirtualClock,
    private readonly bench: Bench,
    private readonly options: StackOptions,
  ) {}

  static async open(options: StackOptions): Promise<StackPlant> {
    const { seed, baudRate, overshoot, supplyMinVolts, overvoltageVolts } = options;
    const clock = new VirtualClock();
    // The envelope of 10 ms is the study's; the first peak then comes at 10 ms times ln(1 / overshoot).
    const step = { overshoot, peakMs: 10 * Math.log(1 / overshoot) };
    const simulation = simulateBench({ clock, seed, hasController: false, hasWiperProbe: false, fixture: { step } });
    const link = { kind: 'simulated', seed, baudRate, hasController: false } as const;
    const bench = await openBench({ link, hasWiperProbe: false, simulation }, clock);
    const plant = new StackPlant(clock, bench, options);
    simulation.fixture.setLid(true);
    await plant.perform({ kind: 'prepare-supply', id: 0, currentLimitAmps: 0.1, overvoltageVolts });
    await plant.perform({ kind: 'supply-on', id: 0, volts: supplyMinVolts, settleMs: 200 });
    return plant;
  }

  /** Puts a board on the fixture with the supply at its minimum; returns the first reading. */
  async seat(board: SearchedBoard, noiseVolts: number): Promise<SearchObservation> {
    const { fixture } = this.bench.simulation!;
    await this.bench.supply.setVolts(this.options.supplyMinVolts);
    await this.clock.sleep(200);
    fixture.seat(new BoardOfGivenPoints(board, noiseVolts));
    return this.probe(this.options.supplyMinVolts, settleMs);
  }

  async apply(volts: number, dwell: 'settle' | 'waypoint'): Promise<SearchObservation> {
    const from = this.clock.now();
    const seen = await this.probe(volts, dwell === 'settle' ? settleMs : waypointMs);
    const spent = this.times[dwell];
    spent.count++;
    spent.ms += this.clock.now() - from;
    return seen;
  }

  async close(): Promise<void> {
    await this.bench.safeOff();
    await this.bench.close();
  }

  private async probe(volts: number, dwellMs: number): Promise<SearchObservation> {
    const voltsBefore = this.volts;
    const answer = await this.perform({ kind: 'probe', id: 0, volts, dwellMs, readBefore: false });
    if (answer.kind !== 'probed') throw new Error(`A probe was answered by ${answer.kind}.`);
    this.volts = answer.volts;
    return { voltsBefore, volts: answer.volts, output: answer.output };
  }

  private perform(effect: Parameters<typeof performEffect>[0]) {
    const performing = { bench: this.bench, clock: this.clock, sensing, signal: this.signal, onReading: () => {} };
    return performEffect(effect, performing);
  }
}
