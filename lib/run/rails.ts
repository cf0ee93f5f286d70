import type { RailFlag, RailsView } from '../contracts/bench-view';
import type { BoardType } from '../contracts/board-type';
import { drawIn, guardBandOf } from '../decision/judge-value';
import type { Sequence } from '../sequence/step';
import { combineContributions } from '../uncertainty/combine';
import { pointBudget } from '../uncertainty/point-budget';
import { noTravel, type Points, type RunFacts } from './facts';
import type { RunPlan } from './types';

/** Volts shown beyond the limits at either end of the rails. */
const marginVolts = 1;
const roundToHalf = (volts: number) => Math.round(volts * 2) / 2;

/** What is printed beside the rails before anything is measured. */
export function printedRails({ limits }: BoardType, sequence: Sequence): RailsView {
  const trimStep = sequence.steps.find((step) => step.kind === 'trim');
  return {
    scaleMinVolts: roundToHalf(limits.tripVolts.min - marginVolts),
    scaleMaxVolts: roundToHalf(limits.releaseVolts.max + marginVolts),
    tripLimits: limits.tripVolts,
    releaseLimits: limits.releaseVolts,
    guardVolts: null,
    targetVolts: trimStep?.kind === 'trim' ? trimStep.targetVolts : null,
    flags: [],
    travelled: noTravel,
    hysteresisVolts: null,
  };
}

/** The rails of a run: what is printed, and what is measured so far. */
export function railsOf(plan: RunPlan, facts: RunFacts): RailsView {
  const verified = facts.verified.at(-1) ?? null;
  const latest = verified ?? facts.trimmed ?? (facts.trimBegan ? null : facts.found);
  return {
    ...printedRails(plan.boardType, plan.sequence),
    guardVolts: guardsOf(plan, facts),
    travelled: facts.travel,
    flags: [
      ...(facts.found && latest !== facts.found ? flagsOf(facts.found, plan.boardType, 'before') : []),
      ...(latest ? flagsOf(latest, plan.boardType, null) : []),
    ],
    hysteresisVolts: latest ? latest.release.volts - latest.trip.volts : null,
  };
}

function flagsOf({ trip, release }: Points, { limits }: BoardType, note: 'before' | null): RailFlag[] {
  const flag = (side: RailFlag['side'], volts: number, { min, max }: { min: number; max: number }): RailFlag => ({
    side,
    volts,
    hollow: note !== null,
    note: note ?? (volts < min ? 'too-low' : volts > max ? 'too-high' : null),
  });
  return [flag('trip', trip.volts, limits.tripVolts), flag('release', release.volts, limits.releaseVolts)];
}

/** Guarded limits as judged; before that, as the verification is expected to draw them. */
function guardsOf(plan: RunPlan, facts: RunFacts): RailsView['guardVolts'] {
  const { decisionRule } = plan.sequence;
  if (decisionRule.kind === 'simple') return null;
  const { tripVolts, releaseVolts } = plan.boardType.limits;
  const guarded = (quantity: 'trip-volts' | 'release-volts', limits: { min: number; max: number }) => {
    const judged = facts.measurements.findLast((m) => m.quantity === quantity && m.phase === 'verified');
    const expanded = judged?.expandedUncertainty ?? expectedUncertainty(plan, (limits.min + limits.max) / 2);
    const drawn = drawIn(limits, guardBandOf(decisionRule, expanded));
    return { min: drawn.min ?? limits.min, max: drawn.max ?? limits.max };
  };
  const trip = guarded('trip-volts', tripVolts);
  const release = guarded('release-volts', releaseVolts);
  return { tripMin: trip.min, tripMax: trip.max, releaseMin: release.min, releaseMax: release.max };
}

/** U of a point verified as the sequence asks, when its repeats agree as well as each search. */
function expectedUncertainty({ sequence, meter }: RunPlan, volts: number): number {
  const step = sequence.steps.find((s) => s.kind === 'verify');
  const [repeats, search] = step?.kind === 'verify' ? [step.repeats, step.wantedUncertaintyVolts] : [1, 0.001];
  return combineContributions(
    pointBudget({ values: [volts], searchUncertainties: [search / Math.sqrt(repeats)] }, meter),
  ).expanded;
}
