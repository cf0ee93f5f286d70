import type { BoardType } from '../contracts/board-type';
import { decideVerdict, verdictOf, type StepVisit } from '../decision/decide-verdict';
import { noFacts, type RunFacts } from '../run/facts';
import { isFastLink, pollMsAt } from '../run/link-pace';
import type { RunPlan } from '../run/types';
import { firstOf, nextEnabled } from '../sequence/enabled-steps';
import type { StationKind } from '../sequence/station-kind';
import type { Sequence, Step } from '../sequence/step';
import { playStep, type PlayedStep } from './play-step';
import { settledBench, settledFacts } from './settled-facts';
import { StepMemo } from './step-memo';
import { pointsOf, turnsFor, type BenchNote, type BenchState } from './typical-bench';
import type { PredictedStep, Prediction } from './types';

/** The middle of how far off its target a board comes. */
const offTargetVolts = 0.525;
/** Branches are bounded; this only keeps a faulty draft from going round for ever. */
const mostVisits = 400;

/**
 * Plays a draft on one typical board of its type at a station: nominal parts, a screw below its target, and a
 * person who does what is asked. `memo` keeps what was played before; the same one with each edit makes it quick.
 */
export function predictSequence(
  sequence: Sequence,
  boardType: BoardType,
  station: StationKind,
  memo = new StepMemo(),
): Prediction {
  memo.begin(boardType, station);
  const plan = planOf(sequence, boardType, station);
  const line = new TimeLine();
  const path: StepVisit[] = [];
  let facts: RunFacts = noFacts;
  let bench = freshBench(sequence, boardType);
  let stepIndex = 0;
  for (let visits = 0; visits < mostVisits; visits++) {
    stepIndex = nextEnabled(sequence, stepIndex);
    const step = sequence.steps[stepIndex];
    if (!step) break;
    const entry = { plan, stepIndex, facts, bench };
    const played = memo.play(step, entry, (watched) => playStep(step, watched, station));
    line.add(step.id, played);
    bench = settledBench(played.bench, trimmedTo(step, played, boardType));
    const own = played.facts.measurements.map((measurement) => ({ ...measurement, stepIndex }));
    const measurements = [...facts.measurements, ...own];
    facts = { ...settledFacts(played.facts, pointsOf(boardType, bench.screwTurns)), measurements };
    const { ending, goTo } = played;
    if (ending) return line.prediction(endingOf({ sequence, facts, path, ending, stepIndex }));
    const jumpedTo = goTo === null ? null : sequence.steps.findIndex(({ id, enabled }) => id === goTo && enabled);
    path.push({ stepIndex, measured: measurements.length, jumpedTo });
    stepIndex = jumpedTo === null ? stepIndex + 1 : jumpedTo < 0 ? sequence.steps.length : jumpedTo;
  }
  return line.prediction(endingOf({ sequence, facts, path, ending: { kind: 'complete' }, stepIndex }));
}

interface Ended {
  sequence: Sequence;
  facts: RunFacts;
  path: readonly StepVisit[];
  ending: NonNullable<PlayedStep['ending']>;
  stepIndex: number;
}

function endingOf({ sequence, facts, path, ending, stepIndex }: Ended): Prediction['ending'] {
  const { measurements, supply } = facts;
  const idAt = (index: number) => sequence.steps[Math.min(index, sequence.steps.length - 1)]?.id ?? null;
  if (ending.kind === 'waits') return { verdict: 'no-verdict', reason: null, stepId: idAt(stepIndex) };
  const supplyOff = supply.state === 'off' && supply.volts !== null;
  const decision = decideVerdict({ ending, sequence, path, measurements, supplyOff });
  const verdict = verdictOf(decision);
  if ('verdict' in decision) return { verdict, reason: null, stepId: null };
  const failed = measurements.find(({ passed }) => passed === false);
  return { verdict, reason: decision.reason, stepId: idAt(failed?.stepIndex ?? stepIndex) };
}

function planOf(sequence: Sequence, boardType: BoardType, station: StationKind): RunPlan {
  const { baudRate, commissioning, hasController, hasWiperProbe, meter } = station;
  return {
    runId: 'prediction',
    serial: '',
    attempt: 1,
    boardType,
    sequence,
    sequenceRevision: '',
    commissioning,
    hasController,
    hasWiperProbe,
    pollMs: pollMsAt(baudRate),
    fastLink: isFastLink(baudRate),
    prior: null,
    meter,
    seed: 0,
  };
}

/** The board as it comes: below the trim's target, or, where nothing trims it, as a trimmed one. */
function freshBench(sequence: Sequence, boardType: BoardType): BenchState {
  const { limits, search } = boardType;
  const trim = firstOf(sequence, 'trim');
  const middle = (limits.tripVolts.min + limits.tripVolts.max) / 2;
  const tripVolts = trim ? trim.targetVolts - offTargetVolts : middle;
  return {
    supplyOn: false,
    setVolts: 0,
    output: 'off',
    screwTurns: turnsFor(boardType, Math.max(search.tripVolts.min, tripVolts)),
    relays: { channel: null, cycles: null },
    lidClosed: false,
  };
}

/** Where the screw stands after a trim that reached its target; null after any other step. */
function trimmedTo(step: Step, { facts, ending }: PlayedStep, boardType: BoardType): number | null {
  if (step.kind !== 'trim' || ending || !facts.trimmed) return null;
  const missed = Math.abs(facts.trimmed.trip.volts - step.targetVolts);
  return missed <= step.toleranceVolts ? turnsFor(boardType, step.targetVolts) : null;
}

/** Gathers what the steps did, on one clock. */
class TimeLine {
  private nowMs = 0;
  private readonly steps: PredictedStep[] = [];
  private readonly notes: BenchNote[] = [];

  add(stepId: string, { tookMs, personMs, notes }: PlayedStep): void {
    const fromMs = this.nowMs;
    this.nowMs += tookMs;
    this.steps.push({ stepId, fromMs, toMs: this.nowMs, stationMs: tookMs - personMs, personMs });
    for (const note of notes) this.notes.push({ ...note, atMs: note.atMs + fromMs });
  }

  prediction(ending: Prediction['ending']): Prediction {
    const { steps, notes, nowMs } = this;
    const supply = notes.flatMap((note) => (note.kind === 'supply' ? [{ atMs: note.atMs, volts: note.volts }] : []));
    return {
      steps,
      supply: [{ atMs: 0, volts: 0 }, ...supply],
      loadOn: this.loadOn(),
      flips: notes.flatMap((note) =>
        note.kind === 'flip' ? [{ atMs: note.atMs, volts: note.volts, point: note.point }] : [],
      ),
      totalMs: nowMs,
      personMs: steps.reduce((sum, step) => sum + step.personMs, 0),
      ending,
    };
  }

  private loadOn(): Prediction['loadOn'] {
    const stretches: Prediction['loadOn'] = [];
    let fromMs: number | null = null;
    for (const note of this.notes) {
      if (note.kind !== 'load') continue;
      if (note.on) fromMs ??= note.atMs;
      else if (fromMs !== null) {
        stretches.push({ fromMs, toMs: note.atMs });
        fromMs = null;
      }
    }
    if (fromMs !== null) stretches.push({ fromMs, toMs: this.nowMs });
    return stretches;
  }
}
