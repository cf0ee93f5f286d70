/** How a value is written in a field: stored in the base unit, read and shown with the prefixes that engineers use. */
export interface QuantityStyle {
  /** Base unit: Ω, V, A, F, s, turns … */
  unit: string;
  /** Power of ten that a bare number stands for: -6 where "470" means 470 µF. */
  bareExponent: number;
  /** Powers of ten in which it is shown, largest first. */
  shownExponents: readonly number[];
  /** Places that are always shown: 2 gives "5.10 V". */
  leastDecimals?: number;
  /** In front: "± ". */
  lead?: string;
}

const prefixes: Record<string, number> = { p: -12, n: -9, u: -6, µ: -6, m: -3, k: 3, K: 3, M: 6, G: 9 };
const shownPrefix: Record<number, string> = { [-9]: 'n', [-6]: 'µ', [-3]: 'm', 0: '', 3: 'k', 6: 'M' };
/** Ways to write a unit, beside the sign itself. */
const unitWords: Record<string, readonly string[]> = {
  Ω: ['Ω', 'ohm', 'ohms', 'R'],
  s: ['s', 'sec'],
  turns: ['turns', 'turn'],
  '°': ['°', 'deg', 'degrees', 'degree'],
};

export type QuantityReading = { ok: true; value: number } | { ok: false; sentence: string };

/**
 * Reads "12k", "4k7", "2R2", "1000 µF", "5.10 V", "5,1 V" or "± 1 %" as a number of base units. A bare number counts in the
 * field's usual unit. Another unit than the field's is refused.
 */
export function readQuantity(text: string, style: QuantityStyle): QuantityReading {
  const typed = text
    .normalize('NFKC')
    .replaceAll('\u03bc', 'µ')
    .replace(/^\s*(±|\+\/?-)/, '')
    .trim();
  if (typed === '') return { ok: false, sentence: 'Enter a value.' };
  const infix = /^(\d+)([pnuµmkKMGR])(\d+)\s*(\D*)$/.exec(typed);
  const parts = infix
    ? { digits: `${infix[1]}.${infix[3]}`, rest: `${infix[2]}${infix[4]}` }
    : splitNumber(typed.replace(/^(-?\d*),(\d+)/, '$1.$2'));
  if (!parts) return { ok: false, sentence: `“${text.trim()}” is not a value. Write it such as ${example(style)}.` };
  const exponent = exponentOf(parts.rest.trim(), style);
  if (exponent === null)
    return {
      ok: false,
      sentence: `“${text.trim()}” is not in ${unitName(style)}. Write it such as ${example(style)}.`,
    };
  return { ok: true, value: Number(`${parts.digits}e${exponent}`) };
}

function splitNumber(typed: string): { digits: string; rest: string } | null {
  const match = /^(-?(?:\d+\.?\d*|\.\d+))\s*(\D*)$/.exec(typed);
  return match && { digits: match[1]!, rest: match[2]! };
}

/** Power of ten of what stands behind the number; null: another unit. */
function exponentOf(rest: string, { unit, bareExponent }: QuantityStyle): number | null {
  if (rest === '') return bareExponent;
  const words = unitWords[unit] ?? [unit];
  if (words.includes(rest)) return unit === '%' ? -2 : 0;
  if (unit === '%' || unit === 'turns' || unit === '°') return null;
  const prefix = prefixes[rest[0]!];
  const after = rest.slice(1).trim();
  return prefix !== undefined && (after === '' || words.includes(after)) ? prefix : null;
}

const unitName = ({ unit }: QuantityStyle) => (unit === '%' ? 'per cent' : unit);

function example(style: QuantityStyle): string {
  return writeQuantity(style.unit === 'Ω' ? 4_700 : 10 ** (style.unit === '%' ? -2 : style.bareExponent), style);
}

/** Writes a number of base units so that it can be read back as the same number: "4.7 kΩ", "5.10 V", "1000 µF", "± 1 %". */
export function writeQuantity(value: number, style: QuantityStyle): string {
  const { unit, shownExponents, leastDecimals = 0, lead = '' } = style;
  const exponent =
    unit === '%'
      ? -2
      : (shownExponents.find((each) => Math.abs(value) >= 10 ** each * (1 - 1e-12)) ?? shownExponents.at(-1)!);
  const scaled = Number((value / 10 ** exponent).toPrecision(12));
  const decimals = String(scaled).split('.')[1]?.length ?? 0;
  const number = scaled.toFixed(Math.max(leastDecimals, Math.min(decimals, 9)));
  return `${lead}${number} ${unit === '%' ? '%' : `${shownPrefix[exponent] ?? ''}${unit}`}`;
}
