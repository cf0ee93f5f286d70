import type { BoardDesign, TrimmerTravel } from '../../../lib/circuit/board-design';
import { softKneeThresholds } from '../../../lib/circuit/soft-knee';
import { wiperConductances } from '../../../lib/circuit/divider';
import type { OutputState } from '../../../lib/search/types';

/** One true board with its screw: points from the circuit, a lead screw with play and end stops, a latched output. */
export class TrimmedBoard {
  output: OutputState = 'off';
  /** Turns from the end that lowers the trip point most. */
  private wiperTurns: number;
  private play = 0;
  private points: { tripVolts: number; releaseVolts: number };

  constructor(
    readonly design: BoardDesign,
    readonly travel: TrimmerTravel,
    wiper: number,
  ) {
    this.wiperTurns = (1 - wiper) * travel.turns;
    this.points = this.solve();
  }

  get wiper(): number {
    return 1 - this.wiperTurns / this.travel.turns;
  }
  get tripVolts(): number {
    return this.points.tripVolts;
  }
  get releaseVolts(): number {
    return this.points.releaseVolts;
  }

  /** Positive raises the trip point. The first turns of a reversal only take up the play. */
  turn(raisingTurns: number): void {
    const { backlashTurns, turns } = this.travel;
    const slack =
      raisingTurns > 0 ? Math.min(raisingTurns, backlashTurns - this.play) : -Math.min(-raisingTurns, this.play);
    this.play += slack;
    const moved = Math.min(turns * 0.9999, Math.max(turns * 0.0001, this.wiperTurns + raisingTurns - slack));
    if (moved === this.wiperTurns) return;
    this.wiperTurns = moved;
    this.points = this.solve();
  }

  /** The output at a supply voltage, `noiseVolts` added to both points. */
  latch(supplyVolts: number, noiseVolts: number): void {
    if (this.output === 'on' && supplyVolts <= this.tripVolts + noiseVolts) this.output = 'off';
    else if (this.output === 'off' && supplyVolts >= this.releaseVolts + noiseVolts) this.output = 'on';
  }

  /** Channel 104. */
  wiperVolts(supplyVolts: number): number {
    const { toSupply, toGround, feedback } = wiperConductances(this.design, this.wiper);
    const out = this.output === 'on' ? supplyVolts - this.design.outputDropVolts : this.design.outputLowVolts;
    return (supplyVolts * toSupply + out * feedback) / (toSupply + toGround + feedback);
  }

  private solve() {
    const points = softKneeThresholds(this.design, this.wiper);
    return points.kind === 'found' ? points : { tripVolts: 0, releaseVolts: 0 };
  }
}
