import type { ComparedGroup } from '../contracts/lot-review';
import { oneWayAnova, type OneWayResult } from '../statistics/anova/one-way';
import { meanOf, standardDeviation } from '../statistics/summary/moments';

/**
 * Values of the boards by group, in the groups' first order of appearance unless they are numbers; boards without a value or a
 * group are in none. `group` gives each board's place in `groups`, -1 in none.
 */
export function compareGroups(
  values: readonly (number | null)[],
  labels: readonly (string | null)[],
): { groups: ComparedGroup[]; group: number[]; result: OneWayResult } {
  const members = new Map<string, number[]>();
  labels.forEach((label, i) => {
    const value = values[i];
    if (label === null || value === null || value === undefined) return;
    const list = members.get(label);
    if (list) list.push(value);
    else members.set(label, [value]);
  });
  const names = [...members.keys()].sort((a, b) => a.localeCompare(b, 'en', { numeric: true }));
  const placeOf = new Map(names.map((name, i) => [name, i]));
  const lists = names.map((name) => members.get(name)!);
  return {
    groups: lists.map((list, i) => ({
      label: names[i]!,
      boards: list.length,
      mean: meanOf(list),
      deviation: standardDeviation(list),
    })),
    group: labels.map((label, i) => (label === null || values[i] === null ? -1 : (placeOf.get(label) ?? -1))),
    result: oneWayAnova(lists),
  };
}
