import type { Random } from './random';
import type { SimulatedFixture } from './simulated-fixture';

/** Where a supply differs from what it is told and what it says. Volts, amperes. */
export interface SupplyCharacter {
  offsetVolts: number;
  gain: number;
  resolutionVolts: number;
  readbackOffsetVolts: number;
  readbackNoiseVolts: number;
  readbackOffsetAmps: number;
  readbackNoiseAmps: number;
}

export function drawSupplyCharacter(random: Random): SupplyCharacter {
  return {
    offsetVolts: random.between(-3e-3, 3e-3),
    gain: random.between(-2e-4, 2e-4),
    resolutionVolts: 0.5e-3,
    readbackOffsetVolts: random.between(-3e-4, 3e-4),
    readbackNoiseVolts: 1e-4,
    readbackOffsetAmps: random.between(-2e-5, 2e-5),
    readbackNoiseAmps: 1e-5,
  };
}

export const mostVolts = 40;
export const mostAmps = 3;
export const mostProtectionVolts = mostVolts * 1.1;
/** What a read-back takes. */
export const measureMs = 1;

/** What a programmable supply does to its fixture, whoever tells it: the face in SCPI or the bench without bytes. */
export class SupplyModel {
  volts = 0;
  limitAmps = mostAmps;
  protectAt = mostProtectionVolts;

  constructor(
    readonly fixture: SimulatedFixture,
    private readonly random: Random,
    private readonly character: SupplyCharacter,
  ) {}

  setVolts(volts: number): void {
    this.volts = volts;
    const { resolutionVolts, gain, offsetVolts } = this.character;
    const steps = Math.round(volts / resolutionVolts);
    this.fixture.setTarget(Math.max(0, steps * resolutionVolts * (1 + gain) + offsetVolts));
  }

  setCurrentLimit(amps: number): void {
    this.limitAmps = amps;
    this.fixture.setCurrentLimit(amps);
  }

  setOvervoltage(volts: number): void {
    this.protectAt = volts;
    this.fixture.setOvervoltage(volts);
  }

  readVolts(): number {
    const { readbackOffsetVolts, readbackNoiseVolts } = this.character;
    return this.fixture.senseVolts() + readbackOffsetVolts + readbackNoiseVolts * this.random.normal();
  }

  readAmps(): number {
    const { readbackOffsetAmps, readbackNoiseAmps } = this.character;
    return this.fixture.amps() + readbackOffsetAmps + readbackNoiseAmps * this.random.normal();
  }

  reset(): void {
    this.fixture.switchOff();
    this.volts = 0;
    this.limitAmps = mostAmps;
    this.protectAt = mostProtectionVolts;
    this.fixture.setTarget(0);
    this.fixture.setCurrentLimit(this.limitAmps);
    this.fixture.setOvervoltage(this.protectAt);
  }
}
