import { normalQuantile } from '../distributions/normal-quantile';
import { wilson } from '../proportions/wilson';
import type { ShareInterval } from '../proportions/interval';
import { firstHold, type HoldRule } from './hold-rules';
import { individualsBaseline, standardised } from './individuals';

export interface FalseHoldQuestion {
  boardsPerLot: number;
  holdRules: readonly HoldRule[];
  /** Boards that the frozen limits were estimated from; null for limits known exactly. Few boards make more false holds. */
  baselineBoards: number | null;
  /** Simulated lots; 2,000 give the expected number to about 0.03. */
  lots: number;
  /** Uniform in [0, 1); the same numbers give the same answer. */
  uniform: () => number;
}

export interface FalseHolds {
  /** Mean number of holds in a stable lot, each released and begun afresh, and the standard error of this simulation. */
  holdsPerLot: number;
  standardError: number;
  /** Share of stable lots held at least once, with its 95 % interval. */
  lotsHeld: ShareInterval & { share: number };
}

/** What the chosen hold rules cost where nothing is wrong: simulation of stable lots of independent normal values. */
export function falseHolds(question: FalseHoldQuestion): FalseHolds {
  const counts = Array.from({ length: question.lots }, () => holdsIn(stableLot(question), question.holdRules));
  const total = counts.reduce((sum, n) => sum + n, 0);
  const mean = total / question.lots;
  const squares = counts.reduce((sum, n) => sum + (n - mean) ** 2, 0);
  const held = counts.filter((n) => n > 0).length;
  return {
    holdsPerLot: mean,
    standardError: Math.sqrt(squares / (question.lots - 1) / question.lots),
    lotsHeld: { share: held / question.lots, ...wilson(held, question.lots) },
  };
}

function holdsIn(z: readonly number[], holdRules: readonly HoldRule[]): number {
  let holds = 0;
  let rest = z;
  for (let hold = firstHold(rest, holdRules); hold; hold = firstHold(rest, holdRules)) {
    holds++;
    rest = rest.slice(hold.at + 1);
  }
  return holds;
}

function stableLot({ boardsPerLot, baselineBoards, uniform }: FalseHoldQuestion): number[] {
  const draw = (n: number) => Array.from({ length: n }, () => normalQuantile(uniform() || 2 ** -33));
  const values = draw(boardsPerLot);
  if (baselineBoards === null) return values;
  const baseline = individualsBaseline(draw(baselineBoards));
  if (baseline.kind !== 'found') throw new RangeError(`A baseline of ${baselineBoards} boards gives no limits.`);
  return standardised(values, baseline);
}
