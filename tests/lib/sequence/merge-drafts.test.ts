import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { chooseConflict, storable } from '@/lib/sequence/choose-conflict';
import { blankKey, isSameDraft, openDraft, sameContent, type Draft, type StoredDraft } from '@/lib/sequence/draft';
import { freshStep, insertStep, moveStep, removeStep, renameStep, setField, setRule } from '@/lib/sequence/draft-edits';
import { fieldsOf, fieldValue } from '@/lib/sequence/field-value';
import { mergeDrafts } from '@/lib/sequence/merge-drafts';
import { anyEdits, anyStored, edited } from './any-draft';

const by = 'K. Osei';
const stored = ({ sequence, warningReasons }: StoredDraft): StoredDraft => ({ sequence, warningReasons });
const stepOf = (draft: StoredDraft, id: string) => draft.sequence.steps.find((step) => step.id === id);
const ids = (draft: StoredDraft) => draft.sequence.steps.map(({ id }) => id);
const threeWays = fc
  .tuple(anyStored, anyEdits('mine'), anyEdits('theirs'))
  .map(([base, mine, theirs]) => ({ base, mine: edited(base, mine), theirs: stored(edited(base, theirs)) }));
const both = (check: (ways: { base: StoredDraft; mine: Draft; theirs: StoredDraft }) => void) =>
  fc.assert(fc.property(threeWays, check), { numRuns: 120 });

describe('merging what two people changed', () => {
  it('takes theirs whole where nothing was changed here', () =>
    both(({ base, theirs }) => {
      const merged = mergeDrafts(base, openDraft(base), theirs, by);
      expect(isSameDraft(merged, theirs)).toBe(true);
      expect(merged.conflicts).toEqual([]);
    }));

  it('keeps mine whole where nothing was changed there', () =>
    both(({ base, mine }) => {
      const merged = mergeDrafts(base, mine, base, by);
      expect(isSameDraft(merged, mine)).toBe(true);
      expect(merged.conflicts).toEqual([]);
    }));

  it('every value changed here stands in the draft', () =>
    both(({ base, mine, theirs }) => {
      const merged = mergeDrafts(base, mine, theirs, by);
      for (const step of mine.sequence.steps) {
        const before = stepOf(base, step.id);
        for (const field of ['name', 'enabled', ...fieldsOf(step)]) {
          if (before && sameContent(fieldValue(before, field), fieldValue(step, field))) continue;
          expect(fieldValue(stepOf(merged, step.id)!, field)).toEqual(fieldValue(step, field));
        }
      }
    }));

  it('every value changed there stands in the draft or is offered beside mine', () =>
    both(({ base, mine, theirs }) => {
      const merged = mergeDrafts(base, mine, theirs, by);
      for (const step of theirs.sequence.steps) {
        const before = stepOf(base, step.id);
        for (const field of ['name', 'enabled', ...fieldsOf(step)]) {
          const value = fieldValue(step, field);
          if (before && sameContent(fieldValue(before, field), value)) continue;
          const offered = merged.conflicts.some(
            (each) =>
              each.kind === 'value' &&
              each.stepId === step.id &&
              each.field === field &&
              sameContent(each.theirs, value),
          );
          expect(offered || sameContent(fieldValue(stepOf(merged, step.id)!, field), value)).toBe(true);
        }
      }
    }));

  it('a step goes only where one removed it and the other left it as it was', () =>
    both(({ base, mine, theirs }) => {
      const merged = mergeDrafts(base, mine, theirs, by);
      for (const id of new Set([...ids(base), ...ids(mine), ...ids(theirs)])) {
        if (stepOf(merged, id)) continue;
        const [before, here, there] = [stepOf(base, id), stepOf(mine, id), stepOf(theirs, id)];
        expect(before).toBeDefined();
        expect(here === undefined || sameContent(here, before)).toBe(true);
        expect(there === undefined || sameContent(there, before)).toBe(true);
        expect(here === undefined || there === undefined).toBe(true);
      }
      expect(new Set(ids(merged)).size).toBe(ids(merged).length);
    }));

  it('hearing the same again changes nothing, open choices included', () =>
    both(({ base, mine, theirs }) => {
      const once = mergeDrafts(base, mine, theirs, by);
      const again = mergeDrafts(theirs, once, theirs, by);
      expect(isSameDraft(again, once)).toBe(true);
      expect(again.conflicts).toEqual(once.conflicts);
    }));

  it('what is stored while choices are open keeps theirs, so the other sees nothing replaced', () =>
    both(({ base, mine, theirs }) => {
      const sent = storable(mergeDrafts(base, mine, theirs, by));
      for (const step of theirs.sequence.steps) {
        const before = stepOf(base, step.id);
        if (before && sameContent(before, step)) continue;
        const changed = fieldsOf(step).filter(
          (field) => !before || !sameContent(fieldValue(before, field), fieldValue(step, field)),
        );
        for (const field of changed) expect(fieldValue(stepOf(sent, step.id)!, field)).toEqual(fieldValue(step, field));
      }
    }));

  it('choosing ends every conflict, and all of theirs chosen is what would be stored', () =>
    both(({ base, mine, theirs }) => {
      const merged = mergeDrafts(base, mine, theirs, by);
      const chosen = merged.conflicts.reduce((draft, each) => chooseConflict(draft, each, 'theirs'), merged);
      expect(chosen.conflicts).toEqual([]);
      expect(isSameDraft(chosen, storable(merged))).toBe(true);
    }));
});

