import type { LinkName } from '@/lib/bench/types';
import { safeBelowVolts } from '../instruments/safe-off';
import type { Instruments } from './bench';

/** Asks every instrument something harmless: who does not answer, and whether the supply stands above the safe voltage. */
export async function checkLinks(bench: Instruments): Promise<{ down: LinkName[]; supplyVolts: number | null }> {
  const [supply, meter, controller] = await Promise.allSettled([
    bench.supply.measureVolts(),
    bench.meter.identify(),
    bench.controller?.identify(),
  ]);
  const down: LinkName[] = [];
  if (supply.status === 'rejected') down.push('supply');
  if (meter.status === 'rejected') down.push('meter');
  if (controller.status === 'rejected') down.push('controller');
  return { down, supplyVolts: supply.status === 'fulfilled' ? supply.value : null };
}

export function isSafe(volts: number | null): boolean {
  return volts !== null && Math.abs(volts) < safeBelowVolts;
}
