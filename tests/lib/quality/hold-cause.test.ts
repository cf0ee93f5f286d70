import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { holdCause, usualRuleSet, type HoldBoard } from '@/lib/quality/hold-cause';
import { holdWords } from '@/lib/quality/hold-words';
import { rejectWords } from '@/lib/messages/reject-words';

const baseline = { centre: 10.8, sigma: 0.01, boards: 30 };
const board = (place: number, over: Partial<HoldBoard> = {}): HoldBoard => ({
  place,
  verdict: 'pass',
  rejectReason: null,
  stationCode: 'S1',
  tripVolts: 10.8 + (place % 2 === 0 ? 0.003 : -0.003),
  ...over,
});
const boards = (count: number, over: (place: number) => Partial<HoldBoard> = () => ({})) =>
  Array.from({ length: count }, (_, i) => board(i + 1, over(i + 1)));
const rejected = { verdict: 'reject', rejectReason: 'release-too-high', tripVolts: null } as const;

describe('a hold by rule', () => {
  test('is raised by nine boards in a row above the centre, and names them and their station', () => {
    const drifting = boards(40, (place) => (place > 31 ? { tripVolts: 10.806 } : {}));
    expect(holdCause(drifting.slice(0, -1), usualRuleSet, baseline)).toBeNull();
    expect(holdCause(drifting, usualRuleSet, baseline)).toEqual({
      cause: 'run-rule',
      holdRule: { rule: 2, times: 1, within: 1 },
      fromBoard: 32,
      toBoard: 40,
      stationCode: 'S1',
    });
  });

  test('needs two boards beyond three sigma within ten, not one', () => {
    const beyond = (...places: number[]) => boards(40, (place) => (places.includes(place) ? { tripVolts: 10.84 } : {}));
    expect(holdCause(beyond(20), usualRuleSet, baseline)).toBeNull();
    expect(holdCause(beyond(20, 31), usualRuleSet, baseline)).toBeNull();
    expect(holdCause(beyond(20, 27), usualRuleSet, baseline)).toMatchObject({ fromBoard: 20, toBoard: 27 });
  });

  test('is not raised by run rules before limits are frozen', () => {
    expect(
      holdCause(
        boards(40, () => ({ tripVolts: 10.9 })),
        usualRuleSet,
        null,
      ),
    ).toBeNull();
  });

  test('is raised by the same reason three times in a row, whatever passed before', () => {
    const three = boards(10, (place) => (place > 7 ? rejected : {}));
    expect(holdCause(three, usualRuleSet, baseline)).toMatchObject({ cause: 'same-reason', times: 3 });
    expect(holdCause(three.slice(0, -1), usualRuleSet, baseline)).toBeNull();
    const mixed = boards(10, (place) =>
      place > 7 ? { ...rejected, rejectReason: place === 9 ? 'trip-too-low' : 'release-too-high' } : {},
    );
    expect(holdCause(mixed, usualRuleSet, baseline)).toBeNull();
  });

  test('is raised by a yield under its floor only once enough boards were tested', () => {
    const rules = { ...usualRuleSet, sameReason: null, yieldFloor: { least: 0.9, boards: 20 } };
    const poor = boards(20, (place) => (place % 5 === 0 ? rejected : {}));
    expect(holdCause(poor, rules, null)).toEqual({ cause: 'yield-floor', passed: 16, boards: 20, least: 0.9 });
    expect(holdCause(poor.slice(1), rules, null)).toBeNull();
    expect(
      holdCause(
        boards(20, (place) => (place % 10 === 0 ? rejected : {})),
        rules,
        null,
      ),
    ).toBeNull();
  });

  test('never falls on boards that sit on the centre without spread in their reasons', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 300 }), (count) => {
        expect(holdCause(boards(count), usualRuleSet, baseline)).toBeNull();
      }),
    );
  });

  test('says what it saw in one sentence', () => {
    const words = (detail: Parameters<typeof holdWords>[0]) =>
      holdWords(detail, (reason) => rejectWords[reason as keyof typeof rejectWords]);
    expect(
      words({
        cause: 'run-rule',
        holdRule: { rule: 2, times: 1, within: 1 },
        fromBoard: 201,
        toBoard: 209,
        stationCode: 'S3',
      }),
    ).toBe(
      'Trip points leave their usual spread: nine in a row on one side of the centre, boards 201 to 209 at station S3.',
    );
    expect(words({ cause: 'same-reason', reason: 'release-too-high', times: 3, stationCode: null })).toContain(
      '3 boards in a row were rejected for the same reason',
    );
  });
});
