import { signalAt, type RunRule, type RunSignal } from './run-rules';

/** Hold when `rule` signals at `times` points among `within` successive boards. */
export interface HoldRule {
  rule: RunRule;
  times: number;
  within: number;
}

/** Rule 1 twice in ten boards, and rule 2: all eight would stop nearly every stable lot of 240 boards. */
export const usualHoldRules: readonly HoldRule[] = [
  { rule: 1, times: 2, within: 10 },
  { rule: 2, times: 1, within: 1 },
];

/** A hold raised at the board `at` (from 0) by the signals from `from` on. */
export interface HoldCause {
  holdRule: HoldRule;
  from: number;
  at: number;
}

/**
 * The first board at which one of `holdRules` would hold the lot; null when none does. `z` are the values in time order in
 * standard deviations from the frozen centre, from the last release on: a released hold begins afresh.
 */
export function firstHold(z: readonly number[], holdRules: readonly HoldRule[] = usualHoldRules): HoldCause | null {
  const seen = holdRules.map((): RunSignal[] => []);
  for (let at = 0; at < z.length; at++) {
    for (const [i, holdRule] of holdRules.entries()) {
      const signal = signalAt(z, at, holdRule.rule);
      if (!signal) continue;
      seen[i]!.push(signal);
      const first = seen[i]!.at(-holdRule.times);
      if (first && at - first.at < holdRule.within) return { holdRule, from: first.from, at };
    }
  }
  return null;
}
