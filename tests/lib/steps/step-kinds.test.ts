import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { checkSequence } from '@/lib/sequence/check-sequence';
import type { Step } from '@/lib/sequence/step';
import type { StepKindDefinition } from '@/lib/steps/step-kind';
import { stepKinds } from '@/lib/steps/step-kinds';
import { before, without } from './change-steps';

const kinds = stepKinds as unknown as readonly StepKindDefinition[];
const folders = readdirSync('lib/steps', { withFileTypes: true }).filter((entry) => entry.isDirectory());

describe('the list of kinds', () => {
  it('has every folder of lib/steps once, by its name', () => {
    expect(kinds.map(({ kind }) => kind).sort()).toEqual(folders.map(({ name }) => name).sort());
  });
});

describe.each(kinds.map((each) => [each.kind, each] as const))('%s', (kind, definition) => {
  const fresh = (code: string): Step => {
    const boardType = boardTypes.find((type) => type.code === code)!;
    const step = { id: 'new', name: '', enabled: true, ...definition.fresh(boardType) } as Step;
    return kind === 'branch' ? ({ ...step, goTo: 's4' } as Step) : step;
  };
  it('has words, a purpose that is a sentence, and blanks that are fields of it', () => {
    expect(definition.word).toMatch(/^[A-Z]/);
    expect(definition.purpose).toMatch(/^[A-Z].*\.$/);
    const step = fresh('CB1210');
    for (const part of definition.sentence(step)) {
      if (typeof part === 'string') continue;
      expect(step).toHaveProperty(part.field);
      expect(part.label).not.toBe('');
    }
  });
  it.each(sequences.map((s) => [s.name, s] as const))(
    'is new without an error in %s',
    (_, { boardTypeCode, sequence }) => {
      const step = fresh(boardTypeCode);
      expect(definition.schema.safeParse(step).success).toBe(true);
      const boardType = boardTypes.find((type) => type.code === boardTypeCode)!;
      const once = ['seat', 'power-up', 'record'].includes(kind);
      const drawn = once
        ? { ...sequence, steps: sequence.steps.map((each) => (each.kind === kind ? step : each)) }
        : before(without(sequence, kind), beforeWhich[kind] ?? 'output-levels', step);
      const found = checkSequence(drawn, boardType).filter(({ severity }) => severity === 'error');
      expect(found.filter(({ problem }) => problem !== 'find-missing')).toEqual([]);
    },
  );
});

const beforeWhich: Partial<Record<Step['kind'], Step['kind']>> = {
  'find-points': 'trim',
  trim: 'seal',
  seal: 'verify',
  'output-levels': 'quiescent-current',
  branch: 'quiescent-current',
};
