import { expect, test } from 'vitest';
import { originAllowed } from '@/lib/access/origin';

const local = 'http://127.0.0.1:3000';
const plant = 'https://sillwright.example.com';

test.each([
  ['http://127.0.0.1:3000', local, true],
  ['http://localhost:3000', local, true],
  ['http://localhost:3001', local, false],
  ['https://localhost:3000', local, false],
  ['http://localhost.attacker.example:3000', local, false],
  ['https://sillwright.example.com', plant, true],
  ['https://sillwright.example.com:443', plant, true],
  ['http://sillwright.example.com', plant, false],
  ['https://other.example.com', plant, false],
  ['http://localhost:3000', plant, false],
  ['null', plant, false],
  ['', plant, false],
  [undefined, plant, false],
])('a page at %s may write at %s: %s', (origin, publicUrl, allowed) => {
  expect(originAllowed(origin, publicUrl)).toBe(allowed);
});
