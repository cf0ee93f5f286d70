import { formatNr3, parseScpiNumber } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import type { ControllerModel } from './controller-model';
import { Refusal, ScpiInstrument, type CommandTable } from './scpi-instrument';

const mostSeconds = 1;
/** Decimals of a width's mantissa. */
export const controllerDigits = 6;

/** The fixture controller: lid switch, board-present switch, timed series switch. */
export class SimulatedController extends ScpiInstrument {
  constructor(
    clock: Clock,
    private readonly model: ControllerModel,
    serialNumber: string,
  ) {
    super(clock, `SILLWRIGHT,SIM-FIXTURE,${serialNumber},1.0`);
  }

  protected override readonly commands: CommandTable = {
    'INPut:LID?': () => (this.model.fixture.lidClosed ? '1' : '0'),
    'INPut:BOARd?': () => (this.model.fixture.seated ? '1' : '0'),
    'SOURce:PULSe:WIDTh': ([text]) => {
      if (text === undefined) throw new Refusal(-109);
      const seconds = parseScpiNumber(text);
      if (seconds === null) throw new Refusal(-104);
      if (!(seconds > 0 && seconds <= mostSeconds)) throw new Refusal(-222);
      this.model.widthSeconds = seconds;
    },
    'SOURce:PULSe:WIDTh?': () => formatNr3(this.model.widthSeconds, controllerDigits),
    'TRIGger[:IMMediate]': () => this.model.trigger(),
    'SOURce:PULSe:WIDTh:MEASured?': () => {
      const { achievedSeconds, leftMs } = this.model;
      if (achievedSeconds === null) throw new Refusal(-221);
      return { afterMs: leftMs, answer: () => formatNr3(achievedSeconds, controllerDigits) };
    },
  };

  protected override reset(): void {
    super.reset();
    this.model.reset();
  }
}
