import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { freshStep } from '@/lib/sequence/draft-edits';
import { fieldValue } from '@/lib/sequence/field-value';
import { blankText, readBlank, readNumber } from '@/lib/sequence/read-blank';
import type { Step, StepKind } from '@/lib/sequence/step';
import type { SentenceField } from '@/lib/steps/step-kind';
import { kindOf } from '@/lib/steps/step-kinds';
import { anySequence } from './any-sequence';

const step = (kind: StepKind) => freshStep(kind, 's1', cb1210);
const blanksOf = (each: Step) =>
  kindOf(each)
    .sentence(each)
    .filter((part): part is SentenceField => typeof part !== 'string');
const blank = (each: Step, field: string) => blanksOf(each).find((part) => part.field === field)!;

describe('what people type into a blank', () => {
  it.each([
    ['0.6', 0.6],
    ['0,6', 0.6],
    ['0,6 A', 0.6],
    ['.6a', 0.6],
    ['  0.60A ', 0.6],
    ['1.', 1],
  ])('%s is read', (typed, value) => {
    const each = step('power-up');
    expect(readBlank(each, blank(each, 'currentLimitAmps'), typed)).toEqual({ ok: true, value });
  });

  it.each([
    ['', 'Enter a number.'],
    ['abc', '“abc” is not a number of A.'],
    ['0.6 V', '“0.6 V” is not a number of A.'],
    ['1,2,3', '“1,2,3” is not a number of A.'],
    ['0', 'Use more than 0 A.'],
    ['-1', 'Use more than 0 A.'],
    ['0x1', '“0x1” is not a number of A.'],
  ])('%s is refused with a sentence', (typed, sentence) => {
    const each = step('power-up');
    expect(readBlank(each, blank(each, 'currentLimitAmps'), typed)).toEqual({ ok: false, sentence });
  });

  it('a scaled blank stores volts of the millivolts typed, to the last digit', () => {
    const each = step('trim');
    expect(readBlank(each, blank(each, 'toleranceVolts'), '4,1 mV')).toEqual({ ok: true, value: 0.0041 });
  });

  it('a count takes whole numbers only, within what the step holds', () => {
    const each = step('verify');
    const repeats = blank(each, 'repeats');
    expect(readBlank(each, repeats, '2,5')).toEqual({ ok: false, sentence: '“2,5” is not a whole number.' });
    expect(readBlank(each, repeats, '11')).toEqual({ ok: false, sentence: 'Use 10 or less.' });
  });

  it('only a blank that has words for it may be left empty', () => {
    const each = step('measure-channel');
    expect(readBlank(each, blank(each, 'minVolts'), '')).toEqual({ ok: true, value: null });
    expect(readBlank(each, blank(each, 'minVolts'), 'no limit')).toEqual({ ok: true, value: null });
  });

  it('a question that is too short says how long it has to be', () => {
    const each = step('operator-check');
    expect(readBlank(each, blank(each, 'question'), 'ab')).toEqual({
      ok: false,
      sentence: 'Use at least 3 characters.',
    });
  });

  it('spaces may group digits', () => {
    expect(readNumber('60 000 ms', 'ms')).toBe(60_000);
    expect(readNumber('6 0', 'ms')).toBeNull();
  });

  it('every number is shown so that reading it gives the same number', () => {
    fc.assert(
      fc.property(anySequence, ({ steps }) => {
        for (const each of steps) {
          for (const part of blanksOf(each)) {
            const value = fieldValue(each, part.field);
            if (typeof value !== 'number' || part.options) continue;
            const read = readBlank(each, part, blankText(value, part));
            expect(read.ok && Math.abs((read.value as number) - value) <= 1e-9).toBe(true);
          }
        }
      }),
      { numRuns: 60 },
    );
  });
});
