import type { CertifiedValue } from '../contracts/certificate';
import { quantityWords } from '../messages/quantity-words';
import { inSpokenUnit } from '../messages/spoken-unit';
import { roundedTogether } from '../uncertainty/rounded-together';

/** A result as the certificate prints it; all numbers of a row in one unit, which `name` ends with. */
export interface ValueText {
  name: string;
  limits: string;
  /** With the same last digit as U. */
  value: string;
  /** Two significant digits. Empty: none is stated. */
  expanded: string;
  k: string;
}

const minus = (text: string) => text.replace('-', '\u2212');

/** A limit as the specification gives it: no digit is lost, and none fewer than people say. */
function limitText(value: number, digits: number): string {
  const decimals = String(Number(value.toFixed(6))).split('.')[1]?.length ?? 0;
  return minus(value.toFixed(Math.max(digits, decimals)));
}

export function valueText(of: CertifiedValue): ValueText {
  const { quantity, step, value, expandedUncertainty, coverageFactor, min, max } = of;
  const name =
    step ||
    (quantity === 'trip-volts' || quantity === 'release-volts'
      ? `${quantityWords[quantity]} point`
      : quantityWords[quantity]);
  if (quantity === 'operator-check')
    return { name, limits: 'yes', value: value > 0 ? 'yes' : 'no', expanded: '', k: '' };
  const { text, unit, scale, digits } = inSpokenUnit(quantity, value);
  const limit = (volts: number) => limitText(volts * scale, digits);
  const rounded = expandedUncertainty === null ? null : roundedTogether(value * scale, expandedUncertainty * scale);
  return {
    name: unit ? `${name}, ${unit}` : name,
    limits:
      min !== null && max !== null
        ? `${limit(min)}–${limit(max)}`
        : max !== null
          ? `≤ ${limit(max)}`
          : min !== null
            ? `≥ ${limit(min)}`
            : '–',
    value: rounded ? minus(rounded.value) : text,
    expanded: rounded?.expanded ?? '',
    k: rounded && coverageFactor !== null ? coverageFactor.toFixed(2) : '',
  };
}

/** Results of a quantity in the order in which people look for them: the points first, the rest as measured. */
export function inReadingOrder<Value extends Pick<CertifiedValue, 'quantity'>>(values: readonly Value[]): Value[] {
  const first = ['trip-volts', 'release-volts', 'hysteresis-volts'];
  const rank = ({ quantity }: Value) => (first.includes(quantity) ? first.indexOf(quantity) : first.length);
  return [...values].sort((a, b) => rank(a) - rank(b));
}
