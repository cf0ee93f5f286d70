import { describe, expect, it } from 'vitest';
import { preferredNear } from '@/lib/circuit/preferred-values';

/**
 * IEC 60063. E24 from memory of the standard's table (eight of its values are not the rounded geometric step); E96 is
 * 100 * 10^(i/96) rounded, here in full. Nearest by ratio, computed in Python 3.11.
 */
const e24 = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91];
const e96 = [
  100, 102, 105, 107, 110, 113, 115, 118, 121, 124, 127, 130, 133, 137, 140, 143, 147, 150, 154, 158, 162, 165, 169,
  174, 178, 182, 187, 191, 196, 200, 205, 210, 215, 221, 226, 232, 237, 243, 249, 255, 261, 267, 274, 280, 287, 294,
  301, 309, 316, 324, 332, 340, 348, 357, 365, 374, 383, 392, 402, 412, 422, 432, 442, 453, 464, 475, 487, 499, 511,
  523, 536, 549, 562, 576, 590, 604, 619, 634, 649, 665, 681, 698, 715, 732, 750, 768, 787, 806, 825, 845, 866, 887,
  909, 931, 953, 976,
];

describe('preferred values', () => {
  it('E24 and E96 hold the values of IEC 60063', () => {
    for (const value of e24) expect(preferredNear(value * 1000, 'E24', 1)).toEqual([value * 1000]);
    for (const value of e96) expect(preferredNear(value * 100, 'E96', 1)).toEqual([value * 100]);
  });

  it.each([
    [57_139.8, 56_000, 57_600],
    [129_737, 130_000, 130_000],
    [24_794.1, 24_000, 24_900],
    [336_478, 330_000, 340_000],
  ])('nearest to %d', (value, inE24, inE96) => {
    expect(preferredNear(value, 'E24', 1)).toEqual([inE24]);
    expect(preferredNear(value, 'E96', 1)).toEqual([inE96]);
  });

  it('gives neighbours nearest first', () => {
    expect(preferredNear(10_000, 'E24', 5)).toEqual([10_000, 9100, 11_000, 12_000, 8200].sort(byRatio(10_000)));
  });
});

const byRatio = (value: number) => (a: number, b: number) =>
  Math.abs(Math.log(a / value)) - Math.abs(Math.log(b / value));
