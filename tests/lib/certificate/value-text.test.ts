import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { inReadingOrder, valueText } from '@/lib/certificate/value-text';
import type { CertifiedValue } from '@/lib/contracts/certificate';

const trip: CertifiedValue = {
  quantity: 'trip-volts',
  step: '',
  value: 10.81234,
  expandedUncertainty: 0.0024,
  coverageFactor: 2.0134,
  min: 10.7,
  max: 10.9,
  passed: true,
};

describe('a result on a certificate', () => {
  // JCGM 100:2008, 7.2.6: U with two digits, the value to the same last place.
  test.each([
    [0.0024, '10.8123', '0.0024'],
    [0.024, '10.812', '0.024'],
    [0.0996, '10.81', '0.10'],
    [0.00996, '10.812', '0.010'],
  ])('with U = %f ends at the last digit of U', (expandedUncertainty, value, expanded) => {
    expect(valueText({ ...trip, expandedUncertainty })).toEqual({
      name: 'Trip point, V',
      limits: '10.70–10.90',
      value,
      expanded,
      k: '2.01',
    });
  });

  test('value and U always have equally many decimals', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 50, noNaN: true }),
        fc.double({ min: 1e-6, max: 5, noNaN: true }),
        (value, expandedUncertainty) => {
          const text = valueText({ ...trip, value, expandedUncertainty });
          const decimals = (number: string) => number.split('.')[1]?.length ?? 0;
          expect(decimals(text.value)).toBe(decimals(text.expanded));
        },
      ),
    );
  });

  test('loses no digit of a limit, and turns amperes and seconds into what people say', () => {
    expect(valueText({ ...trip, min: 10.705, max: null }).limits).toBe('≥ 10.705');
    const amps = { ...trip, quantity: 'quiescent-amps', value: 0.00557, min: null, max: 0.009 } as const;
    expect(valueText({ ...amps, expandedUncertainty: 0.00002 })).toMatchObject({
      name: 'Quiescent current, mA',
      limits: '≤ 9.00',
      value: '5.570',
      expanded: '0.020',
    });
  });

  test('without U is written as on the screens, with neither U nor k', () => {
    expect(valueText({ ...trip, expandedUncertainty: null })).toMatchObject({ value: '10.81', expanded: '', k: '' });
  });

  test('is called what the sequence calls its step', () => {
    expect(valueText({ ...trip, quantity: 'channel-volts', step: 'Gate drive' }).name).toBe('Gate drive, V');
  });
});

test('trip, release and hysteresis come first, the rest as measured', () => {
  const order = (
    ['reference-volts', 'hysteresis-volts', 'release-volts', 'contact-milliohms', 'trip-volts'] as const
  ).map((quantity) => ({ quantity }));
  expect(inReadingOrder(order).map(({ quantity }) => quantity)).toEqual([
    'trip-volts',
    'release-volts',
    'hysteresis-volts',
    'reference-volts',
    'contact-milliohms',
  ]);
});
