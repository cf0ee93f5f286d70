import type { RunView } from '@/lib/contracts/bench-view';
import type { PersonsRunEvent } from '@/lib/bench/types';
import type { Clock } from '../clock/clock';
import type { Random } from './random';
import type { SimulatedFixture } from './simulated-fixture';
import { beginTurnAsPrompted, type TurnError } from './turning';

export interface OperatorHabits {
  turnError: TurnError;
  /** Before each act, from what the screen asks to the hand being there: milliseconds, and their relative spread. */
  delaysMs: Record<'lid' | 'seal' | 'answer' | 'instruction' | 'firstTurn' | 'nextTurn', number>;
  spread: number;
}

/** As the prediction's typical person. Common practice, no source. */
export const usualHabits: OperatorHabits = {
  turnError: { relative: 0.03, turns: 4 / 360 },
  delaysMs: { lid: 1_200, seal: 6_000, answer: 2_000, instruction: 5_000, firstTurn: 1_800, nextTurn: 900 },
  spread: 0.2,
};

export interface OperatorOptions {
  fixture: SimulatedFixture;
  clock: Pick<Clock, 'now' | 'after'>;
  random: Random;
  habits: OperatorHabits;
  tell(event: PersonsRunEvent): void;
}

type Screen = RunView['screen'];

/** A prompt that still stands after the hand let go is turned for once more. */
const lookAgainMs = 2_500;

/** What a screen wants of a person; screens that want nothing have none. */
function wishOf(screen: Screen): string | null {
  switch (screen.kind) {
    case 'seat':
      return screen.wants === 'nothing' ? null : `seat:${screen.wants}`;
    case 'seal':
      return screen.wants === 'supply-off' ? null : `seal:${screen.wants}`;
    case 'operator-check':
      return screen.kind;
    case 'instruction':
      return `instruction:${screen.text}`;
    case 'trim': {
      const { stage, direction, round, finding } = screen.trim;
      return direction === null ? null : `trim:${stage}:${direction}:${round}:${finding ?? ''}`;
    }
    default:
      return null;
  }
}

/** A person who does what the bench screen asks, after a person's delay and with a person's error. Same random source, same acts. */
export class SimulatedOperator {
  /** Milliseconds in which the run waited for this person. */
  waitedForMs = 0;
  private wish: string | null = null;
  private sinceMs = 0;
  private screen: Screen | null = null;
  private turning = false;
  private turned = false;

  constructor(private readonly options: OperatorOptions) {}

  /** Every screen of the run, as it changes. */
  see(screen: Screen): void {
    this.screen = screen;
    const wish = wishOf(screen);
    if (wish === this.wish) return;
    const nowMs = this.options.clock.now();
    if (this.wish !== null) this.waitedForMs += nowMs - this.sinceMs;
    this.wish = wish;
    this.sinceMs = nowMs;
    if (wish !== null) this.act(wish, screen);
  }

  private act(wish: string, screen: Screen): void {
    const { fixture, habits, tell } = this.options;
    const { lid, seal, answer, instruction, firstTurn, nextTurn } = habits.delaysMs;
    switch (screen.kind) {
      case 'seat':
        return this.after(lid, wish, () => {
          fixture.setLid(true);
          if (screen.wants === 'confirm-lid-and-board') tell({ kind: 'confirm', what: 'lid-and-board' });
        });
      case 'seal':
        if (screen.wants === 'seal-screw')
          return this.after(seal, wish, () => tell({ kind: 'confirm', what: 'sealed' }));
        return this.after(lid, wish, () => {
          const closed = screen.wants === 'close-lid';
          fixture.setLid(closed);
          tell({ kind: 'confirm', what: closed ? 'lid-closed' : 'lid-open' });
        });
      case 'operator-check':
        return this.after(answer, wish, () => tell({ kind: 'answer', ok: true }));
      case 'instruction':
        return this.after(instruction, wish, () => tell({ kind: 'confirm', what: 'instruction-done' }));
      case 'trim':
        if (screen.trim.finding === 'no-effect') return this.after(answer, wish, () => tell({ kind: 'will-not-turn' }));
        return this.after(this.turned ? nextTurn : firstTurn, wish, () => this.turn(wish));
    }
  }

  private turn(wish: string): void {
    if (this.turning) return;
    this.turning = this.turned = true;
    const { fixture, clock, random, habits } = this.options;
    const prompt = () => (this.screen?.kind === 'trim' ? this.screen.trim : null);
    beginTurnAsPrompted({ fixture, clock, random, error: habits.turnError, prompt, onMove: () => undefined }, () => {
      this.turning = false;
      const { wish: next, screen } = this;
      if (next === wish) this.after(lookAgainMs, wish, () => this.turn(wish));
      else if (next !== null && screen?.kind === 'trim') this.act(next, screen);
    });
  }

  /** Acts unless the screen has come to want something else. */
  private after(ms: number, wish: string, act: () => void): void {
    const { clock, random, habits } = this.options;
    const delayMs = ms * Math.max(0.3, 1 + habits.spread * random.normal());
    clock.after(delayMs, () => {
      if (this.wish === wish) act();
    });
  }
}
