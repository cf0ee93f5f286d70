import type { Clock } from '../clock/clock';
import type { Random } from './random';
import type { SimulatedFixture } from './simulated-fixture';

/** A meter's errors. `noiseVolts` at one power-line cycle. */
export interface MeterCharacter {
  offsetVolts: number;
  gain: number;
  noiseVolts: number;
  hasWiperProbe: boolean;
}

export function drawMeterCharacter(random: Random, hasWiperProbe: boolean): MeterCharacter {
  return {
    offsetVolts: random.between(-2e-5, 2e-5),
    gain: random.between(-1.5e-5, 1.5e-5),
    noiseVolts: 8e-6,
    hasWiperProbe,
  };
}

const cycleMs = 20;
/** A reed relay bounces and the input recovers; read too early, the last channel still shows. */
const relayMs = 0.8;
const cyclesAtReset = 10;

/** What a multimeter with a relay scanner reads, whoever asks it: the face in SCPI or the bench without bytes. */
export class MeterModel {
  cycles = cyclesAtReset;
  private channel: number | null = null;
  private relay = { ms: -Infinity, leftVolts: 0 };

  constructor(
    private readonly clock: Pick<Clock, 'now'>,
    private readonly fixture: SimulatedFixture,
    private readonly random: Random,
    private readonly character: MeterCharacter,
  ) {}

  get channels(): number[] {
    return this.character.hasWiperProbe ? [101, 102, 103, 104] : [101, 102, 103];
  }

  get windowMs(): number {
    return this.cycles * cycleMs;
  }

  closeChannel(channel: number): void {
    this.relay = { ms: this.clock.now(), leftVolts: this.channel ? this.fixture.channelVolts(this.channel, 0) : 0 };
    this.channel = channel;
  }

  /** The mean over the window that began at `startMs` and ends now. */
  integrate(startMs: number): number {
    const { offsetVolts, gain, noiseVolts } = this.character;
    const { windowMs } = this;
    const volts = this.channel === null ? 0 : this.fixture.channelVolts(this.channel, windowMs);
    const early = Math.exp(-(startMs - this.relay.ms) / relayMs);
    const leftOver = (this.relay.leftVolts - volts) * early * Math.min(1, relayMs / windowMs);
    // Below one cycle the mains are no longer averaged out, so the noise grows faster.
    const sd = noiseVolts * this.cycles ** (this.cycles >= 1 ? -0.5 : -1.5);
    return (volts + leftOver) * (1 + gain) + offsetVolts + sd * this.random.normal();
  }

  configure(): void {
    this.cycles = cyclesAtReset;
  }

  reset(): void {
    this.cycles = cyclesAtReset;
    this.channel = null;
  }
}
