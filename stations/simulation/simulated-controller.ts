import { formatNr3, parseScpiNumber } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import type { Random } from './random';
import { Refusal, ScpiInstrument, type CommandTable } from './scpi-instrument';
import type { SimulatedFixture } from './simulated-fixture';

const mostSeconds = 1;

/** The fixture controller: lid switch, board-present switch, timed series switch. */
export class SimulatedController extends ScpiInstrument {
  private widthSeconds = 0.01;
  private achievedSeconds: number | null = null;
  private pulseEndsMs = -Infinity;

  constructor(
    clock: Clock,
    private readonly fixture: SimulatedFixture,
    private readonly random: Random,
    serialNumber: string,
  ) {
    super(clock, `SILLWRIGHT,SIM-FIXTURE,${serialNumber},1.0`);
  }

  protected override readonly commands: CommandTable = {
    'INPut:LID?': () => (this.fixture.lidClosed ? '1' : '0'),
    'INPut:BOARd?': () => (this.fixture.seated ? '1' : '0'),
    'SOURce:PULSe:WIDTh': ([text]) => {
      if (text === undefined) throw new Refusal(-109);
      const seconds = parseScpiNumber(text);
      if (seconds === null) throw new Refusal(-104);
      if (!(seconds > 0 && seconds <= mostSeconds)) throw new Refusal(-222);
      this.widthSeconds = seconds;
    },
    'SOURce:PULSe:WIDTh?': () => formatNr3(this.widthSeconds, 6),
    'TRIGger[:IMMediate]': () => {
      // A solid-state switch: some microseconds late to open and to close.
      this.achievedSeconds = this.widthSeconds + 5e-6 + 3e-6 * this.random.normal();
      this.pulseEndsMs = this.clock.now() + this.achievedSeconds * 1000;
      this.fixture.interrupt(this.achievedSeconds * 1000);
    },
    'SOURce:PULSe:WIDTh:MEASured?': () => {
      const achieved = this.achievedSeconds;
      if (achieved === null) throw new Refusal(-221);
      return { afterMs: Math.max(0, this.pulseEndsMs - this.clock.now()), answer: () => formatNr3(achieved, 6) };
    },
  };

  protected override reset(): void {
    super.reset();
    this.widthSeconds = 0.01;
    this.achievedSeconds = null;
  }
}
