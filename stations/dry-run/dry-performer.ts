import type { PersonsRunEvent } from '@/lib/bench/types';
import type { RunView } from '@/lib/contracts/bench-view';
import { advanceRun, beginRun, resultOf, type RunState } from '@/lib/run/run';
import type { RunEffect, RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import { screenOf } from '@/lib/run/view';
import { faultOf } from '../run/fault-of';
import { FixtureWatch } from '../run/fixture-watch';
import { valueCycles } from '../run/integration';
import type { Answer, Effect } from '../run/perform-effect';
import { pollBetweenEffectsMs, pollWhileWaitingMs } from '../run/run-performer';
import type { DryBench } from './dry-bench';
import { performNow, Superseded } from './perform-now';

type Unstamped<E> = E extends unknown ? Omit<E, 'atMs'> : never;

/** RunPerformer on a bench that is called at once: the same order of commands, polls and events, and nothing awaited. Decides nothing. */
export class DryPerformer {
  private state: RunState;
  private next: Effect | null = null;
  private busy = false;
  private superseded = false;
  private woken = false;
  private over = false;
  private readonly fixture: FixtureWatch;

  constructor(
    private readonly plan: RunPlan,
    private readonly bench: DryBench,
    private readonly onScreen: (screen: RunView['screen']) => void,
  ) {
    const { clock, controller } = bench;
    this.fixture = new FixtureWatch(controller !== null, clock);
    const begun = beginRun(plan, clock.now());
    this.state = begun.state;
    this.take(begun.effects);
  }

  get screen(): RunView['screen'] {
    return screenOf(this.state);
  }

  /** Place in the sequence of the step that the run is in, or ended in. */
  get stepIndex(): number {
    return this.state.stepIndex;
  }

  tell(event: PersonsRunEvent): void {
    if (!this.over) this.feed(event);
  }

  /** Performs until the run is over. */
  perform(): RunResult {
    while (!this.over) {
      if (this.next) this.performNext(this.next);
      else this.waitForPeople();
    }
    return resultOf(this.state)!;
  }

  private performNext(effect: Effect): void {
    this.next = null;
    const answered = this.whileBusy((isSuperseded) =>
      performNow(effect, this.bench, this.plan.boardType.sensing, isSuperseded),
    );
    if (answered.kind === 'superseded') return;
    if (answered.kind === 'fault') this.feed({ ...answered, id: effect.id });
    else {
      this.fixture.learn(answered.value as Answer);
      this.feed(answered.value as Answer);
    }
    if (!this.over && !this.mustSwitchOff() && this.fixture.isDue(pollBetweenEffectsMs)) this.pollFixture();
  }

  private waitForPeople(): void {
    const { clock, meter } = this.bench;
    this.woken = false;
    clock.advanceTo(clock.now() + pollWhileWaitingMs, () => this.woken);
    if (this.over || this.next) return;
    this.pollFixture();
    if (this.over || this.next || this.state.facts.supply.state !== 'on') return;
    this.watch(() => meter.readVolts(101, valueCycles));
  }

  private pollFixture(): void {
    const { controller } = this.bench;
    if (!controller) return;
    this.watch(() => {
      const closed = controller.lidClosed();
      const present = controller.boardPresent();
      for (const change of this.fixture.see(closed, present)) if (!this.over) this.feed(change);
    });
  }

  /** What is done beside the effects; a fault of it is the run's. */
  private watch(work: () => void): void {
    const done = this.whileBusy(work);
    if (done.kind === 'fault' && !this.over) this.feed({ ...done, id: null });
  }

  private whileBusy<T>(work: (isSuperseded: () => boolean) => T) {
    this.busy = true;
    this.superseded = false;
    try {
      const value = work(() => this.superseded);
      return this.superseded ? ({ kind: 'superseded' } as const) : ({ kind: 'done', value } as const);
    } catch (error) {
      if (error instanceof Superseded || this.superseded) return { kind: 'superseded' } as const;
      return { kind: 'fault', ...faultOf(error) } as const;
    } finally {
      this.busy = false;
    }
  }

  private mustSwitchOff(): boolean {
    return this.next?.kind === 'supply-off';
  }

  private feed(unstamped: Unstamped<RunEvent>): void {
    const { state, effects } = advanceRun(this.state, { ...unstamped, atMs: this.bench.clock.now() } as RunEvent);
    this.state = state;
    this.take(effects);
    if (!this.over) this.onScreen(screenOf(state));
  }

  /** An effect that comes while another is performed takes its place; it is the supply going off, which cannot wait. */
  private take(effects: RunEffect[]): void {
    for (const effect of effects) {
      if (effect.kind === 'record-run') this.over = true;
      else this.next = effect;
    }
    if (this.mustSwitchOff() && this.busy) {
      this.superseded = true;
      this.bench.supply.switchOff();
    }
    this.woken = true;
  }
}
