import type { OutputSensing } from '@/lib/contracts/board-type';
import type { OutputState } from '@/lib/search/types';
import type { Multimeter } from './multimeter';
import type { Supply } from './supply';

/** Tells whether the board's output is on, as the board type says: from channel 102 or from the step in supply current. */
export class OutputSensor {
  constructor(
    private readonly sensing: OutputSensing,
    private readonly supply: Pick<Supply, 'measureAmps'>,
    private readonly meter: Pick<Multimeter, 'readVolts'>,
  ) {}

  async read(integrationCycles = 1): Promise<OutputState> {
    const { sensing } = this;
    const on =
      sensing.kind === 'output-voltage'
        ? (await this.meter.readVolts(102, integrationCycles)) > sensing.thresholdVolts
        : (await this.supply.measureAmps()) > sensing.thresholdAmps;
    return on ? 'on' : 'off';
  }
}
