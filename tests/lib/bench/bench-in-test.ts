import { advanceBench, beginBench } from '@/lib/bench/bench';
import type { BenchAnswer, BenchEffect, BenchEvent, BenchState, RunEnding, Standing } from '@/lib/bench/types';
import { viewBench } from '@/lib/bench/view';
import type { BenchCommand } from '@/lib/contracts/bench-command';
import type { TrialOffer } from '@/lib/contracts/bench-view';
import type { RunPlan } from '@/lib/run/types';

export const atIso = '2026-03-02T07:04:00.000Z';

export const standing: Standing = {
  readiness: [],
  reasons: [],
  otherStation: null,
  signedIn: true,
  lot: null,
  next: null,
  offer: null,
  call: null,
  label: null,
};

type Unstamped<E> = E extends unknown ? Omit<E, 'atIso'> : never;

/** A bench and what it asked for, driven event by event. */
export class BenchInTest {
  state: BenchState;
  effects: BenchEffect[] = [];

  constructor(hasController = true) {
    this.state = beginBench({
      code: 'S1',
      name: 'Station 1',
      fixture: 'F1',
      simulated: false,
      hasController,
      hasWiperProbe: false,
      scheme: 'day',
    });
  }

  tell(event: Unstamped<BenchEvent>): BenchEffect[] {
    const { state, effects } = advanceBench(this.state, { ...event, atIso } as BenchEvent);
    this.state = state;
    this.effects.push(...effects);
    return effects;
  }

  command(command: BenchCommand): BenchEffect[] {
    return this.tell({ kind: 'command', command });
  }

  scan(text: string): BenchEffect[] {
    return this.command({ kind: 'scan', text });
  }

  answer(answer: BenchAnswer): BenchEffect[] {
    return this.tell({ kind: 'answered', id: this.state.asked!.id, answer });
  }

  get view() {
    return viewBench(this.state, null, 0);
  }

  get screen() {
    return this.view.screen;
  }

  get refusal() {
    return this.state.refusal;
  }

  ready(): this {
    this.tell({ kind: 'supply', confirmedOff: true });
    this.tell({ kind: 'instruments', opened: true, linksDown: [], strangers: [] });
    return this;
  }

  empty(): this {
    if (this.state.station.hasController) this.tell({ kind: 'fixture', lidClosed: false, boardPresent: false });
    else this.command({ kind: 'confirm', what: 'fixture-empty' });
    return this;
  }

  signIn(): this {
    this.scan('SWB-4471');
    this.answer({ ok: true, kind: 'badge', value: { accountId: 'a1', number: '14' } });
    this.command({ kind: 'pin', digits: '2580' });
    this.answer(signedIn);
    return this;
  }

  takeLot(): this {
    this.scan('SWL-2610-01');
    this.answer(lotTaken);
    return this;
  }

  startTrial(): this {
    this.command({ kind: 'start-trial', offerId: offer.offerId });
    this.answer(trialTaken);
    return this;
  }

  startRun(serial: string): this {
    this.scan(serial);
    this.answer(admitted(serial, this.state.trial !== null));
    return this;
  }

  endRun(over: Partial<RunEnding>): this {
    this.tell({ kind: 'run-over', ending: { ...passed, ...over } });
    return this;
  }
}

export const signedIn: BenchAnswer = {
  ok: true,
  kind: 'pin',
  value: {
    operator: { accountId: 'a1', sessionId: 's1', number: '14', locale: 'en', mayCommission: false },
    lots: [],
    standing,
  },
};

export const lotTaken: BenchAnswer = {
  ok: true,
  kind: 'lot',
  value: {
    lot: {
      lotId: 'l1',
      code: '2610-01',
      boardTypeCode: 'CB1210',
      size: 3,
      marks: '...',
      tested: 0,
      passed: 0,
      rejected: 0,
      secondsEach: null,
    },
    next: { stepGroups: [], rails: {} as never },
    standing,
  },
};

export const admitted = (serial: string, engineering = false): BenchAnswer => ({
  ok: true,
  kind: 'board',
  value: { plan: { serial } as RunPlan, check: null, engineering },
});

export const offer: TrialOffer = {
  offerId: '0c7d2f5e-6f0a-4a57-9d55-2b8c5b7f1a01',
  offeredBy: 'T. Marsden',
  revision: 'r7',
  sequenceName: 'CB1210 cutoff trim',
  boardTypeCode: 'CB1210',
  note: '',
};

export const trialTaken: BenchAnswer = {
  ok: true,
  kind: 'offer',
  value: { offer, next: { stepGroups: ['seat'], rails: {} as never }, standing: { ...standing, offer } },
};

export const passed: RunEnding = {
  verdict: 'pass',
  seconds: 36,
  noVerdictReason: null,
  supplyConfirmedOff: true,
  bin: null,
  reference: null,
};

export const rejected = (serial: string): Partial<RunEnding> => ({
  verdict: 'reject',
  bin: { runId: 'r1', serial, binCode: 'SWN-R1' },
});
