import { expect, test } from 'vitest';
import { takeRequest, type RequestCounts } from '@/lib/access/request-limit';

test('an address may ask so often a minute, and again in the next', () => {
  const counts: RequestCounts = new Map();
  expect([0, 1, 2, 3].map((second) => takeRequest(counts, 'a', second * 1_000, 3))).toEqual([true, true, true, false]);
  expect(takeRequest(counts, 'b', 3_000, 3)).toBe(true);
  expect(takeRequest(counts, 'a', 60_000, 3)).toBe(true);
});

test('addresses are forgotten after their minute once there are many, and no more are kept', () => {
  const counts: RequestCounts = new Map();
  for (let i = 0; i < 10_000; i++) takeRequest(counts, `old ${i}`, 0, 3);
  expect(takeRequest(counts, 'new', 59_000, 3)).toBe(false);
  expect(takeRequest(counts, 'new', 61_000, 3)).toBe(true);
  expect(counts.size).toBe(1);
});
