import type { ChartQuantity } from '@/lib/contracts/lot-review';

interface QuantityLook {
  /** As a tab, such as "Trip point". */
  name: string;
  /** Written after numbers. */
  unit: string;
  /** Decimals of the scale; measured values take one more. */
  digits: number;
  colour: string;
  point: 'trip' | 'release' | null;
}

export const quantityLooks: Record<ChartQuantity, QuantityLook> = {
  'trip-volts': { name: 'Trip point', unit: 'V', digits: 2, colour: 'var(--sw-trip)', point: 'trip' },
  'release-volts': { name: 'Release point', unit: 'V', digits: 2, colour: 'var(--sw-release)', point: 'release' },
  'hysteresis-volts': { name: 'Hysteresis', unit: 'V', digits: 2, colour: 'var(--sw-ink-2)', point: null },
  turns: { name: 'Turns needed', unit: 'turns', digits: 1, colour: 'var(--sw-ink-2)', point: null },
  seconds: { name: 'Seconds a board', unit: 's', digits: 0, colour: 'var(--sw-ink-2)', point: null },
};

const minus = (text: string) => text.replace('-', '\u2212');
/** A number of the scale, such as 10.90. */
export const scaleText = (quantity: ChartQuantity, value: number) =>
  minus(value.toFixed(quantityLooks[quantity].digits));
/** A measured value, one decimal finer: 10.832. */
export const valueText = (quantity: ChartQuantity, value: number) =>
  minus(value.toFixed(quantityLooks[quantity].digits + 1));
