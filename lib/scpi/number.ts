/** SCPI-1999 volume 1, 7.2.1.4 and 7.2.1.5: how infinity and not-a-number travel. */
const infinity = 9.9e37;
const notANumber = 9.91e37;

const decimal = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const nonDecimal = /^#([BQH])([0-9A-F]+)$/i;
const radixOf: Record<string, number> = { B: 2, Q: 8, H: 16 };

/**
 * Reads one IEEE 488.2 numeric item: NR1, NR2, NR3 or non-decimal (#B #Q #H). 9.9E37 is infinite and 9.91E37 NaN;
 * null when the text is no single number.
 */
export function parseScpiNumber(text: string): number | null {
  const trimmed = text.trim();
  if (decimal.test(trimmed)) {
    const value = Number(trimmed);
    if (value === notANumber) return NaN;
    if (Math.abs(value) >= infinity) return value > 0 ? Infinity : -Infinity;
    return value === 0 ? 0 : value;
  }
  const match = nonDecimal.exec(trimmed);
  if (!match) return null;
  const digits = match[2]!.toUpperCase();
  const radix = radixOf[match[1]!.toUpperCase()]!;
  return [...digits].every((digit) => parseInt(digit, 16) < radix) ? parseInt(digits, radix) : null;
}

/** NR2: fixed decimals, as a programming command carries them. */
export function formatNr2(value: number, decimals: number): string {
  return value.toFixed(decimals);
}

/** NR3: sign, mantissa with `digits` decimals, signed exponent of two digits. */
export function formatNr3(value: number, digits: number): string {
  if (Number.isNaN(value)) return '+9.91000000E+37';
  if (!Number.isFinite(value)) return value > 0 ? '+9.90000000E+37' : '-9.90000000E+37';
  const text = value.toExponential(digits);
  const split = text.indexOf('e');
  const exponent = text.slice(split + 2).padStart(2, '0');
  return `${value < 0 ? '' : '+'}${text.slice(0, split)}E${text[split + 1]}${exponent}`;
}

/** Boolean program data: ON, OFF or a number, where zero is off. */
export function parseScpiBoolean(text: string): boolean | null {
  const word = text.trim().toUpperCase();
  if (word === 'ON') return true;
  if (word === 'OFF') return false;
  const value = parseScpiNumber(word);
  return value === null || Number.isNaN(value) ? null : Math.round(value) !== 0;
}