describe('merging by example', () => {
  const steps = ['a', 'b', 'c', 'd'].map((id) => freshStep('power-up', id, cb1210));
  const base: StoredDraft = { sequence: { steps, decisionRule: { kind: 'simple' } }, warningReasons: {} };
  const open = openDraft(base);
  const limit = (stepId: string, value: number) => ({ stepId, field: 'currentLimitAmps', value });

  it('two fields of one step both stand', () => {
    const theirs = stored(setField(open, { stepId: 'b', field: 'volts', value: 13 }));
    const merged = mergeDrafts(base, setField(open, limit('b', 0.6)), theirs, by);
    expect(stepOf(merged, 'b')).toMatchObject({ volts: 13, currentLimitAmps: 0.6 });
    expect(merged.conflicts).toEqual([]);
  });

  it('the same field stays mine and offers theirs', () => {
    const merged = mergeDrafts(base, setField(open, limit('b', 0.6)), stored(setField(open, limit('b', 0.7))), by);
    expect(stepOf(merged, 'b')).toMatchObject({ currentLimitAmps: 0.6 });
    expect(merged.conflicts).toEqual([{ kind: 'value', stepId: 'b', field: 'currentLimitAmps', theirs: 0.7, by }]);
    expect(stepOf(chooseConflict(merged, merged.conflicts[0]!, 'theirs'), 'b')).toMatchObject({
      currentLimitAmps: 0.7,
    });
  });

  it('a text that cannot be read counts as changed here', () => {
    const typed = { ...open, unread: { [blankKey('b', 'currentLimitAmps')]: '0.6 of' } };
    const merged = mergeDrafts(base, typed, stored(setField(open, limit('b', 0.7))), by);
    expect(merged.unread).toEqual(typed.unread);
    expect(merged.conflicts).toHaveLength(1);
    const chosen = chooseConflict(merged, merged.conflicts[0]!, 'theirs');
    expect(chosen.unread).toEqual({});
  });

  it('a step they moved moves, and one I put beside it stays beside it', () => {
    const mine = insertStep(open, freshStep('soak', 'mine', cb1210), 'a');
    const merged = mergeDrafts(base, mine, stored(moveStep(open, 'd', 0)), by);
    expect(ids(merged)).toEqual(['d', 'a', 'mine', 'b', 'c']);
  });

  it('a step that both moved stays where I put it and offers the other place', () => {
    const merged = mergeDrafts(base, moveStep(open, 'd', 0), stored(moveStep(open, 'd', 1)), by);
    expect(ids(merged)).toEqual(['d', 'a', 'b', 'c']);
    expect(merged.conflicts).toEqual([{ kind: 'place', stepId: 'd', after: 'a', by }]);
    expect(ids(chooseConflict(merged, merged.conflicts[0]!, 'theirs'))).toEqual(['a', 'd', 'b', 'c']);
  });

  it('a step I changed and they removed stays until chosen', () => {
    const merged = mergeDrafts(base, renameStep(open, 'c', 'Again'), stored(removeStep(open, 'c')), by);
    expect(merged.conflicts).toEqual([{ kind: 'removed-there', stepId: 'c', by }]);
    expect(ids(merged)).toContain('c');
    expect(ids(storable(merged))).not.toContain('c');
  });

  it('a step I removed and they changed stands again as they changed it', () => {
    const merged = mergeDrafts(base, removeStep(open, 'c'), stored(renameStep(open, 'c', 'Again')), by);
    expect(stepOf(merged, 'c')).toMatchObject({ name: 'Again' });
    expect(ids(chooseConflict(merged, merged.conflicts[0]!, 'mine'))).not.toContain('c');
  });

  it('two rules are a choice', () => {
    const theirs = stored(setRule(open, { kind: 'guard-band', factor: 1 }));
    const merged = mergeDrafts(base, setRule(open, { kind: 'guard-band', factor: 2 }), theirs, by);
    expect(merged.conflicts).toMatchObject([{ kind: 'rule', theirs: { factor: 1 } }]);
  });
});
