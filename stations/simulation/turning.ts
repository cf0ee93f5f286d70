import type { TrimView } from '@/lib/trim/types';
import type { Clock } from '../clock/clock';
import type { Random } from './random';
import type { SimulatedFixture } from './simulated-fixture';

interface Screw {
  fixture: SimulatedFixture;
  clock: Pick<Clock, 'now' | 'after'>;
}

/** Turns a second: brisk, and slowly towards the second beep or the dial's end mark. A single-turn part is turned by degrees. */
const paceOf = (travelTurns: number) =>
  travelTurns > 1 ? { brisk: 0.5, slow: 0.1 } : { brisk: 30 / 360, slow: 10 / 360 };
const freeTurnsPerSecond = 1;
/** From the beep to the hand standing still. */
const reaction = { meanMs: 200, sdMs: 40, leastMs: 80 };
/** How far a stated turn is missed, one standard deviation each: a part of the turn, and a fixed part. */
export interface TurnError {
  relative: number;
  turns: number;
}
const usualError: TurnError = { relative: 0.03, turns: 4 / 360 };
/** Where a hand that follows the dial slows down and lets go, in seconds of turning at the brisk and at the slow pace. */
const easeSeconds = 0.6;
const letGoSeconds = 0.15;
const watchEveryMs = 20;
const patienceMs = 60_000;

/** Turns by hand, at an even pace. Resolves when done. */
export function turnScrew({ fixture, clock }: Screw, turns: number): Promise<void> {
  fixture.startTurning(turns, freeTurnsPerSecond);
  return new Promise((resolve) => {
    clock.after((Math.abs(turns) / freeTurnsPerSecond) * 1000, () => {
      fixture.stopTurning();
      resolve();
    });
  });
}

export interface PromptedTurn extends Screw {
  random: Random;
  error?: TurnError;
  prompt(): TrimView | null;
  onMove(): void;
}

/**
 * Does what the screen asks as a person does: towards a beep until the screen says it came, plus the time to react; after
 * a dial that counts down until it shows the end; or, where the dial stands still, a stated turn with a person's error.
 */
export function turnAsPrompted(job: PromptedTurn): Promise<void> {
  return new Promise((resolve) => beginTurnAsPrompted(job, resolve));
}

/** The same, calling back when the hand has let go. */
export function beginTurnAsPrompted(job: PromptedTurn, onDone: () => void): void {
  const { fixture, clock, random, error = usualError, prompt, onMove } = job;
  const asked = prompt();
  const board = fixture.seated;
  if (!asked?.direction || !board) return onDone();
  const { stage, direction } = asked;
  const listening = stage === 'beep-1' || stage === 'beep-2';
  const { brisk, slow } = paceOf(board.truth.trimmer.turns);
  const way = direction === 'clockwise' ? 1 : -1;
  const haste = 1 + 0.1 * random.normal();
  const estimate = (asked.turns ?? 0) * (1 + error.relative * random.normal()) + error.turns * random.normal();
  const farthest = board.truth.trimmer.turns * 2;
  const isLive = (view: TrimView) => !listening && view.liveTripVolts !== null && view.turns !== null;

  let pace = (stage === 'beep-2' ? slow : brisk) * haste;
  const turns = listening || isLive(asked) ? farthest : Math.max(0, estimate);
  fixture.startTurning(way * turns, pace);
  const doneAt = clock.now() + Math.min(patienceMs, (turns / pace) * 1000);

  const letGo = () => {
    fixture.stopTurning();
    onDone();
  };
  const look = () => {
    onMove();
    const view = prompt();
    if (view?.stage !== stage || view.direction !== direction) {
      clock.after(Math.max(reaction.leastMs, reaction.meanMs + reaction.sdMs * random.normal()), letGo);
      return;
    }
    if (isLive(view)) {
      if (view.turns! < slow * letGoSeconds) return letGo();
      if (pace > slow * haste && view.turns! < brisk * easeSeconds) {
        pace = slow * haste;
        fixture.startTurning(way * farthest, pace);
      }
    }
    watch();
  };
  const watch = () => {
    if (clock.now() >= doneAt) return letGo();
    clock.after(Math.min(watchEveryMs, doneAt - clock.now()), look);
  };
  watch();
}
