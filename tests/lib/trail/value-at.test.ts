import { expect, test } from 'vitest';
import { valueAt } from '@/lib/trail/value-at';

const changes = [
  {
    atIso: '2026-11-02T08:00:00.000Z',
    before: { stationId: 'one', note: 'a' },
    after: { stationId: 'two', note: 'a' },
  },
  { atIso: '2026-11-05T08:00:00.000Z', before: null, after: { calibrationId: 'x' } },
  { atIso: '2026-11-09T08:00:00.000Z', before: { stationId: 'two' }, after: { stationId: null } },
];
const at = (day: number) =>
  valueAt(changes, 'stationId', `2026-11-${String(day).padStart(2, '0')}T12:00:00.000Z`, null);

test('a field is what the last change before that moment made it', () => {
  expect(at(2)).toBe('two');
  expect(at(8)).toBe('two');
  expect(at(9)).toBeNull();
});

test('before its first change it is what that change found', () => {
  expect(at(1)).toBe('one');
});

test('without a change it is what it is now', () => {
  expect(valueAt(changes, 'fixture', '2026-11-01T00:00:00.000Z', 'F2')).toBe('F2');
});
