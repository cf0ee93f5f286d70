import { advanceBench, beginBench } from '@/lib/bench/bench';
import { say } from '@/lib/bench/sayings';
import type { BenchEffect, BenchEvent, BenchPlace, BenchState } from '@/lib/bench/types';
import { viewBench } from '@/lib/bench/view';
import type { BenchCommand, CommandReply } from '@/lib/contracts/bench-command';
import type { BenchReading, BenchView, RunView } from '@/lib/contracts/bench-view';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import type { SafeOffReport } from '../instruments/safe-off';
import { BenchKeeper } from './bench-keeper';
import { faultOf } from './fault-of';
import type { ExpectedIdentities } from './links';
import type { CommissionBench, StationPorts } from './ports';
import { performRun } from './run-job';
import type { RunPerformer } from './run-performer';

export interface StationOptions {
  station: BenchView['station'];
  /** The whole text of the code on its red bin. */
  binCode: string;
  open(): Promise<Bench>;
  expected: ExpectedIdentities;
  clock: Clock;
  /** See RunPerformerOptions. */
  watchdogMs: number;
  ports: StationPorts;
  commission: CommissionBench;
  onView(view: BenchView): void;
  onReading(reading: BenchReading): void;
  /** Something that should not happen, for the server's log. */
  onProblem(error: unknown): void;
}

type Unstamped<E> = E extends unknown ? Omit<E, 'atIso'> : never;

const tendEveryMs = 150;

/** One bench with its instruments: performs what `advanceBench` and `advanceRun` decide and tells them what happened. */
export class Station {
  private state: BenchState;
  private performer: RunPerformer | null = null;
  private running = false;
  private commissioning: AbortController | null = null;
  private lastRun: RunView | null = null;
  private revision = 0;
  private stopped = false;
  private turn: Promise<unknown> = Promise.resolve();
  private tending: Promise<void> = Promise.resolve();
  private reading: Promise<void> = Promise.resolve();
  private nextReading: Promise<void> | null = null;
  private readonly keeper: BenchKeeper;

  constructor(private readonly options: StationOptions) {
    this.state = beginBench(options.station);
    this.keeper = new BenchKeeper({
      open: options.open,
      expected: options.expected,
      clock: options.clock,
      state: () => this.state,
      tell: (event) => this.dispatch(event),
      onProblem: options.onProblem,
    });
  }

  /**
   * Opens the instruments and switches the supply off with read-back, before anything else is done with the station.
   * An instrument that is away is asked for again until `stop`.
   */
  async start(): Promise<SafeOffReport> {
    const off = await this.inTurn(() => this.keeper.openSafely());
    this.tending = this.tend();
    return off;
  }

  view(): BenchView {
    return viewBench(this.state, this.lastRun, this.revision);
  }

  /** Whether a run or a commissioning has the fixture now. */
  isBusy(): boolean {
    return this.running || this.commissioning !== null;
  }

  /** Session of the operator at the bench. */
  sessionId(): string | null {
    return this.state.operator?.sessionId ?? null;
  }

  /** What a screen asked for; answered once the server's part of it is. */
  async command(command: BenchCommand): Promise<CommandReply> {
    const before = { refusal: this.state.refusal, problem: this.pinProblem() };
    await this.dispatch({ kind: 'command', command });
    const { refusal } = this.state;
    const problem = this.pinProblem();
    const said = refusal && refusal !== before.refusal ? refusal : problem !== before.problem ? problem : null;
    return said ? { ok: false, code: said.code, ...(said.params && { params: said.params }) } : { ok: true };
  }

  /**
   * Reads where the station stands with the server; every few seconds and when something changed. Asked for again while it
   * reads, it reads once more, so that what is shown is never older than the last call.
   */
  refresh(): Promise<void> {
    this.nextReading ??= this.reading.then(() => {
      this.nextReading = null;
      return (this.reading = this.readStanding());
    });
    return this.nextReading;
  }

  private async readStanding(): Promise<void> {
    const place = this.place();
    const wasBusy = this.isBusy();
    try {
      const { standing, pendingBin } = await this.options.ports.standing(place);
      if (this.state.ready.databaseAway) await this.dispatch({ kind: 'database', away: false });
      // An answer about another operator, lot or trial says nothing about this one, nor does a bin from before a run ended.
      const { sessionId, lotId, offerId } = this.place();
      if (place.sessionId !== sessionId || place.lotId !== lotId || place.offerId !== offerId) return;
      await this.dispatch({ kind: 'standing', standing, ...(wasBusy || this.isBusy() ? {} : { pendingBin }) });
    } catch (error) {
      this.databaseFailed(error);
    }
  }

  /** No screen has led this station for too long: what is energised is switched off. */
  benchLost(): void {
    this.performer?.tell({ kind: 'bench-lost' });
    this.commissioning?.abort(new Error('bench-lost'));
  }

  /** Ends what is going on, switches the supply off with read-back and closes the ports. */
  async stop(): Promise<SafeOffReport> {
    this.stopped = true;
    this.performer?.tell({ kind: 'shutdown' });
    this.commissioning?.abort(new Error('shutdown'));
    await this.tending;
    return this.inTurn(() => this.keeper.close());
  }

