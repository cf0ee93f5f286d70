import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatNr2, formatNr3, parseScpiBoolean, parseScpiNumber } from '@/lib/scpi/number';

describe('parseScpiNumber', () => {
  it('reads back what formatNr3 wrote, within the digits written', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e30, max: 1e30 }), (value) => {
        const back = parseScpiNumber(formatNr3(value, 8))!;
        expect(Math.abs(back - value)).toBeLessThanOrEqual(Math.abs(value) * 1e-8);
      }),
    );
  });

  it('returns null for what is no single number', () => {
    for (const text of [
      '',
      ' ',
      '+',
      '.',
      '1.2.3',
      '12,0.0',
      '1e',
      'E5',
      '0x10',
      '#H',
      '#B12',
      '#Q8',
      '#X1',
      '1 2',
      'NaN',
      'Infinity',
    ])
      expect(parseScpiNumber(text), text).toBeNull();
  });
});

describe('formatNr3', () => {
  it('signs mantissa and exponent and gives the exponent two digits', () => {
    expect(formatNr3(9.012, 4)).toBe('+9.0120E+00');
    expect(formatNr3(-0.00125, 2)).toBe('-1.25E-03');
    expect(formatNr3(0, 1)).toBe('+0.0E+00');
  });

  it('sends infinities and not-a-number as SCPI does', () => {
    expect(parseScpiNumber(formatNr3(Infinity, 8))).toBe(Infinity);
    expect(parseScpiNumber(formatNr3(-Infinity, 8))).toBe(-Infinity);
    expect(parseScpiNumber(formatNr3(NaN, 8))).toBeNaN();
  });
});

describe('formatNr2', () => {
  it('never uses an exponent', () => {
    expect(formatNr2(0.0000004, 4)).toBe('0.0000');
    expect(formatNr2(12.34567, 3)).toBe('12.346');
  });
});

describe('parseScpiBoolean', () => {
  it('takes words and numbers', () => {
    expect(['ON', 'off', '1', '0', '2.6', '0.4'].map(parseScpiBoolean)).toEqual([
      true,
      false,
      true,
      false,
      true,
      false,
    ]);
    expect(parseScpiBoolean('YES')).toBeNull();
  });
});
