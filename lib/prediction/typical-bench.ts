import type { BoardDesign } from '../circuit/board-design';
import { wiperConductances } from '../circuit/divider';
import { wiperForTrip } from '../circuit/inverse';
import { referenceAt, softKneeThresholds } from '../circuit/soft-knee';
import type { Thresholds } from '../circuit/thresholds';
import { turnsAt, wiperAt } from '../circuit/trimmer';
import type { BoardType } from '../contracts/board-type';
import type { Answer, Ask } from '../run/machine';
import type { OutputState } from '../search/types';
import { normalQuantile } from '../statistics/distributions/normal-quantile';
import type { StationKind } from '../sequence/station-kind';
import { cycleMs, ExchangeTimes, stateCycles, valueCycles, type MeterRelays } from './exchange-times';

/** What a step leaves behind on the bench; with the facts it is all that the next step can notice. */
export interface BenchState {
  supplyOn: boolean;
  setVolts: number;
  output: OutputState;
  screwTurns: number;
  relays: MeterRelays;
  lidClosed: boolean;
}

/** A change of the supply or of the output, `atMs` on the bench's clock. */
export type BenchNote =
  | { kind: 'supply'; atMs: number; volts: number }
  | { kind: 'flip'; atMs: number; volts: number; point: 'trip' | 'release' }
  | { kind: 'load'; atMs: number; on: boolean };

type WithoutStamp<E> = E extends unknown ? Omit<E, 'id' | 'atMs'> : never;
export type Answered = WithoutStamp<Answer>;

/** Points of the typical board; infinite where its output never comes on. */
export function pointsOf({ design, trimmer }: BoardType, screwTurns: number): Thresholds {
  const found = softKneeThresholds(design, wiperAt(trimmer, screwTurns));
  return found.kind === 'found' ? found : { tripVolts: Infinity, releaseVolts: Infinity };
}

/** Screw of the typical board for a trip point, as near as its travel comes. */
export function turnsFor({ design, trimmer }: BoardType, tripVolts: number): number {
  const node = referenceAt(design.reference, tripVolts);
  const wiper = node.kind === 'found' ? wiperForTrip(design, tripVolts, node.x) : 0.5;
  return turnsAt(trimmer, Math.min(1, Math.max(0, wiper)));
}

/** Supplies overshoot by about this share of the bound that their commissioning keeps; *common practice*. */
const overshootShare = 0.85;

/** Standard normal numbers that fill their range evenly, so that a short search meets neither luck nor bad luck. */
const evenNormal = (n: number) => normalQuantile((0.5 + n * goldenRatio) % 1 || 0.5);
const goldenRatio = 0.6180339887498949;

const contactOhms = 0.002;
const dischargeMs = 15;
const safeBelowVolts = 2;
const pauseMs = 50;

/**
 * A bench with one typical board: nominal parts, the comparator noise that the search expects, a supply that overshoots as
 * commissioned and comes to where it is told, readings without error, and the time that every exchange takes.
 */
export class TypicalBench {
  nowMs = 0;
  readonly notes: BenchNote[] = [];
  private points: Thresholds | null = null;
  private settles = 0;
  private readonly overshoot: number;
  private readonly times: ExchangeTimes;
  private readonly design: BoardDesign;

  constructor(
    readonly boardType: BoardType,
    station: Pick<StationKind, 'baudRate' | 'commissioning'>,
    private state: BenchState,
  ) {
    this.overshoot = overshootShare * station.commissioning.overshoot;
    this.times = new ExchangeTimes(station.baudRate);
    this.design = boardType.design;
  }

  leave(): BenchState {
    return this.state;
  }

  thresholds(): Thresholds {
    this.points ??= pointsOf(this.boardType, this.state.screwTurns);
    return this.points;
  }

  /** Clockwise positive. */
  turnsTo(tripVolts: number): number {
    return turnsFor(this.boardType, tripVolts) - this.state.screwTurns;
  }

  setLid(closed: boolean): void {
    this.change({ lidClosed: closed });
    if (!closed) this.goOff();
  }

  /** Turns the screw by so much, at once; the output answers. */
  turn(turns: number): void {
    const { trimmer } = this.boardType;
    const screwTurns = Math.min(trimmer.turns, Math.max(0, this.state.screwTurns + turns));
    if (screwTurns === this.state.screwTurns) return;
    this.change({ screwTurns });
    this.points = null;
    this.judge(this.state.setVolts);
  }

  pollFixture(): void {
    this.nowMs += this.times.fixtureMs;
  }

