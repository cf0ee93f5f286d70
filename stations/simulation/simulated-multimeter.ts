import { parseChannelList } from '@/lib/scpi/channel-list';
import { formatNr3, parseScpiNumber } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import type { MeterModel } from './meter-model';
import { Refusal, ScpiInstrument, type CommandTable } from './scpi-instrument';

const fewestCycles = 0.02;
const mostCycles = 100;
/** Decimals of a reading's mantissa. */
export const meterDigits = 8;

/** A 6½-digit multimeter with a relay scanner, in plain SCPI-1999. */
export class SimulatedMultimeter extends ScpiInstrument {
  constructor(
    clock: Clock,
    private readonly model: MeterModel,
    serialNumber: string,
  ) {
    super(clock, `SILLWRIGHT,SIM-METER,${serialNumber},1.0`);
  }

  protected override readonly commands: CommandTable = {
    'CONFigure[:VOLTage][:DC]': () => this.model.configure(),
    '[SENSe:]VOLTage[:DC]:NPLCycles': ([text]) => {
      if (text === undefined) throw new Refusal(-109);
      const cycles = parseScpiNumber(text);
      if (cycles === null) throw new Refusal(-104);
      if (!(cycles >= fewestCycles && cycles <= mostCycles)) throw new Refusal(-222);
      this.model.cycles = cycles;
    },
    '[SENSe:]VOLTage[:DC]:NPLCycles?': () => formatNr3(this.model.cycles, 5),
    'ROUTe:CLOSe': ([text]) => {
      if (text === undefined) throw new Refusal(-109);
      const channels = parseChannelList(text);
      if (!channels || channels.length !== 1) throw new Refusal(-104);
      const [channel] = channels;
      if (!this.model.channels.includes(channel!)) throw new Refusal(-222);
      this.model.closeChannel(channel!);
    },
    'READ?': () => {
      const startMs = this.clock.now();
      return { afterMs: this.model.windowMs, answer: () => formatNr3(this.model.integrate(startMs), meterDigits) };
    },
  };

  protected override reset(): void {
    super.reset();
    this.model.reset();
  }
}