  private async dispatch(unstamped: Unstamped<BenchEvent>): Promise<void> {
    const event = { ...unstamped, atIso: new Date(this.options.clock.wallTimeMs()).toISOString() } as BenchEvent;
    const before = this.state;
    const { state, effects } = advanceBench(before, event);
    this.state = state;
    const performed = effects.map((effect) => this.perform(effect));
    if (state !== before) this.show();
    await Promise.all(performed);
  }

  private show(): void {
    this.revision++;
    this.options.onView(this.view());
  }

  /** Resolves when what was asked is answered; runs and commissionings go on beyond it. */
  private async perform(effect: BenchEffect): Promise<void> {
    const { ports } = this.options;
    switch (effect.kind) {
      case 'ask':
        return this.ask(effect);
      case 'start-run':
        return this.background(this.run(effect));
      case 'run-event':
        return this.performer?.tell(effect.event);
      case 'start-commissioning':
        return this.background(this.commission(effect));
      case 'stop-commissioning':
        return this.commissioning?.abort(new Error('stopped'));
      case 'end-session':
        return this.tellServer(ports.endSession(effect.sessionId));
      case 'save-scheme':
        return this.tellServer(ports.saveScheme(effect.scheme));
      case 'save-locale':
        return this.tellServer(ports.saveLocale(effect.accountId, effect.locale));
      case 'read-standing':
        return this.background(this.refresh());
    }
  }

  private async ask({ id, ask }: Extract<BenchEffect, { kind: 'ask' }>): Promise<void> {
    try {
      const answer = await this.options.ports.ask(ask, this.place());
      await this.dispatch({ kind: 'answered', id, answer });
    } catch (error) {
      this.databaseFailed(error);
      await this.dispatch({ kind: 'answered', id, answer: { ok: false, refusal: say('database-away') } });
    }
  }

  private async run({ plan, check, engineering }: Extract<BenchEffect, { kind: 'start-run' }>): Promise<void> {
    const { ports, clock, watchdogMs, binCode, onReading, onProblem } = this.options;
    this.running = true;
    const { ending, view, stored } = await this.inTurn(() =>
      performRun({
        plan,
        check,
        engineering,
        bench: this.keeper.bench,
        clock,
        watchdogMs,
        binCode,
        log: ports.logOf(plan),
        onReading,
        onProblem,
        onView: (view) => {
          this.lastRun = view;
          this.show();
        },
        onPerformer: (performer) => {
          this.performer = performer;
          if (this.stopped) performer?.tell({ kind: 'shutdown' });
        },
      }),
    );
    this.running = false;
    this.lastRun = view;
    if (!stored) await this.dispatch({ kind: 'database', away: true });
    await this.dispatch({ kind: 'run-over', ending });
  }

  private async commission({ reference }: Extract<BenchEffect, { kind: 'start-commissioning' }>): Promise<void> {
    const { ports, commission } = this.options;
    const abort = new AbortController();
    this.commissioning = abort;
    const { measured, off } = await this.inTurn(async () => {
      const bench = this.keeper.bench!;
      const measured = await commission({
        bench,
        ...reference,
        signal: abort.signal,
        onProgress: (step, done, of) =>
          this.background(this.dispatch({ kind: 'commissioning-progress', step, done, of })),
      }).catch((error: unknown) => ({ error }));
      return { measured, off: await bench.safeOff() };
    });
    this.commissioning = null;
    const ended = { kind: 'commissioning-over', supplyConfirmedOff: off.confirmed } as const;
    if ('error' in measured) {
      const failed = () => say('commissioning-failed', { code: faultOf(measured.error).code });
      const problem = abort.signal.aborted ? say('commissioning-stopped') : failed();
      return this.dispatch({ ...ended, values: null, problem });
    }
    const accountId = this.state.operator?.accountId;
    if (accountId) await this.tellServer(ports.saveCommissioning(measured, reference.check.referenceCode, accountId));
    await this.dispatch({ ...ended, values: measured, problem: null });
  }

  private async tend(): Promise<void> {
    const { clock, onProblem } = this.options;
    const isFree = () => !this.stopped && !this.isBusy();
    while (!this.stopped) {
      await clock.sleep(tendEveryMs);
      if (isFree()) await this.inTurn(async () => (isFree() ? this.keeper.look() : undefined)).catch(onProblem);
    }
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const result = this.turn.then(work);
    this.turn = result.catch(() => undefined);
    return result;
  }

  /** Who works here on what. */
  place(): BenchPlace {
    const { operator, lot, last, trial } = this.state;
    return {
      accountId: operator?.accountId ?? null,
      sessionId: operator?.sessionId ?? null,
      lotId: lot?.lotId ?? null,
      offerId: trial?.offer.offerId ?? null,
      serial: !trial && last?.verdict === 'pass' ? last.serial : null,
    };
  }

  private pinProblem() {
    return this.state.phase.kind === 'pin' ? this.state.phase.problem : null;
  }

  private async tellServer(work: Promise<void>): Promise<void> {
    await work.catch((error: unknown) => this.databaseFailed(error));
  }

  private databaseFailed(error: unknown): void {
    this.options.onProblem(error);
    if (!this.state.ready.databaseAway) this.background(this.dispatch({ kind: 'database', away: true }));
  }

  private background(work: Promise<unknown>): void {
    work.catch((error: unknown) => this.options.onProblem(error));
  }
}
