import type {
  BenchAnswer,
  BenchAsk,
  BenchPlace,
  NextRun,
  PendingBin,
  ReferenceCheck,
  Standing,
} from '@/lib/bench/types';
import type { RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import type { RunLog, StationPorts } from '@/stations/run/ports';

export interface KeptRun {
  plan: RunPlan;
  events: RunEvent[];
  result: RunResult | null;
  seconds: number | null;
  closed: number;
}

const standing: Standing = {
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

const next: NextRun = {
  stepGroups: [],
  rails: {
    scaleMinVolts: 9,
    scaleMaxVolts: 13,
    tripLimits: null,
    releaseLimits: null,
    guardVolts: null,
    targetVolts: null,
    flags: [],
    travelled: { fallingOnToVolts: null, fallingOffToVolts: null, risingOffToVolts: null, risingOn: false },
    hysteresisVolts: null,
  },
};

/** A server that knows one operator, one lot and the plans it is given; keeps every run in memory. */
export class FakePorts implements StationPorts {
  readonly runs: KeptRun[] = [];
  readonly asked: BenchAsk[] = [];
  standingNow: Standing = standing;
  pendingBin: PendingBin | null = null;
  away = false;

  constructor(
    private readonly planOf: (serial: string, runId: string) => RunPlan | null,
    private readonly checkOf: (serial: string) => ReferenceCheck | null = () => null,
  ) {}

  async ask(ask: BenchAsk, _who: BenchPlace): Promise<BenchAnswer> {
    this.asked.push(ask);
    if (this.away) throw new Error('the database is away');
    switch (ask.kind) {
      case 'badge':
        return { ok: true, kind: 'badge', value: { accountId: 'account-1', number: ask.badgeCode.slice(4) } };
      case 'pin':
        if (ask.digits !== '1234') return { ok: false, refusal: { code: 'wrong-pin' } };
        return {
          ok: true,
          kind: 'pin',
          value: {
            operator: {
              accountId: ask.accountId,
              sessionId: 'session-1',
              number: '14',
              locale: 'en',
              mayCommission: true,
            },
            lots: [],
            standing: this.standingNow,
          },
        };
      case 'lot':
        return {
          ok: true,
          kind: 'lot',
          value: {
            lot: {
              lotId: 'lot-1',
              code: '2649-A',
              boardTypeCode: 'CB1210',
              size: 24,
              marks: '.'.repeat(24),
              tested: 0,
              passed: 0,
              rejected: 0,
              secondsEach: null,
            },
            next,
            standing: this.standingNow,
          },
        };
      case 'board': {
        const plan = this.planOf(ask.serial, `run-${this.runs.length + 1}`);
        if (!plan) return { ok: false, refusal: { code: 'serial-unknown', params: { serial: ask.serial } } };
        return {
          ok: true,
          kind: 'board',
          value: { plan, check: this.checkOf(ask.serial), engineering: ask.offerId !== null },
        };
      }
      case 'offer':
        if (this.standingNow.offer?.offerId !== ask.offerId) return { ok: false, refusal: { code: 'offer-ended' } };
        return {
          ok: true,
          kind: 'offer',
          value: { offer: this.standingNow.offer, next, standing: this.standingNow },
        };
      case 'end-offer':
        return { ok: true, kind: 'end-offer', value: null };
      case 'bin':
        return { ok: true, kind: 'bin', value: { lot: null } };
      case 'lots':
        return { ok: true, kind: 'lots', value: { lots: [] } };
      case 'call-engineer':
        return {
          ok: true,
          kind: 'call-engineer',
          value: { call: { sinceIso: '2026-01-05T06:00:00.000Z', acknowledgedBy: null } },
        };
      case 'print-label':
        return {
          ok: true,
          kind: 'print-label',
          value: { label: { serial: ask.serial, state: 'waiting', problem: null } },
        };
      case 'component-batch':
        return { ok: true, kind: 'component-batch', value: null };
      case 'reference':
        return { ok: false, refusal: { code: 'reference-unknown', params: { reference: ask.code } } };
    }
  }

  async standing(): Promise<{ standing: Standing; pendingBin: PendingBin | null }> {
    if (this.away) throw new Error('the database is away');
    return { standing: this.standingNow, pendingBin: this.pendingBin };
  }

  async endSession(): Promise<void> {}
  async saveScheme(): Promise<void> {}
  async saveLocale(): Promise<void> {}
  async saveCommissioning(): Promise<void> {}

  logOf(plan: RunPlan): RunLog {
    const kept: KeptRun = { plan, events: [], result: null, seconds: null, closed: 0 };
    this.runs.push(kept);
    return {
      record: (event) => void kept.events.push(event),
      close: async (result, seconds) => {
        kept.result = result;
        kept.seconds = seconds;
        kept.closed++;
        return { stored: !this.away, validUntilIso: null };
      },
    };
  }
}
