import { describe, expect, it } from 'vitest';
import { sequences } from '@/db/seed/sequences';
import { changeWords } from '@/lib/dry-run/change-words';
import { mostSingleChanges, singleChanges } from '@/lib/dry-run/single-changes';
import type { Sequence, Step } from '@/lib/sequence/step';

const released = sequences[0]!.sequence;
const at = (kind: Step['kind']) => released.steps.findIndex((step) => step.kind === kind);
const withStep = (sequence: Sequence, kind: Step['kind'], over: object): Sequence => ({
  ...sequence,
  steps: sequence.steps.map((step) => (step.kind === kind ? ({ ...step, ...over } as Step) : step)),
});

describe('each change of a draft alone', () => {
  it('makes one sequence a changed step, all else as released', () => {
    const draft = withStep(withStep(released, 'trim', { mostRounds: 4 }), 'verify', { repeats: 2 });
    const changes = singleChanges(released, draft);
    expect(changes.map(({ kind }) => kind)).toEqual(['changed', 'changed']);
    expect(changes[0]!.sequence).toEqual(withStep(released, 'trim', { mostRounds: 4 }));
    expect(changes[1]!.sequence).toEqual(withStep(released, 'verify', { repeats: 2 }));
    expect(changes.map((change) => changeWords(change, released)).every((words) => words.includes('→'))).toBe(true);
  });
  it('a single change is the draft itself: nothing runs alone', () => {
    expect(singleChanges(released, withStep(released, 'trim', { mostRounds: 4 }))).toEqual([]);
  });
  it('another name alone is no change', () => {
    expect(
      singleChanges(released, withStep(withStep(released, 'trim', { name: 'a' }), 'verify', { name: 'b' })),
    ).toEqual([]);
  });
  it('a removed, an added and a changed step each stand alone; an added one behind the step it follows', () => {
    const added = { ...released.steps[at('operator-check')]!, id: 'new-1' } as Step;
    const kept = released.steps.filter(({ kind }) => kind !== 'ride-through');
    const place = kept.findIndex(({ kind }) => kind === 'seal');
    const draft = { ...released, steps: [...kept.slice(0, place), added, ...kept.slice(place)] };
    const changes = singleChanges(released, draft);
    expect(changes.map(({ kind }) => kind)).toEqual(['added', 'removed']);
    expect(changes[0]!.sequence.steps.map(({ id }) => id).indexOf('new-1')).toBe(at('trim') + 1);
    expect(changes[1]!.sequence.steps).toHaveLength(released.steps.length - 1);
  });
  it('another order and another rule count as one change each', () => {
    const steps = [...released.steps];
    const [a, b] = [at('output-levels'), at('quiescent-current')];
    [steps[a], steps[b]] = [steps[b]!, steps[a]!];
    const changes = singleChanges(released, { steps, decisionRule: { kind: 'simple' } });
    expect(changes.map(({ kind }) => kind)).toEqual(['order', 'rule']);
    expect(changes[0]!.sequence.steps).toEqual(steps);
  });
  it(`more than ${mostSingleChanges} are not run alone`, () => {
    const draft = { ...released, steps: released.steps.map((step) => ({ ...step, enabled: false }) as Step) };
    expect(singleChanges(released, draft)).toEqual([]);
  });
});
