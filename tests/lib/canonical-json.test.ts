import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { canonicalJson } from '@/lib/canonical-json';

describe('canonical JSON', () => {
  // RFC 8785, section 3.2.2 and 3.2.3: input and canonical form of the example.
  test('writes the example of RFC 8785 as the standard does', () => {
    const input = JSON.parse(
      '{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    ) as unknown;
    expect(canonicalJson(input)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  // RFC 8785, section 3.2.3: names sorted by UTF-16 code units.
  test('sorts names by their UTF-16 code units', () => {
    const names = ['\u20ac', '\r', '\ufb33', '1', '\ud83d\ude00', '\u0080', '\u00f6'];
    const sorted = JSON.parse(canonicalJson(Object.fromEntries(names.map((name) => [name, name])))) as object;
    expect(new Set(Object.keys(sorted))).toEqual(new Set(names));
    const order = [
      ...canonicalJson(Object.fromEntries(names.map((name) => [name, 0]))).matchAll(/"((?:[^"\\]|\\.)*)":/g),
    ];
    expect(order.map((match) => JSON.parse(`"${match[1]}"`) as string)).toEqual([
      '\r',
      '1',
      '\u0080',
      '\u00f6',
      '\u20ac',
      '\ud83d\ude00',
      '\ufb33',
    ]);
  });

  test('is the same whatever the order of members, and parses back to the same value', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const written = canonicalJson(value);
        expect(canonicalJson(JSON.parse(written))).toBe(written);
        expect(JSON.parse(written)).toEqual(JSON.parse(JSON.stringify(value)));
      }),
    );
  });

  test('refuses what JSON cannot hold', () => {
    expect(() => canonicalJson({ volts: NaN })).toThrow(RangeError);
  });
});
