import { expect, test } from 'vitest';
import { nextNumber, numberStem } from '@/lib/certificate/certificate-number';

test('a number is made of the lot, the last five of the serial number and the copy', () => {
  const stem = numberStem('2648-B', 'CB1210264800042');
  expect(nextNumber(stem, [])).toBe('2648-B-00042-1');
  expect(nextNumber(stem, ['2648-B-00042-1'])).toBe('2648-B-00042-2');
  expect(nextNumber(stem, ['2648-B-00042-9', '2648-B-00042-10'])).toBe('2648-B-00042-11');
  expect(numberStem('2648-B', null)).toBe('2648-B-LOT');
});

test('numbers of others that begin alike do not count', () => {
  expect(nextNumber('2648-B-00042', ['2648-B-00042-X-4', '2648-B-000421-7'])).toBe('2648-B-00042-1');
});
