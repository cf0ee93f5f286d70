import type { BoardType } from '../contracts/board-type';
import { usualStation } from '../prediction/types';
import type { Equipment } from '../steps/step-kind';
import { kindOf } from '../steps/step-kinds';
import { checkOrder } from './check-order';
import { checkIds, checkWhole } from './check-whole';
import type { SequenceFinding } from './finding';
import type { StationKind } from './station-kind';
import type { Sequence } from './step';

/**
 * What the rules say of a sequence for its board type, at the station given or the usual one. The editor shows it, a release and
 * a station refuse what has errors. Steps that are not enabled are left alone.
 */
export function checkSequence(
  { steps: allSteps, decisionRule }: Sequence,
  boardType: BoardType,
  station: StationKind = usualStation,
): SequenceFinding[] {
  const steps = allSteps.filter(({ enabled }) => enabled);
  if (steps.length === 0) return [...checkIds(allSteps), nothingRuns];
  const context = { boardType, station, decisionRule, steps, allSteps };
  return [
    ...checkIds(allSteps),
    ...checkOrder({ steps, allSteps }),
    ...steps.flatMap((step, index) => kindOf(step).rules(step, { ...context, index })),
    ...checkWhole(steps, boardType, station, decisionRule),
  ];
}

const nothingRuns: SequenceFinding = {
  problem: 'nothing-enabled',
  severity: 'error',
  stepId: null,
  field: null,
  sentence: 'No step is run. Enable those that a board needs.',
  mend: null,
};

/** What a station lacks for a sequence; empty when it has all. */
export function missingEquipment(
  { steps }: Pick<Sequence, 'steps'>,
  station: { hasController: boolean; hasWiperProbe: boolean },
): Equipment[] {
  const needed = new Set(steps.flatMap((step) => (step.enabled ? kindOf(step).needs(step) : [])));
  const has: Record<Equipment, boolean> = {
    'fixture-controller': station.hasController,
    'wiper-probe': station.hasWiperProbe,
  };
  return (Object.keys(has) as Equipment[]).filter((each) => needed.has(each) && !has[each]);
}
