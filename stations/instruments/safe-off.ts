import type { Clock } from '../clock/clock';
import type { Multimeter } from './multimeter';
import type { Supply } from './supply';

export type SafeOffReport = { confirmed: true; volts: number; by: 'meter' | 'supply' } | { confirmed: false };

export const safeBelowVolts = 2;
const patienceMs = 4000;
const pauseMs = 50;

/**
 * Switches the supply off and reads back until below 2 V. Repeats the command while nothing confirms it. A reading of
 * 2 V or more by either instrument outweighs the other: with a lifted contact the meter sees nothing of a live supply.
 * Never throws.
 */
export async function safeOff(
  bench: {
    supply: Pick<Supply, 'switchOff' | 'measureVolts'>;
    meter: Pick<Multimeter, 'readVolts'>;
  },
  clock: Clock,
): Promise<SafeOffReport> {
  const giveUpAt = clock.now() + patienceMs;
  for (;;) {
    await bench.supply.switchOff().catch(() => undefined);
    const [byMeter, bySupply] = await Promise.all([
      bench.meter.readVolts(101, 1).catch(() => null),
      bench.supply.measureVolts().catch(() => null),
    ]);
    const isLow = (volts: number | null) => volts === null || Math.abs(volts) < safeBelowVolts;
    if (isLow(byMeter) && isLow(bySupply)) {
      if (byMeter !== null) return { confirmed: true, volts: byMeter, by: 'meter' };
      if (bySupply !== null) return { confirmed: true, volts: bySupply, by: 'supply' };
    }
    if (clock.now() >= giveUpAt) return { confirmed: false };
    await clock.sleep(pauseMs);
  }
}
