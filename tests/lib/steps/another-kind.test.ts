import { describe, expect, it, vi } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { requiredMeasurements } from '@/lib/decision/required-measurements';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { usualStation } from '@/lib/prediction/types';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { sequenceSchema, type Sequence, type Step } from '@/lib/sequence/step';
import { kindOf } from '@/lib/steps/step-kinds';
import { playBoard, planFor } from '../run/play-board';
import { applied, before } from './change-steps';
import type * as StepKinds from '@/lib/steps/step-kinds';

/** A kind that the project does not have: one folder, and one line in the list. */
vi.mock('@/lib/steps/step-kinds', async (original) => {
  const { stepKinds, kindOf: kindOfListed } = await original<typeof StepKinds>();
  const { loadCurrent } = await import('./load-current/kind');
  return {
    stepKinds: [...stepKinds, loadCurrent],
    kindOf: (step: Step) => ((step.kind as string) === 'load-current' ? loadCurrent : kindOfListed(step)),
  };
});

const plan = planFor('CB1210');
const step = (over: object = {}) =>
  ({
    id: 'load',
    name: '',
    enabled: true,
    kind: 'load-current',
    settleMs: 60,
    mostAmps: 0.12,
    ...over,
  }) as unknown as Step;
const withStep = (over: object = {}): Sequence => before(plan.sequence, 'output-levels', step(over));
const play = (sequence: Sequence) => playBoard({ ...plan, sequence }, { seed: 8 });

describe('a kind of step added as one folder', () => {
  it('is read from a stored sequence, and refused with a wrong value', () => {
    expect(sequenceSchema.parse(withStep())).toEqual(withStep());
    const refused = sequenceSchema.safeParse(withStep({ mostAmps: -1 }));
    expect(refused.error?.issues[0]?.path).toEqual(['steps', 7, 'mostAmps']);
  });
  it('is checked by its rules, with a mend', () => {
    expect(checkSequence(withStep(), cb1210)).toEqual([]);
    const bad = withStep({ mostAmps: 0.002, settleMs: 10 });
    const found = checkSequence(bad, cb1210);
    expect(found.map(({ problem, mend }) => [problem, mend?.label])).toEqual([
      ['settle-too-short', 'Use 40 ms'],
      ['load-current-below-quiescent', 'Use 0.009 A'],
    ]);
    expect(
      checkSequence(
        applied(
          bad,
          found.flatMap(({ mend }) => mend!.changes),
        ),
        cb1210,
      ),
    ).toEqual([]);
  });
  it('has a sentence whose blanks are fields of its own', () => {
    const blanks = kindOf(step())
      .sentence(step())
      .filter((part) => typeof part !== 'string');
    expect(blanks.map(({ field }) => field)).toEqual(['settleMs', 'mostAmps']);
    for (const { field } of blanks) expect(step()).toHaveProperty(field);
  });
  it('is played by the engine, asked of a pass and shown in its part of the step line', () => {
    const { result, view, state } = play(withStep());
    expect(result.verdict).toBe('pass');
    expect(result.measurements.filter(({ stepIndex }) => stepIndex === 7)).toMatchObject([{ quantity: 'supply-amps' }]);
    expect(requiredMeasurements(state.plan.sequence)).toContainEqual({
      quantity: 'supply-amps',
      phase: 'check',
      stepIndex: 7,
    });
    expect(view.stepGroups.map(({ group }) => group)).toContain('check');
  });
  it('rejects a board by what it measures', () => {
    expect(play(withStep({ mostAmps: 0.004 })).result).toMatchObject({ verdict: 'reject' });
  });
  it('has a place and a duration in the prediction', () => {
    const predicted = predictSequence(withStep(), cb1210, usualStation);
    const mine = predicted.steps.find(({ stepId }) => stepId === 'load')!;
    expect(mine.stationMs).toBeGreaterThan(60);
    expect(mine.personMs).toBe(0);
    expect(predicted.ending.verdict).toBe('pass');
  });
});
