import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  microfaradsStyle,
  milliampsStyle,
  millisecondsStyle,
  offsetStyle,
  ohmsStyle,
  toleranceStyle,
  turnsStyle,
  voltsStyle,
} from '@/lib/board-type/quantity-styles';
import { readQuantity, writeQuantity } from '@/lib/board-type/quantity-text';

describe('reading a value as engineers type it', () => {
  test.each([
    ['12k', ohmsStyle, 12_000],
    ['4k7', ohmsStyle, 4_700],
    ['2R2', ohmsStyle, 2.2],
    ['100R', ohmsStyle, 100],
    ['1M5', ohmsStyle, 1_500_000],
    ['12.0 kΩ', ohmsStyle, 12_000],
    ['12 k\u2126', ohmsStyle, 12_000],
    ['4,7 kohm', ohmsStyle, 4_700],
    ['470', ohmsStyle, 470],
    ['1000 µF', microfaradsStyle, 0.001],
    ['1000 \u03bcF', microfaradsStyle, 0.001],
    ['470u', microfaradsStyle, 0.000_47],
    ['470', microfaradsStyle, 0.000_47],
    ['5.10 V', voltsStyle, 5.1],
    ['5,1', voltsStyle, 5.1],
    ['200 mV', voltsStyle, 0.2],
    ['5V1', voltsStyle, null],
    ['5.5 mA', milliampsStyle, 0.0055],
    ['5.5', milliampsStyle, 0.0055],
    ['10 ms', millisecondsStyle, 0.01],
    ['± 1 %', toleranceStyle, 0.01],
    ['+/-5%', toleranceStyle, 0.05],
    ['0.5', toleranceStyle, 0.005],
    ['± 5 mV', offsetStyle, 0.005],
    ['25 turns', turnsStyle, 25],
  ])('%s', (text, style, value) => {
    expect(readQuantity(text, style)).toMatchObject(value === null ? { ok: false } : { ok: true, value });
  });

  test.each([
    ['', voltsStyle, 'Enter a value.'],
    ['about ten', ohmsStyle, '“about ten” is not a value. Write it such as 4.7 kΩ.'],
    ['5 A', voltsStyle, '“5 A” is not in V. Write it such as 1.00 V.'],
    ['1 kΩ', toleranceStyle, '“1 kΩ” is not in per cent. Write it such as ± 1 %.'],
    ['1..5', voltsStyle, '“1..5” is not a value. Write it such as 1.00 V.'],
    ['Infinity', voltsStyle, '“Infinity” is not a value. Write it such as 1.00 V.'],
  ])('refuses %j with a sentence', (text, style, sentence) => {
    expect(readQuantity(text, style)).toEqual({ ok: false, sentence });
  });
});

describe('writing a value', () => {
  test.each([
    [105_000, ohmsStyle, '105 kΩ'],
    [4_700, ohmsStyle, '4.7 kΩ'],
    [180, ohmsStyle, '180 Ω'],
    [0, ohmsStyle, '0 Ω'],
    [5.1, voltsStyle, '5.10 V'],
    [10.725, voltsStyle, '10.725 V'],
    [0.001, microfaradsStyle, '1000 µF'],
    [0.0055, milliampsStyle, '5.5 mA'],
    [0.01, toleranceStyle, '± 1 %'],
    [0.0025, toleranceStyle, '± 0.25 %'],
  ])('%d is %s', (value, style, text) => {
    expect(writeQuantity(value, style)).toBe(text);
  });

  test('what is written reads back as the same value', () => {
    const styles = [ohmsStyle, voltsStyle, microfaradsStyle, milliampsStyle, toleranceStyle, turnsStyle];
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 999_999 }),
        fc.integer({ min: -3, max: 0 }),
        fc.constantFrom(...styles),
        (n, e, style) => {
          const value = Number(`${n}e${e + style.shownExponents.at(-1)!}`);
          const read = readQuantity(writeQuantity(value, style), style);
          expect(read.ok && Math.abs(read.value / value - 1)).toBeLessThan(1e-9);
        },
      ),
    );
  });
});
