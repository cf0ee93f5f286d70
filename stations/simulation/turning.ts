import type { TrimView } from '@/lib/trim/types';
import type { Clock } from '../clock/clock';
import type { Random } from './random';
import type { SimulatedFixture } from './simulated-fixture';

interface Screw {
  fixture: SimulatedFixture;
  clock: Clock;
}

/** Turns a second: brisk, and slowly towards the second beep. A single-turn part is turned by degrees. */
const paceOf = (travelTurns: number) =>
  travelTurns > 1 ? { brisk: 0.5, slow: 0.1 } : { brisk: 30 / 360, slow: 10 / 360 };
const freeTurnsPerSecond = 1;
/** From the beep to the hand standing still. */
const reaction = { meanMs: 200, sdMs: 40 };
/** About as asked: a few per cent, plus a few degrees. */
const turnError = { relative: 0.03, turns: 4 / 360 };
const watchEveryMs = 20;
const patienceMs = 60_000;

/** Turns by hand, at an even pace. Resolves when done. */
export async function turnScrew({ fixture, clock }: Screw, turns: number): Promise<void> {
  fixture.startTurning(turns, freeTurnsPerSecond);
  await clock.sleep((Math.abs(turns) / freeTurnsPerSecond) * 1000);
  fixture.stopTurning();
}

/**
 * Does what the screen asks as a person does: a stated turn with a person's error, or towards a beep until the screen
 * says it came, plus the time to react.
 */
export async function turnAsPrompted(
  job: Screw & { random: Random; prompt(): TrimView | null; onMove(): void },
): Promise<void> {
  const { fixture, clock, random, prompt, onMove } = job;
  const asked = prompt();
  const board = fixture.seated;
  if (!asked?.direction || !board) return;
  const { stage } = asked;
  const listening = stage === 'beep-1' || stage === 'beep-2';
  const pace = paceOf(board.truth.trimmer.turns);
  const turnsPerSecond = (stage === 'beep-2' ? pace.slow : pace.brisk) * (1 + 0.1 * random.normal());
  const wanted = (asked.turns ?? 0) * (1 + turnError.relative * random.normal()) + turnError.turns * random.normal();
  const turns = listening ? board.truth.trimmer.turns * 2 : Math.max(0, wanted);
  const way = asked.direction === 'clockwise' ? 1 : -1;

  fixture.startTurning(way * turns, turnsPerSecond);
  const doneAt = clock.now() + Math.min(patienceMs, (turns / turnsPerSecond) * 1000);
  while (clock.now() < doneAt) {
    await clock.sleep(Math.min(watchEveryMs, doneAt - clock.now()));
    onMove();
    const now = prompt();
    if (now?.stage === stage && now.direction === asked.direction) continue;
    await clock.sleep(Math.max(80, reaction.meanMs + reaction.sdMs * random.normal()));
    break;
  }
  fixture.stopTurning();
}
