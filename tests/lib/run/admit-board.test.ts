import { describe, expect, it } from 'vitest';
import { admitBoard, refuseTrialBoard, type BoardFacts, type TrialBoardFacts } from '@/lib/run/admit-board';
import type { BoardStanding } from '@/lib/decision/board-standing';
import { cb1210 } from '@/db/seed/board-types';

const serial = 'CB1210264800184';
const facts = (
  over: Partial<BoardFacts> = {},
  standing: BoardStanding = { kind: 'may-be-tested', retestOrderId: null },
) => ({
  serial,
  lot: {
    code: '2648-B',
    state: 'open' as const,
    held: false,
    boardTypeCode: 'CB1210',
    serialPattern: cb1210.serialPattern,
  },
  unit: { lotCode: '2648-B', standing },
  inTestAt: null,
  sequence: { number: 2, status: 'released' as const, withdrawnReason: null },
  ...over,
});
const refusal = (over: Partial<BoardFacts>, standing?: BoardStanding) => {
  const admission = admitBoard(facts(over, standing));
  return admission.allowed ? null : admission.refusal;
};
const lot = facts().lot;

describe('a board is admitted', () => {
  it('when its lot is open and its record allows a test, with the retest order that allows it', () => {
    expect(admitBoard(facts({}, { kind: 'may-be-tested', retestOrderId: 'o1' }))).toEqual({
      allowed: true,
      retestOrderId: 'o1',
    });
  });
  it('with a superseded revision, which runs on in the lots that pin it', () => {
    const sequence = { number: 1, status: 'superseded' as const, withdrawnReason: null };
    expect(admitBoard(facts({ sequence }))).toMatchObject({ allowed: true });
  });
});

describe('a board is refused, with its reason', () => {
  it('when it passed, with the time of the pass', () => {
    expect(refusal({}, { kind: 'passed', at: '2026-12-01T11:38:00Z' })).toEqual({
      code: 'board-passed',
      params: { serial, atIso: '2026-12-01T11:38:00Z' },
    });
  });
  it.each<[string, BoardStanding]>([
    ['board-scrapped', { kind: 'scrapped' }],
    ['board-used-as-is', { kind: 'used-as-is' }],
    ['board-returned', { kind: 'returned' }],
    ['board-needs-disposition', { kind: 'needs-disposition' }],
    ['board-failing-when-stopped', { kind: 'waits-for-quality', because: 'failing-when-stopped' }],
    ['board-three-without-verdict', { kind: 'waits-for-quality', because: 'three-without-verdict' }],
    ['attempts-used', { kind: 'attempts-used', most: 3 }],
    ['board-in-test', { kind: 'in-test' }],
  ])('%s', (code, standing) => {
    expect(refusal({ inTestAt: 'S2' }, standing)).toMatchObject({ code });
  });
  it.each<[string, Partial<BoardFacts>]>([
    ['lot-on-hold', { lot: { ...lot, held: true } }],
    ['lot-paused', { lot: { ...lot, state: 'paused' } }],
    ['lot-not-open', { lot: { ...lot, state: 'closed' } }],
    ['sequence-not-released', { sequence: { number: 2, status: 'submitted', withdrawnReason: null } }],
    ['sequence-withdrawn', { sequence: { number: 2, status: 'withdrawn', withdrawnReason: 'Wrong window.' } }],
    ['serial-wrong-form', { serial: 'CB2420264800184' }],
    ['serial-wrong-form', { serial: `${serial}7` }],
    ['serial-unknown', { unit: null }],
    ['serial-of-other-lot', { unit: { lotCode: '2648-A', standing: { kind: 'may-be-tested', retestOrderId: null } } }],
  ])('%s', (code, over) => {
    expect(refusal(over)).toMatchObject({ code });
  });
  it('for its lot before its own record, since a held lot is not tested whatever the board', () => {
    expect(refusal({ lot: { ...lot, held: true } }, { kind: 'passed', at: '' })).toMatchObject({ code: 'lot-on-hold' });
  });
});

it('a board on another fixture is refused there, though an engineering run is no part of its record', () => {
  expect(refusal({ inTestAt: 'S2' })).toEqual({ code: 'board-in-test', params: { serial, station: 'S2' } });
});

describe('a board scanned in a trial', () => {
  const trial = (over: Partial<TrialBoardFacts> = {}) =>
    refuseTrialBoard({
      serial,
      offer: { boardTypeCode: 'CB1210', serialPattern: cb1210.serialPattern },
      unit: { isOfType: true, standing: { kind: 'may-be-tested', retestOrderId: null } },
      inTestAt: null,
      ...over,
    });

  it('may be of a lot, or a spare one that belongs to none', () => {
    expect(trial()).toBeNull();
    expect(trial({ unit: null })).toBeNull();
  });
  it.each<BoardStanding>([
    { kind: 'needs-disposition' },
    { kind: 'attempts-used', most: 3 },
    { kind: 'waits-for-quality', because: 'failing-when-stopped' },
  ])('may be one that waits for a decision: $kind', (standing) => {
    expect(trial({ unit: { isOfType: true, standing } })).toBeNull();
  });
  it.each<[string, Partial<TrialBoardFacts>]>([
    ['board-passed', { unit: { isOfType: true, standing: { kind: 'passed', at: '2026-12-01T11:38:00Z' } } }],
    ['board-scrapped', { unit: { isOfType: true, standing: { kind: 'scrapped' } } }],
    ['board-returned', { unit: { isOfType: true, standing: { kind: 'returned' } } }],
    ['board-used-as-is', { unit: { isOfType: true, standing: { kind: 'used-as-is' } } }],
    ['serial-of-other-type', { unit: { isOfType: false, standing: { kind: 'may-be-tested', retestOrderId: null } } }],
    ['serial-wrong-form', { serial: 'CB2420264800184', unit: null }],
    ['board-in-test', { inTestAt: 'S2' }],
  ])('is refused with its reason: %s', (code, over) => {
    expect(trial(over)).toMatchObject({ code });
  });
});
