import type { BoardType } from '../contracts/board-type';
import { testUncertaintyRatio } from '../decision/risk-test-uncertainty-ratio';
import { expectedUncertaintyAt } from '../run/expected-uncertainty';
import { millivoltsText, upTo, voltsText } from '../steps/number-words';
import type { SequenceFinding } from './finding';
import type { StationKind } from './station-kind';
import type { DecisionRule, Step } from './step';

const whole = (
  problem: string,
  severity: SequenceFinding['severity'],
  sentence: string,
  mend: SequenceFinding['mend'] = null,
): SequenceFinding => ({ problem, severity, stepId: null, field: null, sentence, mend });

/** What belongs to no single step: ids, limits that contradict each other, and the guard. */
export function checkWhole(
  steps: readonly Step[],
  boardType: BoardType,
  station: StationKind,
  decisionRule: DecisionRule,
): SequenceFinding[] {
  const { tripVolts, releaseVolts } = boardType.limits;
  const found: SequenceFinding[] = [];
  if (releaseVolts.max <= tripVolts.min) {
    const sentence = `A board releases above where it trips. The limits say ${voltsText(releaseVolts.max)} at most, and ${voltsText(tripVolts.min)} at least.`;
    found.push(whole('release-not-above-trip', 'error', sentence));
  } else if (releaseVolts.min <= tripVolts.max) {
    const sentence = `The limits of release begin at ${voltsText(releaseVolts.min)}, inside those of trip, which end at ${voltsText(tripVolts.max)}.`;
    found.push(whole('release-limits-overlap', 'warning', sentence));
  }
  return [...found, ...checkGuard(steps, boardType, station, decisionRule)];
}

/** Simple acceptance is usual where the tolerance is at least four times the interval of the uncertainty; common practice. */
const leastRatio = 4;

function checkGuard(
  steps: readonly Step[],
  { limits }: BoardType,
  station: StationKind,
  rule: DecisionRule,
): SequenceFinding[] {
  if (!steps.some(({ kind }) => kind === 'verify')) return [];
  const { tripVolts } = limits;
  const expanded = expectedUncertaintyAt((tripVolts.min + tripVolts.max) / 2, { steps }, station.meter);
  const u = millivoltsText(upTo(expanded, 4));
  if (rule.kind === 'guard-band') {
    const sentence = `The guard is ${rule.factor} U. With less than U, a board outside its limits may pass; U is ${u}.`;
    return rule.factor < 1 ? [whole('guard-below-uncertainty', 'warning', sentence)] : [];
  }
  const ratio = testUncertaintyRatio(tripVolts, expanded);
  const sentence = `There is no guard, and U is ${u}. The tolerance is only ${ratio?.toFixed(1)} times the uncertainty.`;
  return ratio !== null && ratio < leastRatio ? [whole('guard-missing', 'warning', sentence)] : [];
}

/** Findings, branches and reasons are kept by the ids of steps. */
export function checkIds(steps: readonly Step[]): SequenceFinding[] {
  const seen = new Set<string>();
  return steps.flatMap(({ id }) => {
    if (!seen.has(id)) {
      seen.add(id);
      return [];
    }
    const sentence = `Two steps have the id ${id}. Each has its own.`;
    return [{ ...whole('step-id-not-unique', 'error', sentence), stepId: id }];
  });
}
