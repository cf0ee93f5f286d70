import { parseChannelList } from '@/lib/scpi/channel-list';
import { formatNr3, parseScpiNumber } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import type { Random } from './random';
import { Refusal, ScpiInstrument, type CommandTable } from './scpi-instrument';
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
const fewestCycles = 0.02;
const mostCycles = 100;

/** A 6½-digit multimeter with a relay scanner, in plain SCPI-1999. */
export class SimulatedMultimeter extends ScpiInstrument {
  private cycles = 10;
  private channel: number | null = null;
  private relay = { ms: -Infinity, leftVolts: 0 };

  constructor(
    clock: Clock,
    private readonly fixture: SimulatedFixture,
    private readonly random: Random,
    private readonly character: MeterCharacter,
    serialNumber: string,
  ) {
    super(clock, `SILLWRIGHT,SIM-METER,${serialNumber},1.0`);
  }

  protected override readonly commands: CommandTable = {
    'CONFigure[:VOLTage][:DC]': () => {
      this.cycles = 10;
    },
    '[SENSe:]VOLTage[:DC]:NPLCycles': ([text]) => {
      if (text === undefined) throw new Refusal(-109);
      const cycles = parseScpiNumber(text);
      if (cycles === null) throw new Refusal(-104);
      if (!(cycles >= fewestCycles && cycles <= mostCycles)) throw new Refusal(-222);
      this.cycles = cycles;
    },
    '[SENSe:]VOLTage[:DC]:NPLCycles?': () => formatNr3(this.cycles, 5),
    'ROUTe:CLOSe': ([text]) => {
      if (text === undefined) throw new Refusal(-109);
      const channels = parseChannelList(text);
      if (!channels || channels.length !== 1) throw new Refusal(-104);
      const [channel] = channels;
      if (!this.channels.includes(channel!)) throw new Refusal(-222);
      this.relay = { ms: this.clock.now(), leftVolts: this.channel ? this.fixture.channelVolts(this.channel, 0) : 0 };
      this.channel = channel!;
    },
    'READ?': () => {
      const startMs = this.clock.now();
      const windowMs = this.cycles * cycleMs;
      return { afterMs: windowMs, answer: () => formatNr3(this.integrate(startMs, windowMs), 8) };
    },
  };

  protected override reset(): void {
    super.reset();
    this.cycles = 10;
    this.channel = null;
  }

  private get channels(): number[] {
    return this.character.hasWiperProbe ? [101, 102, 103, 104] : [101, 102, 103];
  }

  private integrate(startMs: number, windowMs: number): number {
    const { offsetVolts, gain, noiseVolts } = this.character;
    const volts = this.channel === null ? 0 : this.fixture.channelVolts(this.channel, windowMs);
    const early = Math.exp(-(startMs - this.relay.ms) / relayMs);
    const leftOver = (this.relay.leftVolts - volts) * early * Math.min(1, relayMs / windowMs);
    // Below one cycle the mains are no longer averaged out, so the noise grows faster.
    const sd = noiseVolts * this.cycles ** (this.cycles >= 1 ? -0.5 : -1.5);
    return (volts + leftOver) * (1 + gain) + offsetVolts + sd * this.random.normal();
  }
}
