import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { roundedTogether } from '@/lib/uncertainty/rounded-together';

describe('rounding by uncertainty', () => {
  it.each([
    [10.80127, 0.00243, '10.8013', '0.0024'],
    [10.80127, 0.0996, '10.80', '0.10'],
    [10.80127, 0.00996, '10.801', '0.010'],
    [10.80127, 1, '10.8', '1.0'],
    [1234.5, 123, '1230', '120'],
    [1234.5, 99.6, '1230', '100'],
    [0, 0.05, '0.000', '0.050'],
    [-5.4703, 0.05, '-5.470', '0.050'],
  ])('%d ± %d is %s ± %s', (value, expanded, ofValue, ofExpanded) => {
    expect(roundedTogether(value, expanded)).toMatchObject({ value: ofValue, expanded: ofExpanded });
  });
  it('has no answer without an uncertainty', () => {
    for (const bad of [0, -1, NaN, Infinity]) expect(roundedTogether(1, bad)).toBeNull();
    expect(roundedTogether(NaN, 1)).toBeNull();
  });
  it('moves U by at most 5 % and the value by at most half a last digit', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -100, max: 100, noNaN: true }),
        fc.double({ min: 1e-7, max: 100, noNaN: true }),
        (value, expanded) => {
          const rounded = roundedTogether(value, expanded)!;
          expect(Math.abs(Number(rounded.expanded) / expanded - 1)).toBeLessThan(0.0501);
          expect(Math.abs(Number(rounded.value) - value)).toBeLessThanOrEqual(
            0.5 * 10 ** -rounded.place * (1 + 1e-6) + 1e-12,
          );
        },
      ),
    );
  });
});
