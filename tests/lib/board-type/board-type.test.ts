import { describe, expect, test } from 'vitest';
import { boardTypes, cb0612, cb1210, cb2420 } from '@/db/seed/board-types';
import { formOf, readForm } from '@/lib/board-type/board-type-form';
import { checkBoardType } from '@/lib/board-type/check-board-type';
import { compareBoardTypes } from '@/lib/board-type/compare-board-types';
import { readSerialPattern } from '@/lib/board-type/serial-pattern';
import { boardTypeSchema, type BoardType } from '@/lib/contracts/board-type';

const problemsOf = (boardType: BoardType) =>
  checkBoardType(boardType).map(({ field, problem }) => `${field}: ${problem}`);
const withLimits = (limits: Partial<BoardType['limits']>): BoardType => ({
  ...cb1210,
  limits: { ...cb1210.limits, ...limits },
});

describe('a board type as it is typed', () => {
  test.each(boardTypes)('$code reads back from its own text without a change', (boardType) => {
    const { boardType: read, unreadable } = readForm(formOf(boardType), boardType.code);
    expect(unreadable).toEqual({});
    expect(compareBoardTypes(boardTypeSchema.parse(boardType), read!)).toEqual([]);
  });

  test('a single-turn trimmer is typed in degrees and kept in turns', () => {
    const form = formOf(cb0612);
    expect(form.texts['trimmer.turns']).toBe('270 °');
    form.texts['trimmer.turns'] = '260';
    expect(readForm(form, 'CB0612').boardType!.trimmer.turns).toBeCloseTo(260 / 360, 12);
  });

  test('a text that is no value stands under its field, and the others are still read', () => {
    const form = formOf(cb1210);
    form.texts['design.feedbackOhms'] = 'large';
    form.texts['tolerances.feedbackOhms'] = '80 %';
    const { boardType, unreadable } = readForm(form, 'CB1210');
    expect(boardType).toBeNull();
    expect(unreadable).toEqual({
      'design.feedbackOhms': '“large” is not a value. Write it such as 4.7 kΩ.',
      'tolerances.feedbackOhms': 'A tolerance is at most 50 %.',
    });
  });

  test('limits in the wrong order stand under the upper one', () => {
    const form = formOf(cb1210);
    form.texts['limits.tripVolts.max'] = '10.6';
    expect(readForm(form, 'CB1210').unreadable).toEqual({
      'limits.tripVolts.max': 'The upper limit must be above the lower limit.',
    });
  });
});

describe('rules beyond the shapes', () => {
  test.each(boardTypes)('$code of the demo has no finding', (boardType) => {
    expect(checkBoardType(boardType)).toEqual([]);
  });

  test.each<[string, BoardType]>([
    ['limits.releaseVolts.min: release-below-trip', withLimits({ releaseVolts: { min: 10.9, max: 12.5 } })],
    ['limits.hysteresisVolts.max: hysteresis-too-small', withLimits({ hysteresisVolts: { min: 0.8, max: 1.1 } })],
    ['limits.hysteresisVolts.min: hysteresis-too-large', withLimits({ hysteresisVolts: { min: 1.85, max: 2 } })],
    ['absoluteMaximumVolts: maximum-below-release', { ...cb1210, absoluteMaximumVolts: 12.5 }],
    ['limits.outputHighDropVolts.max: drop-outside-limit', withLimits({ outputHighDropVolts: { max: 1.2 } })],
    ['limits.quiescentAmps.max: current-outside-limit', withLimits({ quiescentAmps: { max: 0.005 } })],
    [
      'search.tripVolts.min: search-misses-limit',
      { ...cb1210, search: { ...cb1210.search, tripVolts: { min: 10.8, max: 13 } } },
    ],
    [
      'search.tripVolts.max: search-above-maximum',
      { ...cb1210, search: { ...cb1210.search, tripVolts: { min: 8, max: 15.5 } } },
    ],
    ['search.supplyMinVolts: supply-above-search', { ...cb1210, search: { ...cb1210.search, supplyMinVolts: 8.1 } }],
    [
      'sensing.thresholdVolts: threshold-outside',
      { ...cb1210, sensing: { kind: 'output-voltage', thresholdVolts: 5.3 } },
    ],
    ['sensing.thresholdAmps: threshold-outside', { ...cb2420, sensing: { kind: 'load-current', thresholdAmps: 0.03 } }],
    ['serialPattern: pattern-unread', { ...cb1210, serialPattern: 'CB1210\\d{9}' }],
    ['serialPattern: code-not-in-serial', { ...cb1210, serialPattern: '^\\d{15}$' }],
    ['serialPattern: serial-not-printable', { ...cb1210, serialPattern: '^CB1210[A-Z]{20}$' }],
  ])('%s', (problem, boardType) => {
    expect(problemsOf(boardType)).toContain(problem);
  });
});

describe('a serial pattern', () => {
  test('is told in words, with a serial that it takes', () => {
    expect(readSerialPattern('^CB1210\\d{4}\\d{5}$')).toMatchObject({
      words: 'CB1210, then 9 digits',
      example: 'CB1210123456789',
    });
    expect(readSerialPattern('^AB-[A-Z]{2}[0-9]{3,5}$')).toMatchObject({
      words: 'AB-, then 2 capitals, then 3 to 5 digits',
      longest: 10,
    });
  });

  test('every example matches its own pattern', () => {
    for (const pattern of ['^A{3}B\\d$', '^X[A-F0-9]{4}$', '^CB1210\\d{9}$', '^[A-Z]\\d{2,4}-Q$']) {
      const read = readSerialPattern(pattern);
      expect(read.ok && read.expression.test(read.example)).toBe(true);
    }
  });

  test.each([
    'CB\\d',
    '^CB\\d',
    'CB\\d$',
    '^CB\\d\\$',
    '^(a+)+$',
    '^.*$',
    '^CB[A-Z$',
    '^CB$',
    '^\\d{99}$',
    '^\\d{5,2}$',
  ])('refuses %s', (pattern) => {
    expect(readSerialPattern(pattern).ok).toBe(false);
  });
});

test('two revisions are compared field by field in words', () => {
  const after = withLimits({ releaseVolts: { min: 12.1, max: 12.4 } });
  after.design = { ...after.design, feedbackOhms: 110_000 };
  after.label = { typeLine: true, pointsLine: false };
  expect(compareBoardTypes(cb1210, after)).toEqual([
    { label: 'R5 feedback', before: '105 kΩ', after: '110 kΩ' },
    { label: 'Release point, at most', before: '12.50 V', after: '12.40 V' },
    { label: 'Points on the label', before: 'printed', after: 'not printed' },
  ]);
});
