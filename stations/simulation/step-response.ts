/** How a supply's output rings on every step: the first peak's height as a fraction of the step, and when it comes. */
export interface StepCharacter {
  overshoot: number;
  peakMs: number;
}

/** Own study's plant: 5 % at 30 ms, envelope of 10 ms, 2.4 % of the step left at 40 ms. */
export const usualStep: StepCharacter = { overshoot: 0.05, peakMs: 30 };

/** A second-order system with constant target, followed exactly: e'' + 2 d e' + (d^2 + w^2) e = 0 for the distance e. */
export class StepResponse {
  private readonly decay: number;
  private readonly pace: number;
  private sinceMs = 0;
  /** Distance from the target and its rate, at `sinceMs`. */
  private distance = 0;
  private rate = 0;
  private target = 0;

  constructor(character: StepCharacter) {
    this.decay = -Math.log(character.overshoot) / character.peakMs;
    this.pace = Math.PI / character.peakMs;
  }

  at(ms: number): number {
    const t = ms - this.sinceMs;
    if (this.distance === 0 && this.rate === 0) return this.target;
    const angle = this.pace * t;
    const sine = (this.rate + this.decay * this.distance) / this.pace;
    return this.target + Math.exp(-this.decay * t) * (this.distance * Math.cos(angle) + sine * Math.sin(angle));
  }

  private rateAt(ms: number): number {
    const t = ms - this.sinceMs;
    const angle = this.pace * t;
    const { decay, pace } = this;
    const sine = (this.rate + decay * this.distance) / pace;
    return (
      Math.exp(-decay * t) *
      ((sine * pace - decay * this.distance) * Math.cos(angle) -
        (this.distance * pace + decay * sine) * Math.sin(angle))
    );
  }

  /** A new target from wherever the output is now. */
  aim(target: number, ms: number): void {
    const value = this.at(ms);
    this.rate = this.rateAt(ms);
    this.distance = value - target;
    this.target = target;
    this.sinceMs = ms;
  }

  /** Stands still at a value, as after being off. */
  restAt(value: number, ms: number): void {
    this.target = value;
    this.distance = 0;
    this.rate = 0;
    this.sinceMs = ms;
  }

  /** Instants strictly between two times where the output turns round, at most the first few after the last step. */
  turningPoints(fromMs: number, toMs: number): number[] {
    if (this.distance === 0 && this.rate === 0) return [];
    const { decay, pace } = this;
    const sine = (this.rate + decay * this.distance) / pace;
    // The rate is proportional to A cos - B sin, so it is zero every half turn from atan(A / B).
    const first = Math.atan2(sine * pace - decay * this.distance, this.distance * pace + decay * sine);
    const half = Math.PI / pace;
    let t = first / pace;
    while (t <= 0) t += half;
    const points: number[] = [];
    for (let n = 0; n < mostTurns; n++, t += half) {
      const ms = this.sinceMs + t;
      if (ms >= toMs) break;
      if (ms > fromMs) points.push(ms);
    }
    return points;
  }

  /** Mean over a window, by Simpson's rule; the ring is slow against any integration time used here. */
  meanBetween(fromMs: number, toMs: number): number {
    if (toMs <= fromMs) return this.at(toMs);
    const quarter = (toMs - fromMs) / 4;
    return (
      (this.at(fromMs) +
        4 * this.at(fromMs + quarter) +
        2 * this.at(fromMs + 2 * quarter) +
        4 * this.at(toMs - quarter) +
        this.at(toMs)) /
      12
    );
  }
}

/** At 5 % a peak, the sixth swing is a ten-millionth of the step. */
const mostTurns = 6;
