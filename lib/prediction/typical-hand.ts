import type { RunView } from '../contracts/bench-view';
import type { TypicalBench } from './typical-bench';

/** Turns a second: brisk, and slowly towards the second beep or the dial's end mark. A single-turn part is turned by degrees. */
export const paceOfHand = (travelTurns: number) =>
  travelTurns > 1 ? { brisk: 0.5, slow: 0.1 } : { brisk: 30 / 360, slow: 10 / 360 };
/** From the beep to the hand standing still. */
export const reactionMs = 200;
/** From what the screen asks to the hand being there. */
const firstTurnMs = 1800;
const nextTurnMs = 900;

type Prompt = Extract<RunView['screen'], { kind: 'trim' }>['trim'];

/** A hand that does what the trim's prompts ask, at an even pace and without error. */
export class TypicalHand {
  private wish: string | null = null;
  private turned = false;
  private fromMs = Infinity;
  private untilMs = Infinity;
  private turnsPerSecond = 0;
  private movedUntilMs = 0;

  constructor(private readonly bench: TypicalBench) {}

  /** Lets the hand go on to the bench's clock. */
  follow(): void {
    const { nowMs } = this.bench;
    const from = Math.max(this.fromMs, this.movedUntilMs);
    const until = Math.min(this.untilMs, nowMs);
    this.movedUntilMs = nowMs;
    if (until > from) this.bench.turn((this.turnsPerSecond * (until - from)) / 1000);
  }

  /** What the screen asks from now on. */
  see(screen: RunView['screen']): void {
    const prompt = screen.kind === 'trim' && screen.trim.direction !== null ? screen.trim : null;
    const wish = prompt && `${prompt.stage}:${prompt.direction}:${prompt.round}:${prompt.finding ?? ''}`;
    const { nowMs } = this.bench;
    if (wish !== this.wish) {
      this.wish = wish;
      // A hand still on its way never starts; one that turns stops after a person's reaction.
      this.untilMs = nowMs < this.fromMs ? this.fromMs : Math.min(this.untilMs, nowMs + reactionMs);
      if (prompt) this.start(prompt);
    }
  }

  private start(prompt: Prompt): void {
    const { brisk, slow } = paceOfHand(this.bench.boardType.trimmer.turns);
    const { nowMs } = this.bench;
    // What is left of a turn that is being stopped is made before the next.
    const lateMs = Number.isFinite(this.untilMs) ? Math.max(0, this.untilMs - Math.max(nowMs, this.fromMs)) : 0;
    if (lateMs > 0) this.bench.turn((this.turnsPerSecond * lateMs) / 1000);
    this.fromMs = nowMs + (this.turned ? nextTurnMs : firstTurnMs);
    this.turned = true;
    this.turnsPerSecond = (prompt.direction === 'clockwise' ? 1 : -1) * (prompt.stage === 'beep-2' ? slow : brisk);
    this.untilMs = Infinity;
    if (prompt.stage !== 'turn') return;
    // Led by the dial it stops where the target is; told a turn, after that turn.
    const live = this.isLive(prompt);
    const turns = live ? this.bench.turnsTo(prompt.targetVolts) : (prompt.turns ?? 0);
    if (live) this.turnsPerSecond = Math.sign(turns) * brisk;
    this.untilMs = this.fromMs + (Math.abs(turns) / brisk) * 1000;
  }

  private isLive({ stage, liveTripVolts, turns }: Prompt): boolean {
    return stage !== 'beep-1' && stage !== 'beep-2' && liveTripVolts !== null && turns !== null;
  }
}
