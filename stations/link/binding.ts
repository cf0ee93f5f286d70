// Named by path: the package hides its types behind `exports`.
import type { BindingInterface } from '../../node_modules/@serialport/bindings-interface/dist/index.js';

/** Where bytes go: the mock binding of a simulated bench or the real one of this platform. */
export type Binding = BindingInterface;

/** Loaded only where there is a real port: the native module need not exist on a machine that only simulates. */
export async function realBinding(): Promise<Binding> {
  const { autoDetect } = await import('@serialport/bindings-cpp');
  return autoDetect();
}
