import type { RunStretch } from '@/lib/contracts/lot-review';
import { stretchWords } from '@/lib/quality/run-words';

export interface RunBracket {
  stretch: RunStretch;
  left: number;
  right: number;
  /** Null: there is no room for the words; they stand in the list of broken rules. */
  words: { x: number; anchor: 'start' | 'end'; text: string } | null;
}

const charWidth = 7.6;
const gap = 8;

/** A bracket over every run, the first ones with their words beside it where they do not cover each other. */
export function runBrackets(
  stretches: readonly RunStretch[],
  x: (place: number) => number,
  [left, right]: readonly [number, number],
): RunBracket[] {
  const taken: [number, number][] = [];
  const free = (from: number, to: number) => from >= left && to <= right && taken.every(([a, b]) => to < a || from > b);
  const runs = stretches
    .filter(({ rule }) => rule !== 1)
    .map((stretch) => {
      const pitch = x(1) - x(0);
      const from = x(stretch.from - 1) - pitch / 2;
      const to = x(stretch.to - 1) + pitch / 2;
      return { stretch, left: Math.max(left, from), right: Math.min(right, to) };
    })
    .filter((run) => run.right > run.left);
  for (const run of runs) taken.push([run.left, run.right]);
  return runs.map((run) => {
    const text = lowerFirst(stretchWords(run.stretch));
    const width = text.length * charWidth;
    for (const anchor of ['end', 'start'] as const) {
      const from = anchor === 'end' ? run.left - gap - width : run.right + gap;
      if (!free(from, from + width)) continue;
      taken.push([from, from + width]);
      return { ...run, words: { x: anchor === 'end' ? run.left - gap : run.right + gap, anchor, text } };
    }
    return { ...run, words: null };
  });
}

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);
