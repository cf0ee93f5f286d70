import type { BoardTruth } from './board-truth';
import type { Random } from './random';

/** A comparator's noise while the screw moves counts as fresh after this; a worn wiper jumps as often at rest. */
const freshAfterMs = 40;

/** What the comparator adds to the points until it is drawn again: once a settle, so that a dwell is one look. */
export class ThresholdNoise {
  trip = 0;
  release = 0;
  private drawnMs = 0;

  constructor(private readonly random: Random) {}

  draw({ wiperJumpVolts, noiseVolts }: BoardTruth, ms: number): void {
    const jump = wiperJumpVolts === 0 ? 0 : wiperJumpVolts * this.random.normal();
    this.trip = jump + noiseVolts * this.random.normal();
    this.release = jump + noiseVolts * this.random.normal();
    this.drawnMs = ms;
  }

  isStale(ms: number): boolean {
    return ms - this.drawnMs >= freshAfterMs;
  }
}
