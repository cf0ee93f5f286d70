import { describe, expect, it } from 'vitest';
import { encodeCode128 } from '@/lib/barcode/code128';
import reference from './code128.json';
import { symbolWidths } from './code128-symbols';

/** Symbol values of a bit string, the stop left out; -1 for a symbol that does not exist. */
function valuesOf(bits: string): number[] {
  const runs = (bits.match(/1+|0+/g) ?? []).map((run) => run.length).join('');
  expect(runs.slice(-7)).toBe('2331112');
  return (runs.slice(0, -7).match(/.{6}/g) ?? []).map((widths) => symbolWidths.indexOf(widths));
}

const checkOf = (values: number[]) => values.reduce((sum, value, i) => sum + value * Math.max(i, 1), 0) % 103;

it('has 106 distinct symbols of 11 modules in its table', () => {
  expect(new Set(symbolWidths).size).toBe(106);
  for (const widths of symbolWidths) expect([...widths].reduce((sum, w) => sum + Number(w), 0)).toBe(11);
});

// Source: codes.json of the project's reference figures; see `source` in code128.json.
describe.each(reference.items)('Code 128 of $text', ({ text, setBValues, setBWidths, shortestValues }) => {
  const bits = encodeCode128(text)!.bits;
  const values = valuesOf(bits);

  it('ends with the check symbol of ISO/IEC 15417', () => {
    expect(values.at(-1)).toBe(checkOf(values.slice(0, -1)));
    expect(checkOf(setBValues.slice(0, -1))).toBe(setBValues.at(-1));
  });

  it('needs as few symbols as the shortest encoding known', () => {
    expect(values).toHaveLength(shortestValues.length);
  });

  it('has the published symbols', () => {
    // After a run of pairs either set A or set B may follow, with another shift and check symbol but the same length.
    const usesSetA = values.includes(101);
    if (usesSetA)
      expect(values.filter((value) => value !== 101).slice(0, -1)).toEqual(
        shortestValues.filter((v) => v !== 100).slice(0, -1),
      );
    else expect(values).toEqual(shortestValues);
  });

  it('draws the published widths where no pairs are used', () => {
    const widths = (bits.match(/1+|0+/g) ?? []).map((run) => run.length).join('');
    if (shortestValues.every((value, i) => value === setBValues[i])) expect(widths).toBe(setBWidths.join(''));
    else expect(widths.length).toBeLessThan(setBWidths.join('').length);
  });
});
