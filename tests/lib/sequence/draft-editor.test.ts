import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { isSameDraft, openDraft } from '@/lib/sequence/draft';
import { freshStep, renameStep, setField, typeInto } from '@/lib/sequence/draft-edits';
import { advanceEditor, isUnsaved, openEditor, type DraftEditor, type Saved } from '@/lib/sequence/draft-editor';
import { kindOf } from '@/lib/steps/step-kinds';
import { anyEdits, anyStored, edited } from './any-draft';

const steps = ['a', 'b'].map((id) => freshStep('power-up', id, cb1210));
const saved: Saved = {
  sequence: { steps, decisionRule: { kind: 'simple' } },
  warningReasons: {},
  version: 4,
  savedAtIso: '2026-11-30T10:52:00.000Z',
};
const later = (change: Partial<Saved>): Saved => ({
  ...saved,
  version: 5,
  savedAtIso: '2026-11-30T10:53:00.000Z',
  ...change,
});
const volts = (editor: DraftEditor, i: number) => (editor.history.present.sequence.steps[i] as { volts: number }).volts;
const setVolts = (stepId: string, value: number) => ({
  kind: 'edit' as const,
  change: (draft: Parameters<typeof setField>[0]) => setField(draft, { stepId, field: 'volts', value }),
});

describe('the editor of a draft', () => {
  it('undo takes back my own edit and not what another saved meanwhile', () => {
    const theirs = later({
      sequence: setField(openDraft(saved), { stepId: 'b', field: 'volts', value: 12.5 }).sequence,
    });
    let editor = advanceEditor(openEditor(saved), setVolts('a', 13));
    editor = advanceEditor(editor, { kind: 'heard', theirs, by: 'K. Osei' });
    expect([volts(editor, 0), volts(editor, 1)]).toEqual([13, 12.5]);
    editor = advanceEditor(editor, { kind: 'undo' });
    expect([volts(editor, 0), volts(editor, 1)]).toEqual([volts(openEditor(saved), 0), 12.5]);
    expect(isUnsaved(editor)).toBe(false);
  });

  it('is unsaved after an edit and saved once what was sent is stored', () => {
    const editor = advanceEditor(openEditor(saved), setVolts('a', 13));
    expect(isUnsaved(editor)).toBe(true);
    const { sequence, warningReasons } = editor.history.present;
    const event = { kind: 'saved' as const, sent: { sequence, warningReasons }, version: 5, savedAtIso: '' };
    expect(isUnsaved(advanceEditor(editor, event))).toBe(false);
    expect(isUnsaved(advanceEditor(advanceEditor(editor, setVolts('a', 12)), event))).toBe(true);
  });

  it('an answer that comes late does not go back to an older version', () => {
    const editor = openEditor(later({}));
    expect(advanceEditor(editor, { kind: 'heard', theirs: saved, by: '' })).toBe(editor);
  });

  it('text kept from a tab that was lost comes back with what cannot be read, over what was saved since', () => {
    const blank = kindOf(steps[0]!)
      .sentence(steps[0]!)
      .find((part) => typeof part !== 'string' && part.field === 'volts');
    const draft = typeInto(renameStep(openDraft(saved), 'a', 'Up'), 'a', blank as never, '13 or so');
    const theirs = later({ sequence: renameStep(openDraft(saved), 'b', 'Again').sequence });
    const editor = advanceEditor(openEditor(theirs), { kind: 'restored', kept: { draft, base: saved } });
    expect(editor.history.present.sequence.steps.map(({ name }) => name)).toEqual(['Up', 'Again']);
    expect(editor.history.present.unread).toEqual({ 'a/volts': '13 or so' });
  });

  it('two tabs that save in turn and take no choices end with the same text', () => {
    fc.assert(
      fc.property(anyStored, anyEdits('mine'), anyEdits('theirs'), (base, mine, theirs) => {
        const first: Saved = { ...base, version: 1, savedAtIso: '' };
        const { sequence, warningReasons } = edited(base, theirs);
        const second: Saved = { sequence, warningReasons, version: 2, savedAtIso: '' };
        let here = mine.reduce((editor, change) => advanceEditor(editor, { kind: 'edit', change }), openEditor(first));
        here = advanceEditor(here, { kind: 'heard', theirs: second, by: '' });
        const { present } = here.history;
        if (present.conflicts.length > 0) return;
        const third: Saved = { ...present, version: 3, savedAtIso: '' };
        const there = advanceEditor(openEditor(second), { kind: 'heard', theirs: third, by: '' });
        expect(isSameDraft(there.history.present, present)).toBe(true);
      }),
      { numRuns: 60 },
    );
  });
});
