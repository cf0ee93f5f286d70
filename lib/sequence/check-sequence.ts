import type { BoardType } from '../contracts/board-type';
import { usualStation } from '../prediction/types';
import type { Equipment } from '../steps/step-kind';
import { kindOf } from '../steps/step-kinds';
import type { SequenceFinding } from './finding';
import type { StationKind } from './station-kind';
import type { Sequence, Step, StepKind } from './step';

/** What keeps a sequence from being right for its board type, at the station given or the usual one; empty when it may be released. */
export function checkSequence(
  { steps, decisionRule }: Sequence,
  boardType: BoardType,
  station: StationKind = usualStation,
): SequenceFinding[] {
  const context = { boardType, station, decisionRule, steps };
  return [...checkOrder(steps), ...steps.flatMap((step, index) => kindOf(step).rules(step, { ...context, index }))];
}

function checkOrder(steps: Step[]): SequenceFinding[] {
  const at = (kind: StepKind) => steps.findIndex((step) => step.kind === kind);
  const last = (kind: StepKind) => steps.findLastIndex((step) => step.kind === kind);
  const found: SequenceFinding[] = [];
  const report = (bad: boolean, problem: string, index: number, sentence: string) => {
    const stepId = steps[index]?.id ?? null;
    if (bad) found.push({ problem, severity: 'error', stepId, field: null, sentence, mend: null });
  };
  report(at('seat') !== 0, 'seat-not-first', at('seat'), 'The sequence does not begin with seating the board.');
  report(
    at('record') !== steps.length - 1,
    'record-not-last',
    at('record'),
    'The sequence does not end with the record.',
  );
  report(at('power-up') !== 1, 'power-up-missing', -1, 'The supply is not powered up after the board is seated.');
  report(at('verify') < 0, 'verify-missing', -1, 'Nothing is verified, so no board can pass.');
  const trim = last('trim');
  const unfound = at('find-points') < 0 || at('find-points') > trim;
  report(trim >= 0 && unfound, 'find-missing', trim, 'The trim has no points to start from.');
  const moved = Math.max(trim, last('seal'));
  report(
    moved >= 0 && last('verify') < moved,
    'trim-not-verified',
    moved,
    'Nothing is verified after the screw moved.',
  );
  return found;
}

export type MissingEquipment = Equipment;

/** What a station lacks for a sequence; empty when it has all. */
export function missingEquipment(
  { steps }: Pick<Sequence, 'steps'>,
  station: { hasController: boolean; hasWiperProbe: boolean },
): Equipment[] {
  const needed = new Set(steps.flatMap((step) => kindOf(step).needs(step)));
  const has: Record<Equipment, boolean> = {
    'fixture-controller': station.hasController,
    'wiper-probe': station.hasWiperProbe,
  };
  return (Object.keys(has) as Equipment[]).filter((each) => needed.has(each) && !has[each]);
}
