import { quantityLooks, valueText } from '@/components/charts/quality/quantity-look';
import type { LotReview } from '@/lib/contracts/lot-review';
import { probabilityText } from './probability-text';

const doubtBelow = 0.05;

const upperFirst = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** What the analysis of variance says of the groups, in a sentence. */
export function comparisonWords({ comparison, factors, quantity }: LotReview): string {
  const { result, groups, factor } = comparison;
  const what = factors.find(({ value }) => value === factor)?.label ?? 'groups';
  if (groups.length === 0) return `No measured board can be compared by ${what}.`;
  if (groups.length === 1) return `All ${groups[0]!.boards} measured boards are of one group, ${groups[0]!.label}.`;
  if (result.kind === 'tooFew') return 'There are too few boards to compare.';
  if (result.kind === 'noSpread') return 'The values show no spread within the groups, so they cannot be compared.';
  const test = `F(${result.degreesBetween}, ${result.degreesWithin}) = ${result.f.toFixed(2)}, ${probabilityText(result.p)}`;
  if (result.p >= doubtBelow) return `No difference between ${what} is seen: ${test}.`;
  const means = groups.map((group) => group.mean);
  const apart = Math.max(...means) - Math.min(...means);
  const { unit } = quantityLooks[quantity];
  return `${upperFirst(what)} differ: ${test}. Their means lie up to ${valueText(quantity, apart)} ${unit} apart and explain ${Math.round(result.rSquared * 100)} % of the spread.`;
}
