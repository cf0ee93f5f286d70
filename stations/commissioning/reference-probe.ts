import type { Thresholds } from '@/lib/circuit/thresholds';
import type { BoardType } from '@/lib/contracts/board-type';
import { pathWithin } from '@/lib/run/supply-path';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import { OutputSensor } from '../instruments/output-sensor';
import { commissioningFault } from './commissioning-fault';

/** Assumed of a supply whose overshoot is not known yet, so that no approach flips what it must not. */
const overshootAtMost = 0.25;
const dwellMs = 100;
/** How far beyond a point the output is sure to change. */
const beyondVolts = 0.25;

/** The reference board under slow, safe moves of the supply; volts as the meter reads them at the board. */
export class ReferenceProbe {
  volts = 0;
  isOn = false;
  private setpointErrorVolts = 0;
  private readonly sensor: OutputSensor;

  constructor(
    readonly bench: Bench,
    readonly boardType: BoardType,
    readonly clock: Clock,
    readonly signal: AbortSignal,
  ) {
    this.sensor = new OutputSensor(boardType.sensing, bench.supply, bench.meter);
  }

  /** Limits first, then on at the lowest supply. */
  async energise(): Promise<void> {
    const { design, absoluteMaximumVolts, search } = this.boardType;
    await this.bench.supply.prepare({
      currentLimitAmps: 2 * (absoluteMaximumVolts / design.loadOhms + design.quiescentAmps),
      overvoltageVolts: absoluteMaximumVolts,
    });
    await this.bench.meter.prepare();
    await this.bench.supply.setVolts(search.supplyMinVolts);
    await this.bench.supply.switchOn();
    await this.step(search.supplyMinVolts);
  }

  /** One step, whatever it overshoots to; then volts and state. */
  step(volts: number, waitMs = dwellMs): Promise<void> {
    return this.applyExactly(volts - this.setpointErrorVolts, waitMs);
  }

  /** The same by setpoint, for a search that learns the supply's own error. */
  async applyExactly(setpoint: number, waitMs = dwellMs): Promise<void> {
    this.signal.throwIfAborted();
    await this.bench.supply.setVolts(setpoint);
    await this.clock.sleep(waitMs, this.signal);
    this.volts = await this.bench.meter.readVolts(101, 1);
    this.setpointErrorVolts = this.volts - setpoint;
    this.isOn = (await this.sensor.read()) === 'on';
  }

  /** Moves without a peak beyond `boundVolts`, however much the supply overshoots. */
  async approach(volts: number, boundVolts: number): Promise<void> {
    for (const waypoint of pathWithin(this.volts, volts, boundVolts, overshootAtMost)) await this.step(waypoint);
  }

  /** Output on, supply at `volts`, nothing below `boundVolts` on the way down. False when it switched off on the way. */
  async armOn(points: Thresholds, volts: number, boundVolts: number): Promise<boolean> {
    const ceiling = this.boardType.absoluteMaximumVolts * 0.99;
    if (!this.isOn) {
      const top = points.releaseVolts + beyondVolts;
      if (top > ceiling) throw commissioningFault('noRoom');
      await this.approach(top, ceiling);
      if (!this.isOn) throw commissioningFault('notOn');
    }
    await this.approach(volts, volts > this.volts ? ceiling : boundVolts);
    return this.isOn;
  }

  /** Output off, supply at `volts`, nothing above `boundVolts` on the way up. False when it switched on on the way. */
  async armOff(points: Thresholds, volts: number, boundVolts: number): Promise<boolean> {
    const floor = this.boardType.search.supplyMinVolts * 0.5;
    if (this.isOn) {
      await this.approach(points.tripVolts - beyondVolts, floor);
      if (this.isOn) throw commissioningFault('pointsOff');
    }
    await this.approach(volts, volts < this.volts ? floor : boundVolts);
    return !this.isOn;
  }
}
