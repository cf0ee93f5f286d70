import { expect, test } from 'vitest';
import { lastOfEach } from '@/components/desk/units/measured-table';
import type { UnitMeasurement } from '@/lib/contracts/unit-page';

const measured = (n: number, quantity: UnitMeasurement['quantity'], step: string): UnitMeasurement => ({
  n,
  quantity,
  step,
  phase: 'check',
  value: n,
  standardUncertainty: null,
  expandedUncertainty: null,
  min: null,
  max: null,
  guardedMin: null,
  guardedMax: null,
  passed: true,
  settles: null,
});

test('a quantity shows its last value, but channels and drifts the last of each step', () => {
  const rows = lastOfEach([
    measured(0, 'channel-volts', 'output at rest'),
    measured(1, 'trip-volts', 'step 4'),
    measured(2, 'channel-volts', 'step 9'),
    measured(3, 'trip-volts', 'step 7'),
    measured(4, 'channel-volts', 'output at rest'),
  ]);
  expect(rows.map(({ n, quantity }) => [n, quantity])).toEqual([
    [3, 'trip-volts'],
    [2, 'channel-volts'],
    [4, 'channel-volts'],
  ]);
});
