import type { Clock } from '../clock/clock';
import type { Random } from './random';
import type { SimulatedFixture } from './simulated-fixture';

const widthAtResetSeconds = 0.01;

/** What a fixture controller sees and does, whoever asks it: the face in SCPI or the bench without bytes. */
export class ControllerModel {
  widthSeconds = widthAtResetSeconds;
  /** Of the last pulse; null before the first. */
  achievedSeconds: number | null = null;
  private pulseEndsMs = -Infinity;

  constructor(
    private readonly clock: Pick<Clock, 'now'>,
    readonly fixture: SimulatedFixture,
    private readonly random: Random,
  ) {}

  trigger(): void {
    // A solid-state switch: some microseconds late to open and to close.
    this.achievedSeconds = this.widthSeconds + 5e-6 + 3e-6 * this.random.normal();
    this.pulseEndsMs = this.clock.now() + this.achievedSeconds * 1000;
    this.fixture.interrupt(this.achievedSeconds * 1000);
  }

  /** Until the pulse is over. */
  get leftMs(): number {
    return Math.max(0, this.pulseEndsMs - this.clock.now());
  }

  reset(): void {
    this.widthSeconds = widthAtResetSeconds;
    this.achievedSeconds = null;
  }
}
