import type { HoldDetail, HoldRuleSet } from '../contracts/lot-hold';
import type { RejectReason } from '../run/types';
import { firstHold, usualHoldRules } from '../statistics/charts/hold-rules';
import { standardised } from '../statistics/charts/individuals';
import { limitsOfFrozen, type FrozenFigures } from './frozen-baseline';

/** What holds a lot of a board type whose rules nobody has set. */
export const usualRuleSet: HoldRuleSet = {
  runRules: [...usualHoldRules],
  yieldFloor: null,
  sameReason: { times: 3 },
  failedCheck: true,
};

/** A first attempt with a verdict, in test order. */
export interface HoldBoard {
  /** Place in test order, from 1. */
  place: number;
  verdict: 'pass' | 'reject';
  rejectReason: RejectReason | null;
  stationCode: string;
  /** Verified trip point, volts; null where the attempt ended before. */
  tripVolts: number | null;
}

/** Why the newest of these boards holds the lot, or null. `boards`: since the last release; a released hold begins afresh. */
export function holdCause(
  boards: readonly HoldBoard[],
  rules: HoldRuleSet,
  baseline: FrozenFigures | null,
): HoldDetail | null {
  return runRuleCause(boards, rules, baseline) ?? sameReasonCause(boards, rules) ?? yieldCause(boards, rules);
}

function runRuleCause(
  boards: readonly HoldBoard[],
  { runRules }: HoldRuleSet,
  baseline: FrozenFigures | null,
): HoldDetail | null {
  if (!baseline || runRules.length === 0) return null;
  const measured = boards.filter((board) => board.tripVolts !== null);
  const z = standardised(
    measured.map((board) => board.tripVolts!),
    limitsOfFrozen(baseline),
  );
  const hold = firstHold(z, runRules);
  if (!hold) return null;
  const seen = measured.slice(hold.from, hold.at + 1);
  const codes = new Set(seen.map(({ stationCode }) => stationCode));
  return {
    cause: 'run-rule',
    holdRule: hold.holdRule,
    fromBoard: seen[0]!.place,
    toBoard: seen.at(-1)!.place,
    stationCode: codes.size === 1 ? seen[0]!.stationCode : null,
  };
}

function sameReasonCause(boards: readonly HoldBoard[], { sameReason }: HoldRuleSet): HoldDetail | null {
  if (!sameReason) return null;
  const last = boards.slice(-sameReason.times);
  const reason = last[0]?.rejectReason;
  if (last.length < sameReason.times || !reason || last.some((board) => board.rejectReason !== reason)) return null;
  const codes = new Set(last.map(({ stationCode }) => stationCode));
  return {
    cause: 'same-reason',
    reason,
    times: sameReason.times,
    stationCode: codes.size === 1 ? last[0]!.stationCode : null,
  };
}

function yieldCause(boards: readonly HoldBoard[], { yieldFloor }: HoldRuleSet): HoldDetail | null {
  if (!yieldFloor || boards.length < yieldFloor.boards) return null;
  const last = boards.slice(-yieldFloor.boards);
  const passed = last.filter(({ verdict }) => verdict === 'pass').length;
  if (passed / last.length >= yieldFloor.least) return null;
  return { cause: 'yield-floor', passed, boards: last.length, least: yieldFloor.least };
}
