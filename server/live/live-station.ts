import type { Database } from '@/db/client';
import type { BenchRow } from '@/db/queries/station-benches';
import type { BenchReading, BenchView } from '@/lib/contracts/bench-view';
import type { CommandReply, HandsCommand, HandsView } from '@/lib/contracts/bench-command';
import { linkHasController } from '@/lib/contracts/station-link';
import type { Clock } from '@/stations/clock/clock';
import { RealClock } from '@/stations/clock/real-clock';
import { ScaledClock } from '@/stations/clock/scaled-clock';
import { commissionBench } from '@/stations/commissioning/commission-bench';
import { openBench, type Bench } from '@/stations/instruments/open-bench';
import { Station } from '@/stations/run/station';
import { SimulatedHands } from '@/stations/simulation/simulated-hands';
import type { RunRecorder } from '../journal/run-recorder';
import { boardBox } from './board-box';
import { Leadership } from './leadership';
import { stationPorts } from './station-ports';

export interface LiveStationContext {
  db: Database;
  recorder: RunRecorder;
  /** How much faster than real time a simulated station runs; a real one runs at 1. */
  clockRate: number;
  onView(view: BenchView): void;
  onReading(reading: BenchReading): void;
  onHands(view: HandsView): void;
  log: { warn(details: object, message: string): void };
}

/** The watchdog waits this long in real time beyond what an effect takes. */
const watchdogMs = 10_000;

/** A station as the server runs it: its instruments, its screens' leadership and, where it is simulated, its hands. */
export class LiveStation {
  readonly station: Station;
  readonly leadership: Leadership;
  hands: SimulatedHands | null = null;
  private readonly clock: Clock;
  private boxKey = '';

  constructor(
    readonly row: BenchRow,
    private readonly context: LiveStationContext,
  ) {
    const { link } = row;
    const simulated = link.kind === 'simulated';
    const rate = simulated ? context.clockRate : 1;
    this.clock = rate === 1 ? new RealClock() : new ScaledClock(rate);
    this.leadership = new Leadership(() => this.station.benchLost());
    this.station = new Station({
      station: {
        code: row.code,
        name: row.name,
        fixture: row.fixture,
        simulated,
        hasController: linkHasController(link),
        hasWiperProbe: row.hasWiperProbe,
        scheme: row.scheme,
      },
      binCode: row.binCode,
      open: () => this.open(),
      expected: this.expected(),
      clock: this.clock,
      watchdogMs: watchdogMs * rate,
      ports: stationPorts(context.db, row, context.recorder, context.log),
      commission: (job) => commissionBench(job, this.clock),
      onView: (view) => this.viewChanged(view),
      onReading: context.onReading,
      onProblem: (error) => context.log.warn({ error, station: row.code }, 'station'),
    });
  }

  /** What the simulated hands are asked to do. Refused where there are none. */
  async handsCommand(command: HandsCommand): Promise<CommandReply> {
    return this.hands ? this.hands.perform(command) : { ok: false, code: 'not-permitted' };
  }

  private async open(): Promise<Bench> {
    const { row, clock, context } = this;
    const setOf = (kind: BenchRow['instruments'][number]['kind']) =>
      row.instruments.find((each) => each.kind === kind)?.commandSet;
    const bench = await openBench(
      {
        link: row.link,
        hasWiperProbe: row.hasWiperProbe,
        commandSets: {
          supply: setOf('supply'),
          meter: setOf('multimeter'),
          controller: setOf('fixture-controller'),
        },
      },
      clock,
    );
    if (bench.simulation && row.link.kind === 'simulated')
      this.hands = new SimulatedHands({
        bench: bench.simulation,
        clock,
        seed: row.link.seed,
        box: boardBox(context.db, row.id, () => this.station.place()),
        prompt: () => this.promptNow(),
        onChange: context.onHands,
      });
    return bench;
  }

  private expected() {
    const identityOf = (kind: BenchRow['instruments'][number]['kind']) =>
      this.row.instruments.find((each) => each.kind === kind)?.expectedIdentity ?? null;
    return {
      supply: identityOf('supply'),
      meter: identityOf('multimeter'),
      controller: identityOf('fixture-controller'),
    };
  }

  private promptNow() {
    const screen = this.station.view().run?.screen;
    return screen?.kind === 'trim' ? screen.trim : null;
  }

  private viewChanged(view: BenchView): void {
    this.context.onView(view);
    const key = `${view.lot?.lotId} ${view.engineering?.offerId} ${view.lot?.marks} ${view.screen.kind}`;
    if (key === this.boxKey || !this.hands) return;
    this.boxKey = key;
    this.hands.lookIntoBox().catch((error: unknown) => this.context.log.warn({ error }, 'box of boards'));
  }
}
