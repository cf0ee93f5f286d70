import type { Ending } from '../decision/decide-verdict';
import { factsAfter, factsAfterAsking, type RunFacts } from '../run/facts';
import type { Ask, StepContext, StepEvent, StepTurn } from '../run/machine';
import type { Measurement, RunEffect, RunEvent, RunPlan } from '../run/types';
import type { Step } from '../sequence/step';
import type { StationKind } from '../sequence/station-kind';
import { kindOf } from '../steps/step-kinds';
import { asksPerson } from './asks-person';
import { TypicalBench, type BenchNote, type BenchState } from './typical-bench';
import { TypicalHand } from './typical-hand';

export interface StepEntry {
  plan: RunPlan;
  stepIndex: number;
  facts: RunFacts;
  bench: BenchState;
}

/** One step as it went. Times run from its beginning. */
export interface PlayedStep {
  /** Without the measurements of earlier steps. */
  facts: RunFacts;
  bench: BenchState;
  tookMs: number;
  personMs: number;
  notes: BenchNote[];
  /** Id of the step that follows where it is not the next one. */
  goTo: string | null;
  /** Null: the run goes on. `waits`: nobody does what the step waits for. */
  ending: Ending | { kind: 'waits' } | null;
}

/** The station looks at lid and board this often between effects; a step begins somewhere between two looks. */
const pollEveryMs = 400;
/** Far beyond what any step needs; one that asks for more never ends. */
const mostTurns = 20_000;

/** Plays one step's machine on the typical bench, with a person who does what it asks. */
export function playStep(step: Step, entry: StepEntry, station: StationKind): PlayedStep {
  const { plan, stepIndex } = entry;
  const bench = new TypicalBench(plan.boardType, station, entry.bench);
  const hand = new TypicalHand(bench);
  const kind = kindOf(step);
  const { machine: steps } = kind;
  let facts = entry.facts;
  const measured: Measurement[] = [];
  let personMs = 0;
  let polledMs = -pollEveryMs / 2;
  let asked = false;
  const context = (): StepContext => ({ plan, facts, stepIndex, atMs: bench.nowMs });
  const over = (ending: PlayedStep['ending'], goTo: string | null = null): PlayedStep => ({
    facts: { ...facts, measurements: measured },
    bench: bench.leave(),
    tookMs: bench.nowMs,
    personMs,
    notes: bench.notes,
    goTo,
    ending,
  });
  const learn = ({ facts: learned = {}, measurements = [] }: StepTurn<unknown>) => {
    measured.push(...measurements);
    facts = { ...facts, ...learned, measurements: [...facts.measurements, ...measurements] };
  };
  /** Lets time pass for the clock that it belongs to. */
  const timed = (work: () => void) => {
    const fromMs = bench.nowMs;
    work();
    if (asked) personMs += bench.nowMs - fromMs;
    hand.follow();
  };

  let turn = steps.begin(step, context());
  for (let turns = 0; turns < mostTurns; turns++) {
    learn(turn);
    if ('done' in turn) return over(null, turn.goTo ?? null);
    if ('ending' in turn) {
      if (turn.ending.kind !== 'complete') timed(() => bench.perform({ kind: 'supply-off' }));
      return over(turn.ending);
    }
    const { machine, ask } = turn;
    const screen = steps.view(machine, step, context());
    asked = asksPerson(screen);
    hand.see(screen);
    let event: StepEvent;
    if (ask) {
      facts = factsAfterAsking(facts, effectOf(ask));
      let answered!: ReturnType<TypicalBench['perform']>;
      timed(() => {
        answered = bench.perform(ask);
      });
      event = { ...answered, id: 1, atMs: bench.nowMs } as StepEvent;
    } else {
      const act = kind.typicalAct(machine, step, context());
      if (!act) return over({ kind: 'waits' });
      timed(() => {
        bench.nowMs += act.afterMs;
      });
      event = { ...act.act, atMs: bench.nowMs } as StepEvent;
      if (event.kind === 'lid') bench.setLid(event.closed);
    }
    facts = factsAfter(facts, event as RunEvent);
    turn = steps.advance(machine, event, step, context());
    if (plan.hasController && bench.nowMs - polledMs >= pollEveryMs) {
      timed(() => bench.pollFixture());
      polledMs = bench.nowMs;
    }
  }
  return over({ kind: 'waits' });
}

const effectOf = (ask: Ask) => ({ ...ask, id: 1 }) as RunEffect;
