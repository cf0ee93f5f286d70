import { SerialPortStream } from '@serialport/stream';
import { realBinding } from '../link/binding';
import type { ScpiInstrument } from './scpi-instrument';

/**
 * Serves a simulated instrument at the far end of a serial line or pseudo-terminal, so that a station set to serial paths
 * can be run against it. The line itself takes no time there, so none is added. Resolves once open, with how to stop.
 */
export async function serveInstrument(path: string, instrument: ScpiInstrument): Promise<() => Promise<void>> {
  const port = new SerialPortStream({ binding: await realBinding(), path, baudRate: 115_200, autoOpen: false });
  await new Promise<void>((resolve, reject) => port.open((error) => (error ? reject(error) : resolve())));
  port.on('data', (bytes: Buffer) => instrument.receive(bytes));
  instrument.attach((bytes) => port.write(bytes), null);
  return () => new Promise((resolve) => (port.isOpen ? port.close(() => resolve()) : resolve()));
}
