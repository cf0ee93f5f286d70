import { cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { StepMemo } from '@/lib/prediction/step-memo';
import { usualStation } from '@/lib/prediction/types';
import { checkSequence } from '@/lib/sequence/check-sequence';
import type { Sequence, Step } from '@/lib/sequence/step';

export interface EditTimes {
  steps: number;
  firstMs: number;
  edits: { kind: Step['kind']; field: string; ms: number }[];
}

/** Steps of a check, which the draft repeats until it is long. */
const checks: object[] = [
  {
    kind: 'measure-channel',
    channel: 101,
    atVolts: 13.2,
    settleMs: 60,
    integrationCycles: 1,
    minVolts: 12,
    maxVolts: 14,
  },
  { kind: 'apply-voltage', volts: 12.9, waitMs: 200 },
  {
    kind: 'measure-channel',
    channel: 103,
    atVolts: null,
    settleMs: 40,
    integrationCycles: 1,
    minVolts: 4,
    maxVolts: 6,
  },
  { kind: 'soak', channel: 103, atVolts: 13, readings: 20, everyMs: 100, mostDriftVolts: 0.01 },
  { kind: 'output-levels', settleMs: 60 },
  { kind: 'quiescent-current', settleMs: 60 },
  { kind: 'verify', repeats: 1, wantedUncertaintyVolts: 0.002, mostSettles: 150, settleMs: 40, mostSpreadVolts: 0.01 },
];
const wantedSteps = 40;

/** The demo's sequence with more checks before its record: 40 steps. */
export function longDraft(): Sequence {
  const { steps, decisionRule } = sequences[0]!.sequence;
  const more = Array.from({ length: wantedSteps - steps.length }, (_, i) => ({
    id: `more-${i}`,
    name: '',
    enabled: true,
    ...checks[i % checks.length],
  })) as Step[];
  return { decisionRule, steps: [...steps.slice(0, -1), ...more, steps.at(-1)!] };
}

function numbersOf(step: Step): string[] {
  return Object.entries(step).flatMap(([field, value]) =>
    typeof value === 'number' && field !== 'channel' ? [field] : [],
  );
}

/** Edits every number of the draft by a hundredth and times rules and prediction together. */
export function editEveryField(): EditTimes {
  const draft = longDraft();
  const memo = new StepMemo();
  const look = (sequence: Sequence) => {
    const fromMs = performance.now();
    checkSequence(sequence, cb1210, usualStation);
    predictSequence(sequence, cb1210, usualStation, memo);
    return performance.now() - fromMs;
  };
  const firstMs = look(draft);
  const edits: EditTimes['edits'] = [];
  draft.steps.forEach((step, index) => {
    for (const field of numbersOf(step)) {
      const value = (step as unknown as Record<string, number>)[field]!;
      const next = Number.isInteger(value) ? value + 1 : value * 1.01;
      const edited = { ...step, [field]: next } as Step;
      const ms = look({ ...draft, steps: draft.steps.with(index, edited) });
      edits.push({ kind: step.kind, field, ms });
    }
  });
  return { steps: draft.steps.length, firstMs, edits };
}
