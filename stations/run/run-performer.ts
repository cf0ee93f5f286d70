import type { BenchReading, RunView } from '@/lib/contracts/bench-view';
import type { PersonsRunEvent } from '@/lib/bench/types';
import { advanceRun, beginRun, resultOf, type RunState } from '@/lib/run/run';
import type { RunEffect, RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import { currentGroup, viewRun } from '@/lib/run/view';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import { valueCycles } from './integration';
import { faultOf, stalledFault, type Fault } from './fault-of';
import { FixtureWatch } from './fixture-watch';
import type { RunLog } from './ports';
import { ownDurationMs, performEffect, type Answer } from './perform-effect';

export interface RunPerformerOptions {
  plan: RunPlan;
  bench: Bench;
  clock: Clock;
  /** How long an effect may take beyond its own duration before the watchdog calls it stalled. */
  watchdogMs: number;
  log: Pick<RunLog, 'record'>;
  onView(view: RunView): void;
  onReading(reading: BenchReading): void;
}

type Effect = Exclude<RunEffect, { kind: 'record-run' }>;
type Outcome = { answer: Answer } | { fault: Fault };
type Unstamped<E> = E extends unknown ? Omit<E, 'atMs'> : never;

/** How often lid and board are looked at beside the effects, and while a person has to act. */
export const pollBetweenEffectsMs = 400;
export const pollWhileWaitingMs = 100;

/** Performs one run: does what the engine asks, one effect at a time, and tells it what came of it. Decides nothing. */
export class RunPerformer {
  private state: RunState;
  private shown: RunView;
  private next: Effect | null = null;
  private current: { effect: Effect; abort: AbortController; superseded: boolean } | null = null;
  /** Of the effect being performed; kept for the next one until it was needed. */
  private abort = new AbortController();
  private watching = false;
  private over = false;
  private wake: () => void = () => {};
  private readonly fixture: FixtureWatch;
  readonly startedAtMs: number;

  constructor(private readonly options: RunPerformerOptions) {
    const { plan, clock, bench } = options;
    this.startedAtMs = clock.now();
    this.fixture = new FixtureWatch(bench.controller !== null, clock);
    const begun = beginRun(plan, this.startedAtMs);
    this.state = begun.state;
    this.shown = viewRun(begun.state);
    this.take(begun.effects);
  }

  view(): RunView {
    return this.shown;
  }

  /** Place in the sequence of the step that the run is in, or ended in. */
  get stepIndex(): number {
    return this.state.stepIndex;
  }

  /** What a person or the bench did. Taken at once, whatever is being performed. */
  tell(event: PersonsRunEvent): void {
    if (!this.over) this.feed(event);
  }

  /** Performs until the run is over; the supply has then been switched off and read back. */
  async perform(): Promise<RunResult> {
    while (!this.over) {
      if (this.next) await this.performNext(this.next);
      else await this.waitForPeople();
    }
    const result = resultOf(this.state);
    if (!result) throw new Error(`Run ${this.options.plan.runId} is over without a result.`);
    return result;
  }

  private async performNext(effect: Effect): Promise<void> {
    this.next = null;
    if (this.abort.signal.aborted) this.abort = new AbortController();
    const performed = { effect, abort: this.abort, superseded: false };
    this.current = performed;
    const outcome = await this.withinDeadline(effect, performed.abort);
    this.current = null;
    if (performed.superseded) return;
    if ('answer' in outcome) {
      this.fixture.learn(outcome.answer);
      this.feed(outcome.answer);
    } else this.feed({ kind: 'fault', id: effect.id, ...outcome.fault });
    if (!this.over && !this.mustSwitchOff() && this.fixture.isDue(pollBetweenEffectsMs))
      await this.watch(() => this.pollFixture());
  }

  /** The watchdog stands beside the instruments' own deadlines: an effect without an end is a fault, never a wait. */
  private async withinDeadline(effect: Effect, abort: AbortController): Promise<Outcome> {
    const { clock, watchdogMs, onReading, bench, plan } = this.options;
    let cancel = () => {};
    const stalled = new Promise<Outcome>((resolve) => {
      cancel = clock.after(ownDurationMs(effect) + watchdogMs, () => {
        abort.abort(new Error('stalled'));
        const answer = { kind: 'supply-is-off', id: effect.id, confirmed: false } as const;
        resolve(effect.kind === 'supply-off' ? { answer } : { fault: stalledFault(effect) });
      });
    });
    const performing = { bench, clock, sensing: plan.boardType.sensing, signal: abort.signal, onReading };
    const performed = performEffect(effect, performing).then(
      (answer): Outcome => ({ answer }),
      (error: unknown): Outcome => ({ fault: faultOf(error) }),
    );
    return Promise.race([performed, stalled]).finally(cancel);
  }

  /** Nothing is asked for: a person has to act. The fixture and, while it is on, the supply are watched meanwhile. */
  private async waitForPeople(): Promise<void> {
    const abort = new AbortController();
    this.wake = () => abort.abort();
    await this.options.clock.sleep(pollWhileWaitingMs, abort.signal).catch(() => undefined);
    this.wake = () => {};
    if (this.over || this.next) return;
    await this.watch(async () => {
      await this.pollFixture();
      if (!this.over && !this.next && this.view().supply.state === 'on') await this.readSupply();
    });
  }

  /** What is done beside the effects; a fault of it is the run's. */
  private async watch(work: () => Promise<void>): Promise<void> {
    this.watching = true;
    try {
      await work();
    } catch (error) {
      if (!this.over) this.feed({ kind: 'fault', id: null, ...faultOf(error) });
    } finally {
      this.watching = false;
    }
  }

  private async pollFixture(): Promise<void> {
    const { controller } = this.options.bench;
    if (!controller) return;
    const closed = await controller.lidClosed();
    const present = await controller.boardPresent();
    for (const change of this.fixture.see(closed, present)) if (!this.over) this.feed(change);
  }

  private async readSupply(): Promise<void> {
    const volts = await this.options.bench.meter.readVolts(101, valueCycles);
    this.options.onReading({ volts, output: null, rail: 'falling' });
  }

  private mustSwitchOff(): boolean {
    return this.next?.kind === 'supply-off';
  }

  private feed(unstamped: Unstamped<RunEvent>): void {
    const event = { ...unstamped, atMs: this.options.clock.now() } as RunEvent;
    this.options.log.record(event, currentGroup(this.shown));
    const { state, effects } = advanceRun(this.state, event);
    this.state = state;
    this.take(effects);
    this.shown = viewRun(state);
    // The end is shown once it is recorded.
    if (!this.over) this.options.onView(this.shown);
  }

  /** An effect that comes while another is performed takes its place; it is the supply going off, which cannot wait. */
  private take(effects: RunEffect[]): void {
    for (const effect of effects) {
      if (effect.kind === 'record-run') this.over = true;
      else this.next = effect;
    }
    if (this.mustSwitchOff() && (this.current || this.watching)) {
      if (this.current) this.current.superseded = true;
      this.current?.abort.abort(new Error('superseded'));
      void this.options.bench.supply.switchOff().catch(() => undefined);
    }
    this.wake();
  }
}
