import type { RailFlag, RailsView } from '../contracts/bench-view';
import type { BoardType } from '../contracts/board-type';
import { drawIn, guardBandOf } from '../decision/judge-value';
import { firstOf } from '../sequence/enabled-steps';
import type { Sequence } from '../sequence/step';
import { expectedUncertaintyAt } from './expected-uncertainty';
import { noTravel, type Points, type RunFacts } from './facts';
import type { PointUncertainty, RunState } from './state';
import type { RunPlan } from './types';

/** Volts shown beyond the limits at either end of the rails. */
const marginVolts = 1;
const roundToHalf = (volts: number) => Math.round(volts * 2) / 2;

/** What is printed beside the rails before anything is measured. */
export function printedRails({ limits }: BoardType, sequence: Sequence): RailsView {
  return {
    scaleMinVolts: roundToHalf(limits.tripVolts.min - marginVolts),
    scaleMaxVolts: roundToHalf(limits.releaseVolts.max + marginVolts),
    tripLimits: limits.tripVolts,
    releaseLimits: limits.releaseVolts,
    guardVolts: null,
    targetVolts: firstOf(sequence, 'trim')?.targetVolts ?? null,
    flags: [],
    travelled: noTravel,
    hysteresisVolts: null,
  };
}

/** The rails of a run: what is printed, and what is measured so far. */
export function railsOf({ plan, facts, expectedUncertainty }: RunState): RailsView {
  const verified = facts.verified.at(-1) ?? null;
  const latest = verified ?? facts.trimmed ?? (facts.trimBegan ? null : facts.found);
  return {
    ...printedRails(plan.boardType, plan.sequence),
    guardVolts: guardsOf(plan, facts, expectedUncertainty),
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
function guardsOf(plan: RunPlan, facts: RunFacts, expected: PointUncertainty): RailsView['guardVolts'] {
  const { decisionRule } = plan.sequence;
  if (decisionRule.kind === 'simple') return null;
  const { tripVolts, releaseVolts } = plan.boardType.limits;
  const guarded = (
    quantity: 'trip-volts' | 'release-volts',
    limits: { min: number; max: number },
    expectedVolts: number,
  ) => {
    const judged = facts.measurements.findLast((m) => m.quantity === quantity && m.phase === 'verified');
    const drawn = drawIn(limits, guardBandOf(decisionRule, judged?.expandedUncertainty ?? expectedVolts));
    return { min: drawn.min ?? limits.min, max: drawn.max ?? limits.max };
  };
  const trip = guarded('trip-volts', tripVolts, expected.tripVolts);
  const release = guarded('release-volts', releaseVolts, expected.releaseVolts);
  return { tripMin: trip.min, tripMax: trip.max, releaseMin: release.min, releaseMax: release.max };
}

/** U of the points when verified as the sequence asks. Volts. */
export function expectedUncertainty({ sequence, meter, boardType }: RunPlan): PointUncertainty {
  const at = ({ min, max }: { min: number; max: number }) => expectedUncertaintyAt((min + max) / 2, sequence, meter);
  return { tripVolts: at(boardType.limits.tripVolts), releaseVolts: at(boardType.limits.releaseVolts) };
}
