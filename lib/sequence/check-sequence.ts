import type { BoardType } from '../contracts/board-type';
import type { Sequence, Step, StepKind } from './step';

export const sequenceProblems = [
  'seat-not-first',
  'record-not-last',
  'power-up-missing',
  'verify-missing',
  'find-missing',
  'trim-not-verified',
  'overvoltage-above-maximum',
  'working-volts-too-low',
  'working-volts-too-high',
  'window-too-narrow',
  'window-above-maximum',
  'target-outside-limits',
  'ride-through-not-between-points',
  'ride-through-too-short',
] as const;
export type SequenceProblem = (typeof sequenceProblems)[number];

/** `stepIndex` is null where a step is missing. */
export interface SequenceFinding {
  problem: SequenceProblem;
  stepIndex: number | null;
}

/** Rise of the supply above a step from zero that must stay below the absolute maximum: the largest overshoot considered. */
const largestOvershoot = 0.085;

/** What keeps a sequence from being right for its board type; empty when it may be released. */
export function checkSequence({ steps }: Sequence, boardType: BoardType): SequenceFinding[] {
  return [...checkOrder(steps), ...steps.flatMap((step, index) => checkStep(step, index, boardType))];
}

function checkOrder(steps: Step[]): SequenceFinding[] {
  const at = (kind: StepKind) => steps.findIndex((step) => step.kind === kind);
  const last = (kind: StepKind) => steps.findLastIndex((step) => step.kind === kind);
  const found: SequenceFinding[] = [];
  const report = (bad: boolean, problem: SequenceProblem, stepIndex: number | null) => {
    if (bad) found.push({ problem, stepIndex });
  };
  report(at('seat') !== 0, 'seat-not-first', at('seat') < 0 ? null : at('seat'));
  report(at('record') !== steps.length - 1, 'record-not-last', at('record') < 0 ? null : at('record'));
  report(at('power-up') !== 1, 'power-up-missing', null);
  report(at('verify') < 0, 'verify-missing', null);
  const trim = last('trim');
  report(trim >= 0 && (at('find-points') < 0 || at('find-points') > trim), 'find-missing', trim);
  const moved = Math.max(trim, last('seal'));
  report(moved >= 0 && last('verify') < moved, 'trim-not-verified', moved);
  return found;
}

function checkStep(step: Step, stepIndex: number, boardType: BoardType): SequenceFinding[] {
  const { limits, search, absoluteMaximumVolts } = boardType;
  const failing = (problem: SequenceProblem, bad: boolean) => (bad ? [{ problem, stepIndex }] : []);
  switch (step.kind) {
    case 'power-up':
      return [
        ...failing('overvoltage-above-maximum', step.overvoltageVolts > absoluteMaximumVolts),
        ...failing('working-volts-too-low', step.volts <= limits.releaseVolts.max),
        ...failing(
          'working-volts-too-high',
          step.volts * (1 + largestOvershoot) > Math.min(step.overvoltageVolts, absoluteMaximumVolts),
        ),
      ];
    case 'find-points':
      return [
        ...failing('window-above-maximum', step.windowMaxVolts > absoluteMaximumVolts),
        ...failing(
          'window-too-narrow',
          step.windowMinVolts >= search.tripVolts.min || step.windowMaxVolts <= limits.releaseVolts.max,
        ),
      ];
    case 'trim':
      return failing(
        'target-outside-limits',
        step.targetVolts - step.toleranceVolts < limits.tripVolts.min ||
          step.targetVolts + step.toleranceVolts > limits.tripVolts.max,
      );
    case 'ride-through':
      return [
        ...failing(
          'ride-through-not-between-points',
          step.atVolts <= limits.tripVolts.max || step.atVolts >= limits.releaseVolts.min,
        ),
        ...failing('ride-through-too-short', step.milliseconds / 1000 < limits.rideThroughSeconds.min),
      ];
    default:
      return [];
  }
}

export type MissingEquipment = 'fixture-controller' | 'wiper-probe';

/** What a station lacks for a sequence; empty when it has all. */
export function missingEquipment(
  { steps }: Sequence,
  station: { hasController: boolean; hasWiperProbe: boolean },
): MissingEquipment[] {
  const needsController = steps.some((step) => step.kind === 'ride-through');
  const needsProbe = steps.some((step) => step.kind === 'trim' && step.procedure === 'wiper-probe');
  return [
    ...(needsController && !station.hasController ? (['fixture-controller'] as const) : []),
    ...(needsProbe && !station.hasWiperProbe ? (['wiper-probe'] as const) : []),
  ];
}
