import type { RunView } from '@/lib/contracts/bench-view';
import { advanceRun, beginRun, resultOf, type RunState } from '@/lib/run/run';
import type { RunEffect, RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import { viewRun } from '@/lib/run/view';
import { sequences } from '@/db/seed/sequences';
import { boardTypes } from '@/db/seed/board-types';
import { Plant, type PlantOptions } from './plant';

export function planFor(code: string, over: Partial<RunPlan> = {}): RunPlan {
  const boardType = boardTypes.find((type) => type.code === code)!;
  const { sequence } = sequences.find((s) => s.boardTypeCode === code)!;
  return {
    runId: '00000000-0000-4000-8000-000000000001',
    serial: `${code}264800184`,
    attempt: 1,
    boardType,
    sequence,
    sequenceRevision: 'r1',
    commissioning: { overshoot: 0.05, settleMs: 40, waypointMs: 30, noiseVolts: 0.001 },
    hasController: true,
    hasWiperProbe: true,
    pollMs: 20,
    fastLink: true,
    prior: null,
    meter: { gain: 20e-6, offsetVolts: 0.0003, resolutionVolts: 0.0001 },
    seed: 1,
    ...over,
  };
}

export interface Played {
  result: RunResult;
  view: RunView;
  events: RunEvent[];
  effects: RunEffect[];
  screens: string[];
  plant: Plant;
  state: RunState;
}

/** How fast the hand turns in each stage of a trim, in turns a second. */
const paces = { brisk: 0.5, slow: 0.1, reactionMs: 200 };

/** One board from scan to record, with an operator who does what the screen says. */
export function playBoard(plan: RunPlan, options: Omit<PlantOptions, 'boardType'> & { answer?: boolean }): Played {
  const plant = new Plant({ ...options, boardType: plan.boardType, hasController: plan.hasController });
  const operator = new Operator(plant, plan, options.answer ?? true);
  const events: RunEvent[] = [];
  const effects: RunEffect[] = [];
  const screens: string[] = [];
  let { state, effects: pending } = beginRun(plan, plant.nowMs);
  effects.push(...pending);
  const take = (event: RunEvent) => {
    events.push(event);
    const next = advanceRun(state, event);
    state = next.state;
    effects.push(...next.effects);
    if (next.effects.length > 0) pending = next.effects;
  };
  for (let turns = 0; turns < 40_000 && !resultOf(state); turns++) {
    const screen = viewRun(state).screen;
    if (screens.at(-1) !== screenName(screen)) screens.push(screenName(screen));
    const [effect] = pending;
    pending = [];
    if (effect && effect.kind !== 'record-run') {
      const before = plant.nowMs;
      const answer = plant.perform(effect);
      operator.turnDuring(plant.nowMs - before, screen);
      take(answer);
      continue;
    }
    const act = operator.act(screen);
    if (!act) throw new Error(`Nothing to do at ${screenName(screen)}.`);
    take(act);
  }
  const result = resultOf(state);
  if (!result) throw new Error('The run does not end.');
  return { result, view: viewRun(state), events, effects, screens, plant, state };
}

function screenName(screen: RunView['screen']): string {
  if (screen.kind === 'measuring') return screen.what.code;
  if (screen.kind === 'trim') return `trim:${screen.trim.stage}`;
  return 'wants' in screen ? `${screen.kind}:${screen.wants}` : screen.kind;
}

/** Does what the screen says, at once. */
export class Operator {
  private reactAtMs = 0;
  private stage = '';
  private leftTurns = 0;
  constructor(
    private readonly plant: Plant,
    private readonly plan: RunPlan,
    private readonly answer: boolean,
  ) {}

  act(screen: RunView['screen']): RunEvent | null {
    const { plant } = this;
    const atMs = (plant.nowMs += 500);
    const lid = (closed: boolean): RunEvent => {
      plant.lidClosed = closed;
      return { atMs, kind: 'lid', closed };
    };
    if (screen.kind === 'operator-check') return { atMs, kind: 'answer', ok: this.answer };
    if (screen.kind === 'instruction') return this.instructed(screen.supplyOff, atMs);
    if (screen.kind === 'seat') {
      if (screen.wants === 'confirm-lid-and-board') {
        plant.boardPresent = plant.lidClosed = true;
        return { atMs, kind: 'confirm', what: 'lid-and-board' };
      }
      if (!plant.boardPresent) {
        plant.boardPresent = true;
        return { atMs, kind: 'board', present: true };
      }
      return lid(true);
    }
    if (screen.kind !== 'seal') return null;
    switch (screen.wants) {
      case 'open-lid':
        if (this.plan.hasController) return lid(false);
        plant.lidClosed = false;
        return { atMs, kind: 'confirm', what: 'lid-open' };
      case 'seal-screw':
        return { atMs, kind: 'confirm', what: 'sealed' };
      case 'close-lid':
        if (this.plan.hasController) return lid(true);
        plant.lidClosed = true;
        return { atMs, kind: 'confirm', what: 'lid-closed' };
      default:
        return null;
    }
  }

  /** Opens the lid where it may be opened, and says that it is done. */
  private instructed(mayOpen: boolean, atMs: number): RunEvent {
    if (mayOpen && this.plant.lidClosed && this.plan.hasController) {
      this.plant.lidClosed = false;
      return { atMs, kind: 'lid', closed: false };
    }
    if (mayOpen) this.plant.lidClosed = false;
    return { atMs, kind: 'confirm', what: 'instruction-done' };
  }

  /** The hand goes on until it has reacted to the stage that the screen shows. */
  turnDuring(milliseconds: number, screen: RunView['screen']): void {
    if (screen.kind !== 'trim') return;
    const { trim } = screen;
    const stage = `${trim.stage} ${trim.round} ${trim.direction}`;
    if (stage !== this.stage) {
      this.stage = stage;
      this.reactAtMs = this.plant.nowMs + paces.reactionMs;
      // A beep says when to stop; a stated turn is made as asked.
      this.leftTurns = trim.stage === 'turn' ? (trim.turns ?? 0) : Infinity;
    }
    if (!trim.direction || this.plant.nowMs < this.reactAtMs) return;
    const pace = trim.paceTurnsPerSecond ?? (trim.stage === 'beep-2' ? paces.slow : this.brisk());
    const turns = Math.min(this.leftTurns, (pace * milliseconds) / 1000);
    this.leftTurns -= turns;
    this.plant.turn(trim.direction === 'clockwise' ? turns : -turns);
  }

  private brisk(): number {
    return this.plan.boardType.trimmer.turns > 2 ? paces.brisk : 0.04;
  }
}
