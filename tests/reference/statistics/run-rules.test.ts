import { describe, expect, it } from 'vitest';
import { runRules, runSignals } from '@/lib/statistics/charts/run-rules';
import reference from './run-rules.json';

// Own series, flagged by own R code under the definitions of Nelson (1984) that the file quotes; places there count from 1.
describe.each(reference.series)('run rules on $id', ({ z, flags }) => {
  it.each(runRules.map((rule) => [rule]))('rule %i signals at the listed points', (rule) => {
    const places = runSignals(z, [rule]).map(({ at }) => at + 1);
    expect(places).toEqual(flags[`r${rule}`]);
  });
  it('all together are the union, in order of points', () => {
    const all = runSignals(z);
    expect(all.map(({ at }) => at)).toEqual([...all.map(({ at }) => at)].sort((a, b) => a - b));
    expect(all).toHaveLength(runRules.reduce((sum, rule) => sum + flags[`r${rule}`].length, 0));
  });
});
