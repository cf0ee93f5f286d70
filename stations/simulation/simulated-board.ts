import { dividerOhms, wiperConductances } from '@/lib/circuit/divider';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import { thresholdsAt, type Thresholds } from '@/lib/circuit/thresholds';
import { wiperAt } from '@/lib/circuit/trimmer';
import type { BoardTruth } from './board-truth';

const forwardVolts = 0.68;
/** Below this nothing on the board works. */
const deadVolts = 1;
const never: Thresholds = { tripVolts: Infinity, releaseVolts: Infinity };
const always: Thresholds = { tripVolts: -Infinity, releaseVolts: -Infinity };

/** A board's circuit as it answers to a supply voltage; the latch's state belongs to the fixture that powers it. */
export class SimulatedBoard {
  private screw: number;
  /** Where the wiper's carriage stands, in turns; it trails the screw by the backlash. */
  private carriage: number;
  private known: Thresholds | null = null;

  constructor(readonly truth: BoardTruth) {
    this.screw = truth.screwTurns;
    this.carriage = truth.screwTurns;
  }

  get screwTurns(): number {
    return this.screw;
  }

  get wiper(): number {
    return wiperAt(this.truth.trimmer, this.carriage);
  }

  /** Turns the screw to a position; beyond an end the clutch slips. Returns where it came to stand. */
  turnTo(turns: number): number {
    const { stops, trimmer, wiperFollows } = this.truth;
    const { backlashTurns } = trimmer;
    const screw = Math.min(stops.maxTurns, Math.max(stops.minTurns, turns));
    if (screw === this.screw) return screw;
    const half = backlashTurns / 2;
    if (wiperFollows) {
      const carriage = Math.min(Math.max(this.carriage, screw - half), screw + half);
      const inside = Math.min(trimmer.turns, Math.max(0, carriage));
      if (inside !== this.carriage) this.known = null;
      this.carriage = inside;
    }
    this.screw = screw;
    return screw;
  }

  /** At the board's terminals, without noise. Infinite where the output never (or always) turns on. */
  thresholds(): Thresholds {
    this.known ??= this.computeThresholds();
    return this.known;
  }

  private computeThresholds(): Thresholds {
    const { truth } = this;
    if (truth.output === 'shorted') return always;
    if (truth.output === 'dead' || truth.zener === 'open') return never;
    if (truth.zener === 'reversed') return thresholdsAt(truth.design, this.wiper, forwardVolts);
    const points = softKneeThresholds(truth.design, this.wiper);
    return points.kind === 'found' ? points : never;
  }

  /** Current drawn at `volts` across the board, amperes. */
  amps(volts: number, on: boolean): number {
    const { design, shortOhms, output } = this.truth;
    const passive = volts / dividerOhms(design) + volts / (design.reference.feedOhms * 2);
    const own = design.quiescentAmps * Math.min(1, Math.max(0, volts) / design.reference.nominalVolts);
    const short = shortOhms === null ? 0 : volts / shortOhms;
    return (output === 'dead' ? Math.min(passive, own / 2) : own) + (on ? volts / design.loadOhms : 0) + short;
  }

  outputVolts(volts: number, on: boolean): number {
    const { design, output } = this.truth;
    if (output === 'shorted') return Math.max(0, volts - 0.02);
    if (output === 'dead' || volts < deadVolts) return 0.003;
    return on ? Math.max(0, volts - design.outputDropVolts) : Math.min(volts, design.outputLowVolts);
  }

  referenceVolts(volts: number): number {
    const { design, zener } = this.truth;
    if (zener === 'open') return volts;
    if (zener === 'reversed') return Math.min(volts, forwardVolts);
    const root = referenceAt(design.reference, volts);
    return root.kind === 'found' ? root.x : 0;
  }

  wiperVolts(volts: number, on: boolean): number {
    const { toSupply, toGround, feedback } = wiperConductances(this.truth.design, this.wiper);
    return (volts * toSupply + this.outputVolts(volts, on) * feedback) / (toSupply + toGround + feedback);
  }
}
