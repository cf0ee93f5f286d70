import { describe, expect, it } from 'vitest';
import { batchAt } from '@/lib/quality/batch-at';
import { comparisonFactors, labelReader } from '@/lib/quality/comparison-factors';
import { compareGroups } from '@/lib/quality/compare-groups';
import { operatorLetters } from '@/lib/quality/operator-labels';
import { shiftHourReader } from '@/lib/quality/shift-hour';
import strd from '../../reference/statistics/nist-strd.json';
import { board } from './boards';

const utc = (iso: string) => new Date(`${iso}Z`);

// NIST StRD, one-way analysis of variance; see the file for the source of each set.
describe.each(strd.anova)('comparing groups of $dataset', ({ y, group, certified }) => {
  it('finds the certified F', () => {
    const { result, groups } = compareGroups(y, group.map(String));
    expect(groups.reduce((sum, each) => sum + each.boards, 0)).toBe(y.length);
    if (result.kind !== 'found') throw new Error(result.kind);
    // The hardest set has thirteen constant digits, of which a double keeps few.
    expect(result.f / certified.F).toBeCloseTo(1, 3);
  });
});

describe('comparing groups', () => {
  it('leaves out boards without a value or a group, and says so board by board', () => {
    const { groups, group } = compareGroups([1, null, 3, 4], ['S2', 'S2', 'S1', null]);
    expect(groups.map(({ label, boards, mean }) => [label, boards, mean])).toEqual([
      ['S1', 1, 3],
      ['S2', 1, 1],
    ]);
    expect(group).toEqual([1, -1, 0, -1]);
  });

  it('orders hours as numbers', () => {
    expect(compareGroups([1, 2, 3], ['10', '9', '1']).groups.map(({ label }) => label)).toEqual(['1', '9', '10']);
  });
});

describe('what boards are compared by', () => {
  const batches = [
    { component: 'RV1 trimmer', batch: 'T-1', fromAt: utc('2026-11-30T06:00') },
    { component: 'D1 reference', batch: 'Z-1', fromAt: utc('2026-11-30T06:00') },
    { component: 'RV1 trimmer', batch: 'T-2', fromAt: utc('2026-11-30T12:00') },
  ];

  it('is the station, the operator, the hour, and every component with a batch', () => {
    expect(comparisonFactors(batches).map(({ value }) => value)).toEqual([
      'station',
      'operator',
      'hour',
      'batch:D1 reference',
      'batch:RV1 trimmer',
    ]);
  });

  it('takes the batch in force when the board was tested', () => {
    expect(batchAt(batches, 'RV1 trimmer', utc('2026-11-30T05:00'))).toBeNull();
    const read = labelReader('batch:RV1 trimmer', batches, { timeZone: 'UTC', shiftStarts: [] });
    expect(read(board({ startedAt: utc('2026-11-30T11:59') }))).toBe('T-1');
    expect(read(board({ startedAt: utc('2026-11-30T12:00') }))).toBe('T-2');
  });

  it('calls operators by letters in order of appearance, past Z too', () => {
    const letters = operatorLetters(['x', 'y', 'x', ...Array.from({ length: 30 }, (_, i) => `p${i}`)]);
    expect(letters.get('x')).toBe('A');
    expect(letters.get('y')).toBe('B');
    expect(letters.get('p24')).toBe('AA');
  });
});

describe('the hour of the shift', () => {
  it('counts from the beginning of the shift, on the clocks of the site', () => {
    const read = shiftHourReader('Europe/London', ['06:00', '14:00', '22:00']);
    expect(read(utc('2026-11-30T06:00'))).toBe(1);
    expect(read(utc('2026-11-30T13:59'))).toBe(8);
    // British Summer Time is an hour ahead of UTC.
    expect(read(utc('2026-06-30T05:30'))).toBe(1);
  });

  it('goes on after midnight, and counts from midnight without shifts', () => {
    expect(shiftHourReader('UTC', ['22:00'])(utc('2026-11-30T01:15'))).toBe(4);
    expect(shiftHourReader('UTC', [])(utc('2026-11-30T01:15'))).toBe(2);
  });
});
