import { useLocale } from 'next-intl';

const scaled: Record<string, { factor: number; unit: string; below: number }[]> = {
  A: [
    { factor: 1e6, unit: 'µA', below: 1e-3 },
    { factor: 1e3, unit: 'mA', below: 1 },
  ],
  V: [{ factor: 1e3, unit: 'mV', below: 0.1 }],
  s: [{ factor: 1e3, unit: 'ms', below: 1 }],
};

/**
 * A number with its unit, in the prefix people use and with enough digits to differ from `other` (its limit). Ohms are
 * written out, since our faces lack the sign.
 */
export function useQuantity(): (value: number, unit: string, other?: number) => { number: string; unit: string } {
  const language = useLocale();
  const locale = language === 'en' ? 'en-GB' : language;
  return (value, unit, other) => {
    const size = Math.max(Math.abs(value), Math.abs(other ?? 0));
    const scale = scaled[unit]?.find(({ below }) => size < below) ?? { factor: 1, unit };
    const shown = value * scale.factor;
    const apart = other === undefined ? Infinity : Math.abs(value - other) * scale.factor;
    const usual = Math.abs(size * scale.factor) >= 100 ? 0 : Math.abs(size * scale.factor) >= 20 ? 1 : 2;
    const digits = [usual, usual + 1, usual + 2].find((n) => apart >= 10 ** -n) ?? usual + 2;
    const number = new Intl.NumberFormat(locale, { minimumFractionDigits: digits, maximumFractionDigits: digits });
    return { number: number.format(shown), unit: scale.unit };
  };
}
