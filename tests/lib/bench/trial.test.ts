import { describe, expect, test } from 'vitest';
import { BenchInTest, offer, rejected, standing } from './bench-in-test';

const serial = 'CB1210261000001';
const atWork = () => new BenchInTest().ready().signIn().takeLot().empty();
const offered = () => {
  const bench = atWork();
  bench.tell({ kind: 'standing', standing: { ...standing, offer } });
  return bench;
};

describe('an offer', () => {
  test('is shown between boards, and taken only by an act at the bench', () => {
    const bench = offered();
    expect(bench.view).toMatchObject({ offer, engineering: null, lot: { code: '2610-01' } });
    expect(bench.command({ kind: 'start-trial', offerId: offer.offerId })).toMatchObject([
      { kind: 'ask', ask: { kind: 'offer', offerId: offer.offerId } },
    ]);
  });

  test('is shown while a lot is chosen, and to nobody before they signed in', () => {
    const bench = new BenchInTest().ready();
    bench.tell({ kind: 'standing', standing: { ...standing, signedIn: false, offer } });
    expect(bench.view.offer).toBeNull();
    bench.signIn();
    bench.tell({ kind: 'standing', standing: { ...standing, offer } });
    expect(bench.view).toMatchObject({ offer, screen: { kind: 'choose-lot' } });
  });

  test('is not taken in the middle of a board, nor while a bin is owed', () => {
    const bench = offered().startRun(serial);
    const start = { kind: 'start-trial', offerId: offer.offerId } as const;
    expect(bench.view.offer).toBeNull();
    expect(bench.command(start)).toEqual([]);
    bench.endRun(rejected(serial));
    expect(bench.command(start)).toEqual([]);
    expect(bench.refusal).toMatchObject({ code: 'not-now' });
  });
});

describe('a trial', () => {
  test('marks what is shown, hides the lot, and asks for its boards with the offer', () => {
    const bench = offered().startTrial();
    expect(bench.view).toMatchObject({
      engineering: offer,
      offer: null,
      lot: null,
      next: { stepGroups: ['seat'] },
      screen: { kind: 'idle' },
    });
    expect(bench.scan(serial)).toMatchObject([{ kind: 'ask', ask: { serial, lotId: 'l1', offerId: offer.offerId } }]);
  });

  test('ends a reject without a bin, and the next board may come', () => {
    const bench = offered().startTrial().startRun(serial).endRun({ verdict: 'reject', bin: null });
    expect(bench.view).toMatchObject({ engineering: offer, screen: { kind: 'run' } });
    bench.empty();
    expect(bench.scan('CB1210261000002')).toMatchObject([{ kind: 'ask', ask: { offerId: offer.offerId } }]);
  });

  test('prints no label again', () => {
    const bench = offered().startTrial().startRun(serial).endRun({});
    expect(bench.command({ kind: 'print-label-again' })).toEqual([]);
    expect(bench.refusal).toMatchObject({ code: 'not-now' });
  });

  test('left, it leads back to the lot, whose boards are production again', () => {
    const bench = offered().startTrial();
    bench.command({ kind: 'leave-trial' });
    expect(bench.view).toMatchObject({ engineering: null, lot: { code: '2610-01' }, screen: { kind: 'idle' } });
    expect(bench.scan(serial)).toMatchObject([{ kind: 'ask', ask: { serial, offerId: null } }]);
  });

  test('left without a lot, it leads to the choice of one', () => {
    const bench = new BenchInTest().ready().signIn().empty();
    bench.tell({ kind: 'standing', standing: { ...standing, offer } });
    bench.startTrial();
    expect(bench.command({ kind: 'leave-trial' })).toMatchObject([{ kind: 'ask', ask: { kind: 'lots' } }]);
    expect(bench.view).toMatchObject({ engineering: null, screen: { kind: 'choose-lot' } });
  });

  test('called done, it ends the offer and leaves', () => {
    const bench = offered().startTrial();
    expect(bench.command({ kind: 'end-trial' })).toMatchObject([
      { kind: 'ask', ask: { kind: 'end-offer', offerId: offer.offerId } },
    ]);
    bench.answer({ ok: true, kind: 'end-offer', value: null });
    expect(bench.view.engineering).toBeNull();
  });

  test('whose offer is taken back ends between boards, and says so', () => {
    const bench = offered().startTrial();
    bench.tell({ kind: 'standing', standing });
    expect(bench.view).toMatchObject({ engineering: null, screen: { kind: 'idle' }, refusal: { code: 'offer-ended' } });
  });

  test('whose offer is taken back in the middle of a board finishes the board as it began', () => {
    const bench = offered().startTrial().startRun(serial);
    bench.tell({ kind: 'standing', standing });
    expect(bench.view.engineering).toEqual(offer);
    bench.endRun({});
    expect(bench.view.engineering).toEqual(offer);
    bench.empty();
    bench.scan('CB1210261000002');
    bench.answer({ ok: false, refusal: { code: 'offer-ended' } });
    expect(bench.view).toMatchObject({ engineering: null, screen: { kind: 'idle' }, refusal: { code: 'offer-ended' } });
  });

  test('ends with the shift, and by scanning a lot sheet', () => {
    const ended = offered().startTrial();
    ended.command({ kind: 'end-shift' });
    expect(ended.state.trial).toBeNull();
    expect(offered().startTrial().takeLot().view).toMatchObject({ engineering: null, lot: { code: '2610-01' } });
  });

  test('leaves the daily check what it is: the reference board is no engineering run', () => {
    const bench = offered().startTrial();
    bench.scan('REF-CB1210-1');
    const check = { referenceCode: 'REF-CB1210-1', tripVolts: 10.8, releaseVolts: 12.29, toleranceVolts: 0.02 };
    bench.answer({
      ok: true,
      kind: 'board',
      value: { plan: { serial: 'REF-CB1210-1' } as never, check, engineering: false },
    });
    expect(bench.view.engineering).toBeNull();
    bench.endRun({ reference: { passed: true, points: [], validUntilIso: null } });
    bench.command({ kind: 'continue' });
    expect(bench.view.engineering).toEqual(offer);
  });
});

test('a lot moved to another revision shows what its next run will be', () => {
  const bench = atWork();
  const { lot } = bench.state;
  bench.tell({ kind: 'standing', standing: { ...standing, lot, next: { stepGroups: ['trim'], rails: {} as never } } });
  expect(bench.view.next).toMatchObject({ stepGroups: ['trim'] });
});
