import { inSpokenUnit } from '@/lib/messages/spoken-unit';

export { inSpokenUnit };

/** Counts with a thin gap between thousands, as the design writes them: 1 360. */
export const count = (value: number) => value.toLocaleString('en-GB').replaceAll(',', '\u202f');

/** 0.896 is "89.6 %". Null: a dash. */
export const percent = (share: number | null) => (share === null ? '–' : `${(share * 100).toFixed(1)} %`);

export const volts = (value: number) => value.toFixed(2);

const rounded = (value: number, digits: number) => value.toFixed(digits).replace('-', '\u2212');

/** "10.70–10.90", "≤ 0.50", "≥ 10", or "–" without limits; the stored unit turned into the spoken one. */
export function limitsText(quantity: string, min: number | null, max: number | null): string {
  const text = (value: number) => inSpokenUnit(quantity, value).text;
  if (min !== null && max !== null) return `${text(min)}–${text(max)}`;
  if (max !== null) return `≤ ${text(max)}`;
  return min === null ? '–' : `≥ ${text(min)}`;
}

/** A capability index: 0.93, with the minus sign of the design. */
export const index = (value: number) => rounded(value, 2);
