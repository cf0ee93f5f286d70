import { expect, test } from 'vitest';
import { actionWords, changesOf, thingWords } from '@/lib/trail/entry-words';

test('an action is said in words', () => {
  expect(actionWords('unit.retest-ordered')).toBe('Unit, retest ordered');
  expect(actionWords('lot.held')).toBe('Lot, held');
});

test('only what differs is told, with what it was and what it is', () => {
  expect(
    changesOf({ tripVoltsMax: 10.9, held: false, code: 'A' }, { tripVoltsMax: 10.88, held: true, code: 'A' }),
  ).toEqual([
    { name: 'trip volts max', from: '10.9', to: '10.88' },
    { name: 'held', from: 'no', to: 'yes' },
  ]);
  expect(changesOf(null, { size: 24 })).toEqual([{ name: 'size', from: null, to: '24' }]);
});

test('a thing is named by what people know it by', () => {
  expect(thingWords('5f1c2a77-0000-4000-8000-000000000000', null, { code: '2648-01' })).toBe('2648-01');
  expect(thingWords('5f1c2a77-0000-4000-8000-000000000000', null, null)).toBe('5f1c2a77');
});
