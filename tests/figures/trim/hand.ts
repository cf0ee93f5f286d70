import type { TrimView } from '../../../lib/trim/types';
import type { Random } from '../random';

/** How a person turns: the study's figures. Turns, seconds. */
export interface HandHabits {
  firstPromptSeconds: number;
  laterPromptSeconds: number;
  secondBeepSeconds: number;
  reactionSeconds: number;
  briskTurnsPerSecond: number;
  /** Turned without regripping, and what a regrip takes. */
  gripTurns: number;
  regripSeconds: number;
  /** Slowest even turning. */
  slowestTurnsPerSecond: number;
  countErrorFraction: number;
  countErrorTurns: number;
  /** Spread of the speed between prompts. */
  speedSpread: number;
  /** Share of first prompts turned the wrong way. */
  wrongWayShare: number;
}

type Plan =
  | { kind: 'still' }
  | { kind: 'until-told'; speed: number }
  | { kind: 'count'; left: number; speed: number }
  | { kind: 'dial'; speed: number };

/** A hand that acts on what the screen shows, in continuous time. Positive turns raise the trip point. */
export class Hand {
  private plan: Plan = { kind: 'still' };
  private startAt = 0;
  private stopAt = Infinity;
  private gripped = 0;
  private regripUntil = 0;
  private prompts = 0;
  private sign = 1;
  /** What the eyes had seen a reaction ago: (seconds, signed raising turns still to make). */
  private seen: { at: number; turns: number; wrongWay: boolean }[] = [];
  /** Turns against the dial until it is told so. */
  private contrary = false;

  constructor(
    private readonly habits: HandHabits,
    private readonly clockwiseRaises: boolean,
    private readonly random: Random,
    private readonly mode: 'beeps' | 'count' | 'dial',
    /** Nearer than this the dial looks as if it stood on its mark. */
    private readonly markTurns: number,
  ) {}

  get isTurning(): boolean {
    return this.plan.kind !== 'still';
  }

  /** A view appears at `at`; `prompts` counts the prompts so far. */
  see(view: TrimView, prompts: number, at: number): void {
    const turning = view.stage === 'turn' || view.stage === 'beep-1' || view.stage === 'beep-2';
    if (turning && view.turns !== null && view.direction !== null) {
      const raises = (view.direction === 'clockwise') === this.clockwiseRaises;
      this.seen.push({
        at,
        turns: raises ? view.turns : -view.turns,
        wrongWay: view.finding === 'wrong-way',
      });
      if (prompts !== this.prompts) this.start(view, prompts, raises ? 1 : -1, at);
    }
    // Told to stop: only a count goes on to its end.
    if (!turning && this.plan.kind !== 'still' && this.plan.kind !== 'count' && this.stopAt === Infinity) {
      this.stopAt = at + Math.max(0.05, this.habits.reactionSeconds + this.random.normal(0, 0.05));
    }
  }

  private start(view: TrimView, prompts: number, sign: number, at: number): void {
    const { habits, random } = this;
    const first = this.prompts === 0;
    this.prompts = prompts;
    const wrong = first && random.uniform(0, 1) < habits.wrongWayShare;
    this.sign = wrong ? -sign : sign;
    this.contrary = wrong;
    const base = first
      ? habits.firstPromptSeconds
      : view.stage === 'beep-2'
        ? habits.secondBeepSeconds
        : habits.laterPromptSeconds;
    this.startAt = at + base * Math.max(0.3, 1 + random.normal(0, 0.2));
    this.stopAt = Infinity;
    this.gripped = 0;
    this.seen = this.seen.slice(-1);
    const spread = Math.max(0.4, 1 + random.normal(0, habits.speedSpread));
    const asked = view.paceTurnsPerSecond ?? habits.briskTurnsPerSecond;
    const speed = Math.max(habits.slowestTurnsPerSecond, asked * spread);
    if (this.mode === 'beeps') this.plan = { kind: 'until-told', speed };
    else if (this.mode === 'dial') this.plan = { kind: 'dial', speed };
    else {
      const turns = view.turns! * (1 + random.normal(0, habits.countErrorFraction));
      this.plan = { kind: 'count', left: Math.max(0, turns + random.normal(0, habits.countErrorTurns)), speed };
    }
  }

  /** Raising turns made between `at` and `at + seconds`. */
  advance(at: number, seconds: number): number {
    if (this.plan.kind === 'still' || at < this.startAt) return 0;
    if (at >= this.stopAt) {
      this.plan = { kind: 'still' };
      return 0;
    }
    if (at < this.regripUntil) return 0;
    const turns = this.wanted(at, seconds);
    this.gripped += Math.abs(turns);
    if (this.gripped >= this.habits.gripTurns) {
      this.gripped = 0;
      this.regripUntil = at + seconds + this.habits.regripSeconds * Math.max(0.3, 1 + this.random.normal(0, 0.3));
    }
    return turns;
  }

  private wanted(at: number, seconds: number): number {
    const { plan, habits } = this;
    switch (plan.kind) {
      case 'still':
        return 0;
      case 'until-told':
        return this.sign * plan.speed * seconds;
      case 'count': {
        const step = Math.min(plan.left, plan.speed * seconds);
        plan.left -= step;
        if (plan.left <= 0) this.plan = { kind: 'still' };
        return this.sign * step;
      }
      case 'dial': {
        // Turns toward what the dial showed a reaction ago, slower as it nears the mark, and rests on it.
        const past = this.seen.findLast((glance) => glance.at <= at - habits.reactionSeconds) ?? this.seen[0];
        if (!past) return 0;
        if (past.wrongWay) this.contrary = false;
        const left = Math.abs(past.turns);
        if (left < this.markTurns) return 0;
        const speed = Math.min(plan.speed, Math.max(habits.slowestTurnsPerSecond, left * 1.5));
        return (this.contrary ? -1 : 1) * Math.sign(past.turns) * speed * seconds;
      }
    }
  }
}
