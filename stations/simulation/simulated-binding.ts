import type { Binding } from '../link/binding';
import { MockBinding, type MockPortBinding } from '../link/mock-binding';
import type { ScpiInstrument } from './scpi-instrument';

let ports = 0;

/** A mock serial port with a simulated instrument at its far end and a cable that can be pulled. */
export class SimulatedPort {
  readonly path = `/dev/simulated-${++ports}`;
  private open: MockPortBinding | null = null;
  private plugged = true;

  constructor(private readonly instrument: ScpiInstrument) {
    MockBinding.createPort(this.path);
  }

  get isPlugged(): boolean {
    return this.plugged;
  }

  /** Pulling makes the pending read fail, as a vanished USB converter does; an open port then closes by itself. */
  setPlugged(plugged: boolean): void {
    if (plugged === this.plugged) return;
    this.plugged = plugged;
    const port = this.open;
    if (plugged || !port?.isOpen) return;
    port.read = () => Promise.reject(new Error('The device is gone.'));
    port.emitData('\n');
  }

  readonly binding: Binding = {
    list: () => MockBinding.list(),
    open: async (options) => {
      if (!this.plugged) throw new Error('No such device');
      const port = await MockBinding.open(options);
      const write = port.write.bind(port);
      port.write = async (bytes) => {
        if (!this.plugged) throw new Error('The device is gone.');
        await write(bytes);
        this.instrument.receive(bytes);
      };
      this.open = port;
      this.instrument.attach((bytes) => {
        if (this.plugged && port.isOpen) port.emitData(bytes);
      }, options.baudRate);
      return port;
    },
  };
}
