import type { SearchObservation } from '../../lib/search/types';
import type { Plant, SearchedBoard } from './plant';
import type { Random } from './random';

export interface PurePlantOptions {
  startVolts: number;
  startOutput?: 'on' | 'off';
  noiseVolts: number;
  /** Of a falling and a rising step, fractions. */
  overshoot: { falling: number; rising: number };
  envelopeMs?: number;
  settleMs?: number;
  waypointMs?: number;
  /** Time between a reading and the next step, in which the supply goes on settling. */
  linkMs?: number;
  offsetVolts?: number;
  gain?: number;
  resolutionVolts?: number;
  readingNoiseVolts?: number;
}

/**
 * The study's plant: a latch behind a supply whose steps ring as a second-order system (envelope 10 ms, first peak 5 %
 * beyond the level after 30 ms), one independent draw of comparator noise a settle, sampled every millisecond.
 */
export class PurePlant implements Plant {
  volts: number;
  output: 'on' | 'off';
  peakVolts: number;
  private level: number;
  private velocity = 0;

  constructor(
    private readonly board: SearchedBoard,
    private readonly options: PurePlantOptions,
    private readonly random: Random,
  ) {
    this.volts = this.level = this.peakVolts = options.startVolts;
    this.output = board.stuck ?? options.startOutput ?? 'off';
  }

  apply(setpoint: number, dwell: 'settle' | 'waypoint'): SearchObservation {
    const { options, board } = this;
    const { noiseVolts, offsetVolts = 0, gain = 0, resolutionVolts = 0, readingNoiseVolts = 0 } = options;
    const voltsBefore = this.volts + this.random.normal(0, readingNoiseVolts);
    const programmed = resolutionVolts > 0 ? Math.round(setpoint / resolutionVolts) * resolutionVolts : setpoint;
    this.level = programmed * (1 + gain) + offsetVolts;
    const falling = this.level < this.volts;
    const trip = board.trip + this.random.normal(0, noiseVolts);
    const release = board.release + this.random.normal(0, noiseVolts);

    const decay = 1 / (options.envelopeMs ?? 10);
    const turn = (Math.PI * decay) / Math.log(1 / (falling ? options.overshoot.falling : options.overshoot.rising));
    const shrink = Math.exp(-decay);
    const c = Math.cos(turn);
    const s = Math.sin(turn);
    let y = this.volts - this.level;
    // (y, z) turns by a fixed angle and shrinks each millisecond; z is the quadrature of the ring.
    let z = (this.velocity + decay * y) / turn;
    let reading = 0;
    const readAt = dwell === 'settle' ? (options.settleMs ?? 40) : (options.waypointMs ?? 30);
    for (let i = 1; i <= readAt + (options.linkMs ?? 10); i++) {
      const next = shrink * (c * y + s * z);
      z = shrink * (c * z - s * y);
      y = next;
      const v = this.level + y;
      if (i === readAt) reading = v;
      if (v > this.peakVolts) this.peakVolts = v;
      if (board.stuck) continue;
      if (this.output === 'on' && v <= trip) this.output = 'off';
      else if (this.output === 'off' && v >= release) this.output = 'on';
    }
    this.velocity = turn * z - decay * y;
    this.volts = this.level + y;
    return { voltsBefore, volts: reading + this.random.normal(0, readingNoiseVolts), output: this.output };
  }
}
