/** Nelson's eight rules by their numbers. L. S. Nelson, Journal of Quality Technology 16 (1984); ISO 7870-2, annex. */
export type RunRule = 1 | 2 | 3 | 4 | 5 | 6 | 7 | 8;
export const runRules: readonly RunRule[] = [1, 2, 3, 4, 5, 6, 7, 8];

/** A rule broken. Places count from 0: `at` is the point that completes it, `from` where the run began. */
export interface RunSignal {
  rule: RunRule;
  from: number;
  at: number;
}

type Finder = (z: readonly number[], at: number) => number | null;

/** The place where an unbroken run that ends at `at` began, if it is at least `least` long. */
function unbroken(at: number, least: number, continues: (i: number) => boolean, begins: (i: number) => boolean) {
  if (!begins(at)) return null;
  let from = at;
  while (from > 0 && continues(from)) from--;
  return at - from + 1 >= least ? from : null;
}

/** `wanted` of the last `window` points beyond `zone` on the side of the newest, which is one of them. */
function ofWindow(z: readonly number[], at: number, wanted: number, window: number, zone: number): number | null {
  const side = Math.sign(z[at]!);
  let seen = 0;
  for (let i = at; i > at - window && i >= 0; i--) {
    if (z[i]! * side > zone) seen++;
    else if (i === at) return null;
    if (seen === wanted) return i;
  }
  return null;
}

const always = () => true;

const finders: Record<RunRule, Finder> = {
  1: (z, at) => (Math.abs(z[at]!) > 3 ? at : null),
  2: (z, at) =>
    unbroken(
      at,
      9,
      (i) => Math.sign(z[i - 1]!) === Math.sign(z[at]!),
      (i) => z[i] !== 0,
    ),
  3: (z, at) => steady(z, at),
  4: (z, at) => {
    const turns = (i: number) => i < 2 || Math.sign(z[i]! - z[i - 1]!) === -Math.sign(z[i - 1]! - z[i - 2]!);
    return unbroken(at, 14, (i) => z[i] !== z[i - 1] && (i === at || turns(i + 1)), always);
  },
  5: (z, at) => ofWindow(z, at, 2, 3, 2),
  6: (z, at) => ofWindow(z, at, 4, 5, 1),
  7: (z, at) => {
    const inside = (i: number) => Math.abs(z[i]!) < 1;
    return unbroken(at, 15, (i) => inside(i - 1), inside);
  },
  8: (z, at) => {
    const outside = (i: number) => Math.abs(z[i]!) > 1;
    const from = unbroken(at, 8, (i) => outside(i - 1), outside);
    if (from === null) return null;
    const run = z.slice(at - 7, at + 1);
    return run.some((v) => v > 0) && run.some((v) => v < 0) ? from : null;
  },
};

function steady(z: readonly number[], at: number): number | null {
  const direction = at > 0 ? Math.sign(z[at]! - z[at - 1]!) : 0;
  if (direction === 0) return null;
  return unbroken(at, 6, (i) => Math.sign(z[i]! - z[i - 1]!) === direction, always);
}

/**
 * Every point at which one of the chosen `rules` is broken, in order of points and rules. `z` are the values in time order
 * in standard deviations from the frozen centre. A point on a zone line is not beyond it; a point on the centre line, and
 * an equal neighbour in rules 3 and 4, breaks the run; rules 5 and 6 signal only at a point that is itself beyond.
 *
 * 1 one point beyond 3 sigma · 2 nine on one side · 3 six rising or falling · 4 fourteen alternating · 5 two of three beyond
 * 2 sigma on one side · 6 four of five beyond 1 sigma on one side · 7 fifteen within 1 sigma · 8 eight beyond 1 sigma, on
 * both sides.
 */
export function runSignals(z: readonly number[], rules: Iterable<RunRule> = runRules): RunSignal[] {
  const chosen = [...new Set(rules)].sort();
  return z.flatMap((_, at) => chosen.flatMap((rule) => signalAt(z, at, rule) ?? []));
}

/** Whether `rule` is broken at the point `at`; later points do not matter. */
export function signalAt(z: readonly number[], at: number, rule: RunRule): RunSignal | null {
  const from = finders[rule](z, at);
  return from === null ? null : { rule, from, at };
}
