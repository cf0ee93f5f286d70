import type { RunStretch } from '../contracts/lot-review';
import { runRules, type RunRule, type RunSignal } from '../statistics/charts/run-rules';

/** How often each rule is broken. */
export function countBroken(signals: readonly RunSignal[]): Record<RunRule, number> {
  const counts = Object.fromEntries(runRules.map((rule) => [rule, 0])) as Record<RunRule, number>;
  for (const { rule } of signals) counts[rule]++;
  return counts;
}

/**
 * Signals of one rule that overlap, on the same side, joined to one stretch, so that a run of twenty is told once and not
 * twelve times. `z` are the standardised values, `places` where they stand in test order, from 0. Sorted by first board.
 */
export function runStretches(
  signals: readonly RunSignal[],
  z: readonly number[],
  places: readonly number[],
): RunStretch[] {
  const joined: (RunSignal & { side: RunStretch['side']; direction: RunStretch['direction'] })[] = [];
  const last = new Map<RunRule, (typeof joined)[number]>();
  for (const signal of signals) {
    const side = sideOf(signal, z);
    const direction: RunStretch['direction'] =
      signal.rule === 3 ? (z[signal.at]! > z[signal.at - 1]! ? 'rising' : 'falling') : null;
    const before = last.get(signal.rule);
    // Single points beyond a limit stay single.
    if (
      before &&
      signal.rule !== 1 &&
      signal.from <= before.at &&
      side === before.side &&
      direction === before.direction
    )
      before.at = signal.at;
    else {
      const begun = { ...signal, side, direction };
      joined.push(begun);
      last.set(signal.rule, begun);
    }
  }
  return joined
    .sort((a, b) => a.from - b.from || a.rule - b.rule)
    .map(({ rule, from, at, side, direction }) => ({
      rule,
      from: places[from]! + 1,
      to: places[at]! + 1,
      boards: at - from + 1,
      side,
      direction,
    }));
}

function sideOf({ rule, at }: RunSignal, z: readonly number[]): RunStretch['side'] {
  if (rule === 1 || rule === 2 || rule === 5 || rule === 6) return z[at]! > 0 ? 'above' : 'below';
  return null;
}
