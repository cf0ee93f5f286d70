import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { sequences } from '@/db/seed/sequences';
import { readJson } from '@/lib/sequence/json-places';
import {
  readSequenceFile,
  sequenceFileJsonSchema,
  sequenceOf,
  writeSequenceFile,
  type FileProblem,
} from '@/lib/sequence/sequence-file';
import { anySequence } from './any-sequence';

const of = { boardType: 'CB1210', name: 'CB1210 cutoff trim', revision: 3 };
const whole = writeSequenceFile(sequences[0]!.sequence, of);
const problems = (text: string): FileProblem[] => {
  const read = readSequenceFile(text);
  return read.ok ? [] : read.problems;
};
const lineOf = (text: string, part: string) => text.slice(0, text.indexOf(part)).split('\n').length;

describe('a sequence as a file', () => {
  test('is read as it was written, whatever the sequence', () => {
    fc.assert(
      fc.property(anySequence, (sequence) => {
        const text = writeSequenceFile(sequence, of);
        const read = readSequenceFile(text);
        if (!read.ok) throw new Error(JSON.stringify(read.problems));
        expect(sequenceOf(read.file)).toEqual(sequence);
        expect(read.file).toMatchObject(of);
        expect(writeSequenceFile(sequenceOf(read.file), of)).toBe(text);
      }),
      { numRuns: 100 },
    );
  });

  test('has a published schema that is current', async () => {
    const text = `${JSON.stringify(sequenceFileJsonSchema(), null, 2)}\n`;
    await expect(text).toMatchFileSnapshot('../../../lib/sequence/sillwright-sequence.schema.json');
  });
});

describe('a bad file', () => {
  test('is answered with line, field and reason, all at once', () => {
    const text = whole
      .replace('"currentLimitAmps": 0.3', '"currentLimitAmps": "0.3"')
      .replace('"procedure": "two-beeps"', '"procedure": "three-beeps"')
      .replace('"mostRounds": 8', '"mostRounds": 0')
      .replace(/^ *"targetVolts".*\n/m, '');
    expect(problems(text)).toEqual([
      {
        line: lineOf(text, '"currentLimitAmps": "0.3"'),
        field: 'step 2, currentLimitAmps',
        reason: 'It must be a number, not "0.3".',
      },
      { line: lineOf(text, '"id": "s5"') - 1, field: 'step 5, targetVolts', reason: 'It is missing.' },
      {
        line: lineOf(text, '"three-beeps"'),
        field: 'step 5, procedure',
        reason: 'It must be one of "two-beeps", "prompted", "wiper-probe", not "three-beeps".',
      },
      { line: lineOf(text, '"mostRounds": 0'), field: 'step 5, mostRounds', reason: 'It must be more than 0.' },
    ]);
  });

  test('of another format or version is told so', () => {
    expect(problems(whole.replace('"version": 1', '"version": 2'))).toMatchObject([
      { line: 3, field: 'version', reason: 'It must be 1, not 2.' },
    ]);
    expect(problems('[]')).toMatchObject([{ line: 1, field: '' }]);
  });

  test('with a kind of step, a field or an id that the format does not take is told where', () => {
    const kind = whole.replace('"kind": "seal"', '"kind": "glue"');
    expect(problems(kind)).toMatchObject([{ line: lineOf(kind, '"glue"'), field: 'step 6, kind' }]);
    const field = whole.replace('"settleMs": 250', '"settleMs": 250,\n      "setleMs": 10');
    expect(problems(field)).toEqual([
      { line: lineOf(field, '"setleMs"'), field: 'step 2, setleMs', reason: 'The format has no such field.' },
    ]);
    const id = whole.replace('"id": "s3"', '"id": "s2"');
    expect(problems(id)).toMatchObject([{ field: 'step 3, id', reason: 'Another step has this id.' }]);
    const twice = whole.replace('"version": 1', '"version": 1,\n  "version": 1');
    expect(problems(twice)).toMatchObject([{ line: 4, field: 'version', reason: 'It is given twice.' }]);
  });

  test.each([
    ['', 1, /value is expected, not the end/],
    ['{\n  "format": \n}', 3, /value is expected, not “}”/],
    ['{\n  "format" "x"\n}', 2, /colon is expected after “format”/],
    ['{\n  "a": 1\n  "b": 2\n}', 3, /comma or “}” is expected/],
    ['{\n  "a": [1, 2\n', 3, /comma or “]” is expected, not the end/],
    ['{\n  "a": "x\n"\n}', 2, /text does not end/],
    ['{ "a": 01 }', 1, /value is expected, not “01”/],
    ['{}\n{}', 2, /Nothing more is expected/],
    ['['.repeat(200), 1, /nested too deeply/],
  ])('that is not JSON is told the line: %j', (text, line, reason) => {
    expect(problems(text)).toEqual([{ line, field: '', reason: expect.stringMatching(reason) }]);
  });
});

test('JSON is read as JSON.parse reads it', () => {
  fc.assert(
    fc.property(fc.jsonValue(), fc.constantFrom(0, 2), (value, indent) => {
      const text = JSON.stringify(value, null, indent);
      const read = readJson(text);
      expect(read.ok && read.value).toEqual(JSON.parse(text));
    }),
  );
});

test('what JSON.parse refuses is refused, and the reverse', () => {
  const piece = fc.constantFrom('{', '}', '[', ']', ',', ':', '"a"', '1', '-', '.5', 'true', 'nul', ' ', '\n', '"\\x"');
  fc.assert(
    fc.property(fc.array(piece, { maxLength: 8 }), (pieces) => {
      const text = pieces.join('');
      let parses = true;
      try {
        JSON.parse(text);
      } catch {
        parses = false;
      }
      expect(readJson(text).ok).toBe(parses);
    }),
    { numRuns: 500 },
  );
});
