import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { sequences } from '@/db/seed/sequences';
import { changeSentences } from '@/lib/sequence/change-sentences';
import { compareSequences, type SequenceComparison } from '@/lib/sequence/compare-sequences';
import { keptOrder } from '@/lib/sequence/kept-order';
import type { Sequence, Step, StepKind } from '@/lib/sequence/step';
import { anySequence } from './any-sequence';

const whole = sequences[0]!.sequence;
const changed = (kind: StepKind, over: object): Sequence => ({
  ...whole,
  steps: whole.steps.map((step) => (step.kind === kind ? ({ ...step, ...over } as Step) : step)),
});
const sentences = (after: Sequence) => changeSentences(compareSequences(whole, after));

describe('two revisions compared', () => {
  test('say a changed value with its name, unit and decimals, and how far it moved', () => {
    expect(sentences(changed('power-up', { currentLimitAmps: 0.25 }))).toEqual([
      'Step 2, Power up: current limit 0.300 A is now 0.250 A.',
    ]);
    const { steps, stepsChanged, valuesChanged } = compareSequences(whole, changed('trim', { toleranceVolts: 0.015 }));
    expect({ stepsChanged, valuesChanged }).toEqual({ stepsChanged: 1, valuesChanged: 1 });
    expect(steps[4]!.values).toMatchObject([
      { label: 'Tolerance', from: '20 mV', to: '15 mV', numbers: { from: 20, to: 15, difference: '−5 mV' } },
    ]);
  });

  test('say choices by their words', () => {
    expect(sentences(changed('trim', { procedure: 'prompted' }))).toEqual([
      'Step 5, Trim: procedure between two beeps is now turn by turn.',
    ]);
  });

  test('show as many decimals as two values need to read differently', () => {
    const { steps } = compareSequences(whole, changed('power-up', { volts: 13.5004 }));
    expect(steps[1]!.values).toMatchObject([{ from: '13.5000 V', to: '13.5004 V' }]);
  });

  test('tell a step that was switched off, named, added, removed or moved, and nothing of the others', () => {
    expect(sentences(changed('reference', { enabled: false, name: 'Zener' }))).toEqual([
      'Step 3, Zener: named Zener, before Reference; switched off.',
    ]);
    const [first, second, third, ...rest] = whole.steps as [Step, Step, Step, ...Step[]];
    expect(sentences({ ...whole, steps: [first, third, second, ...rest] })).toHaveLength(1);
    expect(sentences({ ...whole, steps: [first, ...rest] })).toEqual([
      'Step 2, Power up, is removed.',
      'Step 3, Reference, is removed.',
    ]);
    const extra = { ...whole.steps[2]!, id: 'extra' };
    expect(sentences({ ...whole, steps: [...whole.steps, extra] })).toEqual(['Step 13, Reference, is new.']);
  });

  test('tell another rule of decision', () => {
    expect(sentences({ ...whole, decisionRule: { kind: 'simple' } })).toEqual([
      'Decision rule: limits drawn in by 1 × U is now simple acceptance.',
    ]);
  });
});

/** The later sequence, made from the earlier one and the comparison alone. */
function applied(before: Sequence, comparison: SequenceComparison, after: Sequence): Sequence {
  const steps = comparison.steps
    .filter(({ placeAfter }) => placeAfter !== null)
    .sort((a, b) => a.placeAfter! - b.placeAfter!)
    .map((row) => {
      const from = before.steps.find(({ id }) => id === row.stepId);
      if (!from) return row.after!;
      const step = structuredClone(from) as unknown as Record<string, unknown>;
      if (row.switched) step.enabled = row.switched === 'on';
      if (row.renamed) step.name = row.after!.name;
      for (const { field, after: value } of row.values) setField(step, field.split('.'), value);
      return step as unknown as Step;
    });
  return { decisionRule: comparison.rule ? after.decisionRule : before.decisionRule, steps };
}
function setField(into: Record<string, unknown>, [key, ...deeper]: string[], value: unknown): void {
  if (deeper.length === 0) {
    if (value === undefined) delete into[key!];
    else into[key!] = value;
    return;
  }
  into[key!] = { ...(into[key!] as object | undefined) };
  setField(into[key!] as Record<string, unknown>, deeper, value);
  if (Object.keys(into[key!] as object).length === 0) delete into[key!];
}

describe('comparing keeps these laws', () => {
  test('a sequence differs in nothing from itself', () => {
    fc.assert(
      fc.property(anySequence, (sequence) => {
        expect(compareSequences(sequence, structuredClone(sequence))).toMatchObject({ same: true, valuesChanged: 0 });
      }),
      { numRuns: 50 },
    );
  });

  test('the later sequence can be made again from the earlier one and what is said to differ', () => {
    fc.assert(
      fc.property(anySequence, anySequence, (before, after) => {
        const comparison = compareSequences(before, after);
        expect(applied(before, comparison, after)).toEqual(after);
      }),
      { numRuns: 100 },
    );
  });

  test('the other way round, what was new is removed and values change places', () => {
    fc.assert(
      fc.property(anySequence, anySequence, (a, b) => {
        const there = compareSequences(a, b);
        const back = compareSequences(b, a);
        // Which of two that changed places was moved is a matter of taste; how many were is not.
        const moved = ({ steps }: SequenceComparison) => steps.filter((step) => step.moved).length;
        expect(moved(back)).toBe(moved(there));
        expect(back.valuesChanged).toBe(there.valuesChanged);
        for (const row of there.steps) {
          const returned = back.steps.find(({ stepId }) => stepId === row.stepId)!;
          expect(returned.placeBefore).toBe(row.placeAfter);
          expect(returned.values.map(({ from }) => from).sort()).toEqual(row.values.map(({ to }) => to).sort());
        }
      }),
      { numRuns: 50 },
    );
  });

  test('every value that differs reads differently', () => {
    fc.assert(
      fc.property(anySequence, anySequence, (a, b) => {
        for (const { values } of compareSequences(a, b).steps)
          for (const { from, to } of values) expect(from).not.toBe(to);
      }),
      { numRuns: 50 },
    );
  });

  test('one step taken elsewhere is the only one that moved', () => {
    const ids = Array.from({ length: 9 }, (_, i) => `s${i}`);
    fc.assert(
      fc.property(fc.nat(8), fc.nat(8), (from, to) => {
        const after = ids.filter((_, i) => i !== from);
        after.splice(to, 0, ids[from]!);
        const moved = ids.filter((id) => !keptOrder(ids, after).has(id));
        expect(moved.length).toBe(from === to ? 0 : 1);
        if (Math.abs(from - to) > 1) expect(moved).toEqual([ids[from]]);
      }),
    );
  });
});
