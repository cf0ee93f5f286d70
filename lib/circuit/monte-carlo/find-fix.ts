import { tolerancesOf, type BoardType } from '../../contracts/board-type';
import { preferredNear } from '../preferred-values';
import type { PointPart } from '../sensitivities';
import { supplyForReference } from '../soft-knee';
import { applyFix, limitNames, valueOf } from './apply-fix';
import { boardsOf } from './boards';
import { nodesNear } from './node-voltage';
import { quantilesOf } from './quantiles';
import { trimBoards, type TrimmedBoards } from './trimmed-boards';
import { judgedQuantities, type JudgedQuantity, type LimitFix, type PartChange } from './types';

/** Fewer boards than one in 1,000 count as none. */
export const negligibleShare = 0.001;
const quickBoards = 1000;
/** Neighbours of a resistor's value that are tried, in its series. */
const stepsTried = 8;
/** Tolerances that parts are sold in, *common practice*; of the comparator's offset, volts. */
const soldTolerances = [0.1, 0.05, 0.02, 0.01, 0.005, 0.0025, 0.001];
const soldOffsets = [0.007, 0.005, 0.003, 0.002, 0.001, 0.0005, 0.00015];
const resistors = ['feedbackOhms', 'supplyEndOhms', 'groundEndOhms'] as const;

export interface Question {
  boardType: BoardType;
  targetVolts: number;
  deviations: Float64Array;
  asIs: TrimmedBoards;
}

/**
 * One change after which no board to speak of misses `quantity`, and no other limit is missed more than before. Another
 * value of one resistor first, then a tighter tolerance of the part that drives it, then both at once; each is tried on the
 * same boards. Where none helps, limits that would hold.
 */
export function findFix(question: Question, quantity: JudgedQuantity, driver: PointPart): LimitFix | null {
  // The part that drives it is changed rather than another.
  const parts = resistors.toSorted((a, b) => Number(b === driver) - Number(a === driver));
  const values = parts.flatMap((part) => otherValues(question.boardType, part));
  const tolerances = tighter(question.boardType, driver);
  const both = values
    .filter(({ part }) => part === driver)
    .flatMap((value) => tolerances.map((change) => ({ ...value, ...change })));
  for (const changes of [values, tolerances, both]) {
    const fix = firstThatHelps(question, quantity, changes);
    if (fix) return fix;
  }
  return limitsThatHold(question, quantity);
}

function firstThatHelps(question: Question, quantity: JudgedQuantity, changes: PartChange[]): LimitFix | null {
  for (const change of changes) {
    const fix: LimitFix = { kind: 'parts', changes: [change] };
    if (helps(question, quantity, fix, quickBoards) && helps(question, quantity, fix)) return fix;
  }
  return null;
}

function helps(question: Question, quantity: JudgedQuantity, fix: LimitFix, boards?: number): boolean {
  const { boardType, targetVolts, deviations, asIs } = question;
  const { misses } = trimBoards(applyFix(boardType, fix), targetVolts, deviations, boards);
  const share = ({ below, above }: { below: number; above: number }) => below + above;
  // On a few boards chance alone may bring one more.
  const most = boards ? 2.5 / boards : negligibleShare;
  return judgedQuantities.every(
    (each) => share(misses[each]) < most || (each !== quantity && share(misses[each]) <= share(asIs.misses[each])),
  );
}

/** Nearest first, in the series that the resistor's tolerance is made in. */
function otherValues(boardType: BoardType, part: (typeof resistors)[number]): PartChange[] {
  const now = valueOf(boardType.design, part);
  if (now === 0) return [];
  const name = tolerancesOf(boardType)[part] <= 0.011 ? 'E96' : 'E24';
  return preferredNear(now, name, stepsTried + 1)
    .filter((value) => Math.abs(value / now - 1) > 1e-6)
    .map((value) => ({ part, value }));
}

function tighter(boardType: BoardType, part: PointPart): PartChange[] {
  const now = tolerancesOf(boardType)[part];
  const sold = part === 'comparatorOffsetVolts' ? soldOffsets : soldTolerances;
  return sold.filter((tolerance) => tolerance < now * 0.999).map((tolerance) => ({ part, tolerance }));
}

const holding = [negligibleShare / 2, 1 - negligibleShare / 2] as const;

function limitsThatHold({ boardType, deviations, asIs }: Question, quantity: JudgedQuantity): LimitFix | null {
  if (quantity === 'target') return commonReach(boardType, deviations);
  const values =
    quantity === 'reference'
      ? asIs.referenceVolts
      : asIs.releaseVolts.map((volts) => (quantity === 'hysteresis' ? volts - asIs.targetVolts : volts));
  const [low, high] = quantilesOf(values, holding);
  const { min, max } = boardType.limits[limitNames[quantity]];
  return {
    kind: 'limits',
    quantity,
    minVolts: Math.min(min, Math.floor(low! * 100) / 100),
    maxVolts: Math.max(max, Math.ceil(high! * 100) / 100),
  };
}

/** Trip points inside the travel of all boards but a negligible share; null where there are none. */
function commonReach(boardType: BoardType, deviations: Float64Array): LimitFix | null {
  const lowest: number[] = [];
  const highest: number[] = [];
  for (const parts of boardsOf(boardType, deviations)) {
    const tripAt = (wiper: number) => supplyForReference(parts.reference, nodesNear(parts, wiper, 0, 0).trip);
    lowest.push(tripAt(1));
    highest.push(tripAt(0));
  }
  const [, low] = quantilesOf(Float64Array.from(lowest), holding);
  const [high] = quantilesOf(Float64Array.from(highest), holding);
  const fix = { minVolts: Math.ceil(low! * 100) / 100, maxVolts: Math.floor(high! * 100) / 100 };
  return fix.minVolts < fix.maxVolts ? { kind: 'target', ...fix } : null;
}
