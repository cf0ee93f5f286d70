import type { BoardType } from '@/lib/contracts/board-type';
import type { DryRunSettings } from '@/lib/contracts/dry-run';
import type { DryBoardOutcome } from '@/lib/dry-run/outcome';
import { isFastLink, pollMsAt } from '@/lib/run/link-pace';
import type { RunPlan, RunResult } from '@/lib/run/types';
import type { StationKind } from '@/lib/sequence/station-kind';
import type { Sequence } from '@/lib/sequence/step';
import { drawMeterCharacter } from '../simulation/meter-model';
import { seededRandom } from '../simulation/random';
import { SimulatedBoard } from '../simulation/simulated-board';
import { SimulatedOperator, usualHabits, type OperatorOptions } from '../simulation/simulated-operator';
import { drawSupplyCharacter } from '../simulation/supply-model';
import { dryBoard, seedsOf } from './dry-board';
import { openDryBench } from './dry-bench';
import { DryClock } from './dry-clock';
import { DryPerformer } from './dry-performer';
import { couldBeGood, isTrulyGood } from './true-limits';

/** What a dry run tries: one sequence on the boards of a type, at a station. */
export interface Trial {
  sequence: Sequence;
  boardType: BoardType;
  station: StationKind;
  settings: DryRunSettings;
}

/** Tests one board from scan to record, without bytes, on a clock of its own. Same trial and index, same outcome. */
export function runDryBoard(trial: Trial, index: number): DryBoardOutcome {
  return outcomeOf(performDryBoard(trial, index));
}

/** The run of one board in full. */
export function performDryBoard(trial: Trial, index: number): Performed {
  const clock = new DryClock();
  const { boardType, settings, station } = trial;
  const bench = openDryBench({ ...benchOptions(trial, index), clock, baudRate: station.baudRate });
  const board = new SimulatedBoard(dryBoard(boardType, settings, index));
  bench.fixture.seat(board);
  const operator = operatorFor(trial, index, { fixture: bench.fixture, clock, tell: (event) => performer.tell(event) });
  const performer: DryPerformer = new DryPerformer(planOf(trial, index), bench, (screen) => operator.see(screen));
  operator.see(performer.screen);
  const result = performer.perform();
  return {
    trial,
    board,
    result,
    stepIndex: performer.stepIndex,
    seconds: clock.now() / 1000,
    personSeconds: operator.waitedForMs / 1000,
  };
}

/** The same station for every board of a run, its noise afresh for each. */
export function benchOptions({ station, settings }: Trial, index: number) {
  const { hasController, hasWiperProbe } = station;
  const character = seededRandom(settings.seed);
  return {
    seed: seedsOf(settings.seed, index).bench,
    hasController,
    hasWiperProbe,
    supply: drawSupplyCharacter(character),
    meter: drawMeterCharacter(character, hasWiperProbe),
  };
}

/** The person who tests board `index`, with the run's own error of a turn. */
export function operatorFor(
  { settings }: Trial,
  index: number,
  at: Pick<OperatorOptions, 'fixture' | 'clock' | 'tell'>,
): SimulatedOperator {
  return new SimulatedOperator({
    ...at,
    random: seededRandom(seedsOf(settings.seed, index).hand),
    habits: {
      ...usualHabits,
      turnError: { relative: settings.turnErrorRelative, turns: settings.turnErrorDegrees / 360 },
    },
  });
}

export function planOf({ sequence, boardType, station, settings }: Trial, index: number): RunPlan {
  const { baudRate, commissioning, hasController, hasWiperProbe, meter } = station;
  return {
    runId: `dry-${index}`,
    serial: String(index),
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
    seed: seedsOf(settings.seed, index).bench,
  };
}

export interface Performed {
  trial: Trial;
  board: SimulatedBoard;
  result: RunResult;
  stepIndex: number;
  seconds: number;
  personSeconds: number;
}

export function outcomeOf(run: Performed): DryBoardOutcome {
  const { trial, board, result, stepIndex, seconds, personSeconds } = run;
  const { boardType, sequence } = trial;
  const last = (quantity: string, phase: string) =>
    result.measurements.findLast((m) => m.quantity === quantity && m.phase === phase)?.value ?? null;
  const trimmed = last('trip-volts', 'trimmed') !== null;
  return {
    verdict: result.verdict,
    reason: result.rejectReason,
    stepId: result.verdict === 'pass' ? null : lostAt(sequence, result, stepIndex),
    tripVolts: last('trip-volts', 'verified'),
    releaseVolts: last('release-volts', 'verified'),
    seconds,
    personSeconds,
    good:
      isTrulyGood(board, boardType, sequence) ||
      (result.verdict === 'reject' && !trimmed && couldBeGood(board.truth, boardType, sequence)),
  };
}

/** A judged failure belongs to the step that measured it, even where the run went on to its end. */
function lostAt({ steps }: Sequence, { measurements }: RunResult, stepIndex: number): string | null {
  const failed = measurements.find((m) => m.passed === false);
  return steps[Math.min(failed?.stepIndex ?? stepIndex, steps.length - 1)]?.id ?? null;
}
