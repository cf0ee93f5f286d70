import { afterEach, expect, test } from 'vitest';
import { offer } from '../../lib/bench/bench-in-test';
import { benchInTest, ended, type BenchInTest } from './bench-in-test';

let open: BenchInTest | null = null;
afterEach(async () => {
  await open?.station.stop();
  open = null;
});

async function atOffer(): Promise<BenchInTest> {
  const bench = (open = await benchInTest());
  bench.ports.standingNow = { ...bench.ports.standingNow, offer };
  await bench.signIn();
  await bench.until((view) => view.screen.kind === 'idle' && view.offer !== null);
  return bench;
}

test('an offered draft is run over bytes once somebody takes it, marked on every view; its reject owes no bin', async () => {
  const bench = await atOffer();
  expect(bench.view().engineering).toBeNull();
  expect(await bench.station.command({ kind: 'start-trial', offerId: offer.offerId })).toEqual({ ok: true });
  bench.seat(3, 'feedback-open');
  const from = bench.views.length;
  await bench.station.command({ kind: 'scan', text: 'CB1210264900001' });
  await bench.until((view) => ended(view) && bench.ports.runs[0]?.closed === 1);
  await bench.until(() => !bench.station.isBusy());
  expect(bench.problems).toEqual([]);
  expect(bench.ports.runs[0]!.result).toMatchObject({ verdict: 'reject', supplyOff: { confirmed: true } });
  expect(bench.view()).toMatchObject({ engineering: offer, lot: null, screen: { kind: 'run' } });
  expect(bench.views.slice(from).every((view) => view.engineering?.offerId === offer.offerId)).toBe(true);
  expect(bench.ports.asked.filter(({ kind }) => kind === 'board')).toMatchObject([{ offerId: offer.offerId }]);
});

test('left, the next board of the lot is production again', async () => {
  const bench = await atOffer();
  await bench.station.command({ kind: 'start-trial', offerId: offer.offerId });
  await bench.station.command({ kind: 'leave-trial' });
  bench.seat(3);
  await bench.station.command({ kind: 'scan', text: 'CB1210264900001' });
  await bench.until((view) => view.run !== null);
  expect(bench.view()).toMatchObject({ engineering: null, lot: { code: '2649-A' } });
  expect(bench.ports.asked.at(-1)).toMatchObject({ kind: 'board', offerId: null, lotId: 'lot-1' });
});
