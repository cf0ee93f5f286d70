import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  beginHistory,
  endGroup,
  mostEntries,
  rebase,
  record,
  redo,
  undo,
  type History,
} from '@/lib/sequence/draft-history';

/** Distinct objects, as drafts are. */
interface Entry {
  text: string;
}
const begun = () => beginHistory<Entry>({ text: '' });

type Act = { act: 'record'; text: string; group: string | null } | { act: 'undo' | 'redo' | 'end' };
const anyActs: fc.Arbitrary<Act[]> = fc.array(
  fc.oneof(
    fc.record({
      act: fc.constant('record' as const),
      text: fc.string({ maxLength: 3 }),
      group: fc.constantFrom(null, 'a', 'b'),
    }),
    fc.record({ act: fc.constantFrom('undo' as const, 'redo' as const, 'end' as const) }),
  ),
  { maxLength: 60 },
);

function play(acts: readonly Act[], from: History<Entry> = begun()): History<Entry> {
  return acts.reduce((history, each) => {
    if (each.act === 'record') return record(history, { text: each.text }, each.group);
    return each.act === 'undo' ? undo(history) : each.act === 'redo' ? redo(history) : endGroup(history);
  }, from);
}

describe('the history of a draft', () => {
  it('undo takes back exactly what an edit did, redo brings it again', () => {
    fc.assert(
      fc.property(anyActs, fc.string(), (acts, text) => {
        const before = endGroup(play(acts));
        const edited = record(before, { text });
        expect(undo(edited).present).toBe(before.present);
        expect(undo(edited).past).toEqual(before.past.slice(-mostEntries));
        expect(redo(undo(edited)).present).toBe(edited.present);
      }),
    );
  });

  it('undoing all and redoing all ends where it began', () => {
    fc.assert(
      fc.property(anyActs, (acts) => {
        const end = play(acts);
        let back = end;
        for (let i = 0; i < end.past.length; i++) back = undo(back);
        expect(back.past).toEqual([]);
        for (let i = 0; i < end.past.length; i++) back = redo(back);
        expect(back.present).toBe(end.present);
        expect(back.past).toEqual(end.past);
        expect(back.future).toEqual(end.future);
      }),
    );
  });

  it('never holds more than its bound', () => {
    const long = Array.from({ length: mostEntries + 50 }, (_, i): Act => ({
      act: 'record',
      text: `${i}`,
      group: null,
    }));
    expect(play(long).past).toHaveLength(mostEntries);
  });

  it('takes typing in one field as one entry until the field is left', () => {
    let history = record(begun(), { text: '0' }, 's2/volts');
    history = record(history, { text: '0,' }, 's2/volts');
    history = record(history, { text: '0,8' }, 's2/volts');
    expect(history.past).toHaveLength(1);
    history = record(endGroup(history), { text: '0,85' }, 's2/volts');
    expect(history.past).toHaveLength(2);
    expect(undo(history).present.text).toBe('0,8');
  });

  it('forgets what could be redone once something else is done', () => {
    const history = record(undo(record(begun(), { text: 'a' })), { text: 'b' });
    expect(redo(history)).toEqual(history);
  });

  it('an edit that changes nothing is no entry', () => {
    const history = begun();
    expect(record(history, history.present)).toBe(history);
  });

  it('a rebase reaches every entry', () => {
    const history = undo(
      play([
        { act: 'record', text: 'a', group: null },
        { act: 'record', text: 'b', group: null },
      ]),
    );
    const rebased = rebase(history, ({ text }) => ({ text: `${text}!` }));
    expect([...rebased.past, rebased.present, ...rebased.future].map(({ text }) => text)).toEqual(['!', 'a!', 'b!']);
  });
});
