import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { BenchCommand } from '@/lib/contracts/bench-command';
import {
  admitted,
  BenchInTest,
  lotTaken,
  offer,
  passed,
  rejected,
  signedIn,
  standing,
  trialTaken,
} from './bench-in-test';

const serials = ['CB1210261000001', 'CB1210261000002', 'CB1210261000003'];

const commands: fc.Arbitrary<BenchCommand> = fc.oneof(
  fc
    .constantFrom(...serials, 'SWB-4471', 'SWL-2610-01', 'SWN-R1', 'SWN-R2')
    .map((text): BenchCommand => ({ kind: 'scan', text })),
  fc.constantFrom<BenchCommand>(
    { kind: 'pin', digits: '2580' },
    { kind: 'try-again' },
    { kind: 'continue' },
    { kind: 'end-shift' },
    { kind: 'stop' },
    { kind: 'leave-lot' },
    { kind: 'start-trial', offerId: offer.offerId },
    { kind: 'leave-trial' },
    { kind: 'end-trial' },
    { kind: 'confirm', what: 'fixture-empty' },
    { kind: 'serial-by-hand', serial: serials[0]!, again: serials[0]! },
  ),
);

type Act = (bench: BenchInTest) => void;
const acts: fc.Arbitrary<Act> = fc.oneof(
  {
    weight: 5,
    arbitrary: commands.map(
      (command): Act =>
        (bench) =>
          void bench.command(command),
    ),
  },
  {
    weight: 5,
    arbitrary: fc.boolean().map(
      (yes): Act =>
        (bench) =>
          answerOpen(bench, yes),
    ),
  },
  {
    weight: 3,
    arbitrary: fc.tuple(fc.boolean(), fc.boolean()).map(
      ([lidClosed, boardPresent]): Act =>
        (bench) =>
          void bench.tell({ kind: 'fixture', lidClosed, boardPresent }),
    ),
  },
  {
    weight: 2,
    arbitrary: fc.constantFrom('pass', 'reject', 'no-verdict').map((verdict): Act => (bench) => {
      if (bench.state.phase.kind !== 'run') return;
      const { serial } = bench.state.phase;
      if (verdict === 'reject') bench.endRun(bench.state.trial ? { verdict } : rejected(serial));
      else
        bench.endRun(verdict === 'pass' ? passed : { ...passed, verdict: 'no-verdict', noVerdictReason: 'link-lost' });
    }),
  },
  {
    weight: 1,
    arbitrary: fc.boolean().map(
      (away): Act =>
        (bench) =>
          void bench.tell({ kind: 'database', away }),
    ),
  },
  {
    weight: 1,
    arbitrary: fc.boolean().map(
      (confirmedOff): Act =>
        (bench) =>
          void bench.tell({ kind: 'supply', confirmedOff }),
    ),
  },
  {
    weight: 1,
    arbitrary: fc.constant<Act>(
      (bench) => void bench.tell({ kind: 'standing', standing: { ...standing, signedIn: false } }),
    ),
  },
  {
    weight: 1,
    arbitrary: fc.constantFrom(offer, null).map(
      (open): Act =>
        (bench) =>
          void bench.tell({ kind: 'standing', standing: { ...standing, offer: open } }),
    ),
  },
);

function answerOpen(bench: BenchInTest, yes: boolean): void {
  const ask = bench.state.asked?.ask;
  if (!ask) return;
  if (!yes) return void bench.answer({ ok: false, refusal: { code: 'not-now' } });
  switch (ask.kind) {
    case 'badge':
      return void bench.answer({ ok: true, kind: 'badge', value: { accountId: 'a1', number: '14' } });
    case 'pin':
      return void bench.answer(signedIn);
    case 'lot':
      return void bench.answer(lotTaken);
    case 'lots':
      return void bench.answer({ ok: true, kind: 'lots', value: { lots: [] } });
    case 'board':
      return void bench.answer(admitted(ask.serial, ask.offerId !== null));
    case 'offer':
      return void bench.answer(trialTaken);
    case 'end-offer':
      return void bench.answer({ ok: true, kind: 'end-offer', value: null });
    case 'bin':
      return void bench.answer({ ok: true, kind: 'bin', value: { lot: null } });
    default:
      return void bench.answer({ ok: false, refusal: { code: 'not-now' } });
  }
}

test('whatever people do, a board is asked for only by someone signed in, with the supply off, the database there, no bin owed, and the fixture seen empty or still holding that board', () => {
  fc.assert(
    fc.property(fc.boolean(), fc.array(acts, { maxLength: 80 }), (hasController, sequence) => {
      const bench = new BenchInTest(hasController).ready();
      for (const act of sequence) {
        const before = bench.state;
        bench.effects = [];
        act(bench);
        for (const effect of bench.effects) {
          if (effect.kind !== 'ask' || effect.ask.kind !== 'board') continue;
          const { ready, fixture, operator, pendingBin } = bench.state;
          expect(operator).not.toBeNull();
          expect(ready).toMatchObject({ supplyOff: true, databaseAway: false, linksDown: [] });
          expect(pendingBin).toBeNull();
          expect(fixture.seenEmpty || before.fixture.heldSerial === effect.ask.serial).toBe(true);
        }
      }
    }),
    { numRuns: 400 },
  );
});

test('whatever people do, a run is an engineering run exactly while the screen says so, and no lot stands beside it', () => {
  fc.assert(
    fc.property(fc.boolean(), fc.array(acts, { maxLength: 80 }), (hasController, sequence) => {
      const bench = new BenchInTest(hasController).ready();
      let engineering: boolean | null = null;
      for (const act of sequence) {
        bench.effects = [];
        act(bench);
        for (const effect of bench.effects) if (effect.kind === 'start-run') engineering = effect.engineering;
        const { view, state } = bench;
        if (state.phase.kind === 'run' || state.phase.kind === 'over')
          expect(view.engineering !== null, state.phase.kind).toBe(engineering);
        if (view.engineering) expect(view).toMatchObject({ lot: null, label: null, offer: null });
      }
    }),
    { numRuns: 400 },
  );
});
