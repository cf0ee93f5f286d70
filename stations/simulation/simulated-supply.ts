import { formatNr3, parseScpiBoolean, parseScpiNumber } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import type { Random } from './random';
import { Refusal, ScpiInstrument, type CommandTable } from './scpi-instrument';
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

const mostVolts = 40;
const mostAmps = 3;
const measureMs = 1;

/** A programmable supply with remote sense, current limit and overvoltage protection, in plain SCPI-1999. */
export class SimulatedSupply extends ScpiInstrument {
  private volts = 0;
  private limitAmps = mostAmps;
  private protectAt = mostVolts * 1.1;

  constructor(
    clock: Clock,
    private readonly fixture: SimulatedFixture,
    private readonly random: Random,
    private readonly character: SupplyCharacter,
    serialNumber: string,
  ) {
    super(clock, `SILLWRIGHT,SIM-SUPPLY,${serialNumber},1.0`);
  }

  protected override readonly commands: CommandTable = {
    '[SOURce:]VOLTage[:LEVel][:IMMediate][:AMPLitude]': ([text]) => {
      this.volts = inRange(text, mostVolts);
      const { resolutionVolts, gain, offsetVolts } = this.character;
      const steps = Math.round(this.volts / resolutionVolts);
      this.fixture.setTarget(Math.max(0, steps * resolutionVolts * (1 + gain) + offsetVolts));
    },
    '[SOURce:]VOLTage[:LEVel][:IMMediate][:AMPLitude]?': () => formatNr3(this.volts, 5),
    '[SOURce:]CURRent[:LEVel][:IMMediate][:AMPLitude]': ([text]) => {
      this.limitAmps = inRange(text, mostAmps);
      this.fixture.setCurrentLimit(this.limitAmps);
    },
    '[SOURce:]CURRent[:LEVel][:IMMediate][:AMPLitude]?': () => formatNr3(this.limitAmps, 5),
    '[SOURce:]VOLTage:PROTection[:LEVel]': ([text]) => {
      this.protectAt = inRange(text, mostVolts * 1.1);
      this.fixture.setOvervoltage(this.protectAt);
    },
    '[SOURce:]VOLTage:PROTection[:LEVel]?': () => formatNr3(this.protectAt, 5),
    '[SOURce:]VOLTage:PROTection:TRIPped?': () => (this.fixture.overvoltageTripped ? '1' : '0'),
    '[SOURce:]VOLTage:PROTection:CLEar': () => this.fixture.clearOvervoltage(),
    'OUTPut[:STATe]': ([text]) => {
      const on = text === undefined ? null : parseScpiBoolean(text);
      if (on === null) throw new Refusal(text === undefined ? -109 : -104);
      if (!on) return this.fixture.switchOff();
      if (!this.fixture.switchOn()) throw new Refusal(-221);
    },
    'OUTPut[:STATe]?': () => (this.fixture.isOn ? '1' : '0'),
    'MEASure[:SCALar][:VOLTage][:DC]?': () => ({
      afterMs: measureMs,
      answer: () => {
        const { readbackOffsetVolts, readbackNoiseVolts } = this.character;
        return formatNr3(
          this.fixture.senseVolts() + readbackOffsetVolts + readbackNoiseVolts * this.random.normal(),
          5,
        );
      },
    }),
    'MEASure[:SCALar]:CURRent[:DC]?': () => ({
      afterMs: measureMs,
      answer: () => {
        const { readbackOffsetAmps, readbackNoiseAmps } = this.character;
        return formatNr3(this.fixture.amps() + readbackOffsetAmps + readbackNoiseAmps * this.random.normal(), 5);
      },
    }),
  };

  protected override reset(): void {
    super.reset();
    this.fixture.switchOff();
    this.volts = 0;
    this.limitAmps = mostAmps;
    this.protectAt = mostVolts * 1.1;
    this.fixture.setTarget(0);
    this.fixture.setCurrentLimit(this.limitAmps);
    this.fixture.setOvervoltage(this.protectAt);
  }
}

function inRange(text: string | undefined, most: number): number {
  if (text === undefined) throw new Refusal(-109);
  const value = parseScpiNumber(text);
  if (value === null) throw new Refusal(-104);
  if (!(value >= 0 && value <= most)) throw new Refusal(-222);
  return value;
}
