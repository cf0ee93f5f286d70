import type { SerialPortStream } from '@serialport/stream';

/** Where bytes go: the mock binding of a simulated bench or the real one of this platform. */
export type Binding = ConstructorParameters<typeof SerialPortStream>[0]['binding'];

/** Loaded only where there is a real port: the native module need not exist on a machine that only simulates. */
export async function realBinding(): Promise<Binding> {
  const { autoDetect } = await import('@serialport/bindings-cpp');
  return autoDetect();
}
