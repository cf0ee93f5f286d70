import type { SequenceComparison, StepComparison } from './compare-sequences';
import { stepWord } from './value-words';

/** What differs, a sentence a step, for histories and the trail. */
export function changeSentences({ steps, rule }: SequenceComparison): string[] {
  const said = steps.filter(({ changed }) => changed).map(stepSentence);
  return rule ? [...said, `Decision rule: ${rule.from} is now ${rule.to}.`] : said;
}

function stepSentence({ before, after, placeBefore, placeAfter, moved, switched, renamed, values }: StepComparison) {
  if (!before) return `Step ${placeAfter}, ${stepWord(after!)}, is new.`;
  if (!after) return `Step ${placeBefore}, ${stepWord(before)}, is removed.`;
  const parts = [
    ...(renamed ? [`named ${stepWord(after)}, before ${stepWord(before)}`] : []),
    ...(switched ? [`switched ${switched}`] : []),
    ...(moved ? [`moved from place ${placeBefore}`] : []),
    ...values.map(({ label, from, to }) => `${lowered(label)} ${from} is now ${to}`),
  ];
  return `Step ${placeAfter}, ${stepWord(after)}: ${parts.join('; ')}.`;
}

const lowered = (label: string) => label.charAt(0).toLowerCase() + label.slice(1);