  /** Does what the engine asks and says what came of it; the clock has gone on by what it took. */
  perform(ask: Ask): Answered {
    const { times } = this;
    switch (ask.kind) {
      case 'read-fixture':
        this.nowMs += times.fixtureMs;
        return { kind: 'fixture-read', lidClosed: this.state.lidClosed, boardPresent: true };
      case 'prepare-supply':
        this.goOff();
        this.nowMs += times.prepareMs;
        this.change({ relays: { channel: null, cycles: null } });
        return { kind: 'prepared' };
      case 'supply-on':
        this.nowMs += times.switchOnMs;
        this.change({ supplyOn: true, output: 'off' });
        this.setSupply(ask.volts);
        this.nowMs += ask.settleMs;
        return { kind: 'supply-is-on', volts: this.read(101, valueCycles), amps: this.readAmps() };
      case 'probe': {
        const voltsBefore = ask.readBefore ? this.read(101, valueCycles) : null;
        this.nowMs += times.setVoltsMs;
        this.setSupply(ask.volts);
        this.nowMs += ask.dwellMs;
        return { kind: 'probed', voltsBefore, volts: this.read(101, valueCycles), output: this.readOutput() };
      }
      case 'sense':
        return { kind: 'sensed', output: this.readOutput() };
      case 'measure':
        return { kind: 'measured', volts: this.read(ask.channel, ask.integrationCycles) };
      case 'measure-supply': {
        this.nowMs += times.supplyAmpsMs;
        return { kind: 'supply-measured', volts: this.volts + contactOhms * this.amps, amps: this.readAmps() };
      }
      case 'measure-wiper':
        return {
          kind: 'wiper-measured',
          wiperVolts: this.read(104, stateCycles),
          supplyVolts: this.read(101, stateCycles),
        };
      case 'pulse':
        this.nowMs += times.pulseMs(ask.seconds);
        return { kind: 'pulsed', seconds: ask.seconds };
      case 'wait':
        this.nowMs += ask.milliseconds;
        return { kind: 'waited' };
      case 'supply-off':
        return this.switchOff();
    }
  }

  /** Off, then read back by meter and supply at once, until both are below 2 V. */
  private switchOff(): Answered {
    const { times, volts } = this;
    const offMs = this.nowMs + times.switchOffMs;
    const left = (atMs: number) => volts * Math.exp(-Math.max(0, atMs - offMs) / dischargeMs);
    for (;;) {
      const fromMs = this.nowMs;
      const supplyMs = fromMs + times.switchOffMs + times.supplyAmpsMs;
      const bySupply = left(supplyMs - times.supplyAnswerMs);
      this.read(101, valueCycles);
      const byMeter = left(this.nowMs - times.meterAnswerMs - (valueCycles * cycleMs) / 2);
      this.nowMs = Math.max(this.nowMs, supplyMs);
      if (byMeter < safeBelowVolts && bySupply < safeBelowVolts) {
        this.goOff(offMs);
        return { kind: 'supply-is-off', confirmed: true, volts: byMeter, by: 'meter' };
      }
      this.nowMs += pauseMs;
    }
  }

  private get wiper(): number {
    return wiperAt(this.boardType.trimmer, this.state.screwTurns);
  }

  private get volts(): number {
    return this.state.supplyOn ? this.state.setVolts : 0;
  }

  private get amps(): number {
    const { quiescentAmps, loadOhms, reference } = this.design;
    const own = quiescentAmps * Math.min(1, this.volts / reference.nominalVolts);
    return own + (this.state.output === 'on' ? this.volts / loadOhms : 0);
  }

  private readAmps(): number {
    this.nowMs += this.times.supplyAmpsMs;
    return this.amps;
  }

  private read(channel: number, cycles: number): number {
    const { ms, relays } = this.times.read(this.state.relays, channel, cycles);
    this.nowMs += ms;
    this.change({ relays });
    return this.channelVolts(channel);
  }

  private channelVolts(channel: number): number {
    const { volts } = this;
    switch (channel) {
      case 102:
        return this.outputVolts;
      case 103: {
        const node = referenceAt(this.design.reference, volts);
        return node.kind === 'found' ? node.x : 0;
      }
      case 104: {
        const { toSupply, toGround, feedback } = wiperConductances(this.design, this.wiper);
        return (volts * toSupply + this.outputVolts * feedback) / (toSupply + toGround + feedback);
      }
      default:
        return volts;
    }
  }

  private get outputVolts(): number {
    const { outputDropVolts, outputLowVolts } = this.design;
    return this.state.output === 'on'
      ? Math.max(0, this.volts - outputDropVolts)
      : Math.min(this.volts, outputLowVolts);
  }

  private readOutput(): OutputState {
    if (this.boardType.sensing.kind === 'output-voltage') this.read(102, stateCycles);
    else this.nowMs += this.times.supplyAmpsMs;
    return this.state.output;
  }

  private setSupply(volts: number): void {
    const peakVolts = volts + this.overshoot * (volts - this.state.setVolts);
    this.change({ setVolts: volts });
    this.note({ kind: 'supply', atMs: this.nowMs, volts });
    this.settles++;
    this.judge(peakVolts);
    this.judge(volts);
  }

  /** Lets the latch see a voltage. */
  private judge(volts: number): void {
    const { output, supplyOn, setVolts } = this.state;
    if (!supplyOn) return;
    const { tripVolts, releaseVolts } = this.thresholds();
    const noise = this.boardType.search.noiseVolts * evenNormal(this.settles);
    const flips = output === 'on' ? volts < tripVolts + noise : volts > releaseVolts + noise;
    if (!flips) return;
    this.change({ output: output === 'on' ? 'off' : 'on' });
    this.note({ kind: 'flip', atMs: this.nowMs, volts: setVolts, point: output === 'on' ? 'trip' : 'release' });
    this.note({ kind: 'load', atMs: this.nowMs, on: output === 'off' });
  }

  private goOff(atMs = this.nowMs): void {
    if (!this.state.supplyOn) return;
    this.note({ kind: 'supply', atMs, volts: 0 });
    if (this.state.output === 'on') this.note({ kind: 'load', atMs, on: false });
    this.change({ supplyOn: false, setVolts: 0, output: 'off' });
  }

  private note(note: BenchNote): void {
    this.notes.push(note);
  }

  private change(part: Partial<BenchState>): void {
    this.state = { ...this.state, ...part };
  }
}
