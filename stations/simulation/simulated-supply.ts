import { formatNr3, parseScpiBoolean, parseScpiNumber } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import { Refusal, ScpiInstrument, type CommandTable } from './scpi-instrument';
import { measureMs, mostAmps, mostProtectionVolts, mostVolts, type SupplyModel } from './supply-model';

/** Decimals of a reading's mantissa. */
export const supplyDigits = 5;

/** A programmable supply with remote sense, current limit and overvoltage protection, in plain SCPI-1999. */
export class SimulatedSupply extends ScpiInstrument {
  constructor(
    clock: Clock,
    private readonly model: SupplyModel,
    serialNumber: string,
  ) {
    super(clock, `SILLWRIGHT,SIM-SUPPLY,${serialNumber},1.0`);
  }

  protected override readonly commands: CommandTable = {
    '[SOURce:]VOLTage[:LEVel][:IMMediate][:AMPLitude]': ([text]) => this.model.setVolts(inRange(text, mostVolts)),
    '[SOURce:]VOLTage[:LEVel][:IMMediate][:AMPLitude]?': () => formatNr3(this.model.volts, supplyDigits),
    '[SOURce:]CURRent[:LEVel][:IMMediate][:AMPLitude]': ([text]) => this.model.setCurrentLimit(inRange(text, mostAmps)),
    '[SOURce:]CURRent[:LEVel][:IMMediate][:AMPLitude]?': () => formatNr3(this.model.limitAmps, supplyDigits),
    '[SOURce:]VOLTage:PROTection[:LEVel]': ([text]) => this.model.setOvervoltage(inRange(text, mostProtectionVolts)),
    '[SOURce:]VOLTage:PROTection[:LEVel]?': () => formatNr3(this.model.protectAt, supplyDigits),
    '[SOURce:]VOLTage:PROTection:TRIPped?': () => (this.model.fixture.overvoltageTripped ? '1' : '0'),
    '[SOURce:]VOLTage:PROTection:CLEar': () => this.model.fixture.clearOvervoltage(),
    'OUTPut[:STATe]': ([text]) => {
      const on = text === undefined ? null : parseScpiBoolean(text);
      if (on === null) throw new Refusal(text === undefined ? -109 : -104);
      if (!on) return this.model.fixture.switchOff();
      if (!this.model.fixture.switchOn()) throw new Refusal(-221);
    },
    'OUTPut[:STATe]?': () => (this.model.fixture.isOn ? '1' : '0'),
    'MEASure[:SCALar][:VOLTage][:DC]?': () => ({
      afterMs: measureMs,
      answer: () => formatNr3(this.model.readVolts(), supplyDigits),
    }),
    'MEASure[:SCALar]:CURRent[:DC]?': () => ({
      afterMs: measureMs,
      answer: () => formatNr3(this.model.readAmps(), supplyDigits),
    }),
  };

  protected override reset(): void {
    super.reset();
    this.model.reset();
  }
}

function inRange(text: string | undefined, most: number): number {
  if (text === undefined) throw new Refusal(-109);
  const value = parseScpiNumber(text);
  if (value === null) throw new Refusal(-104);
  if (!(value >= 0 && value <= most)) throw new Refusal(-222);
  return value;
}
