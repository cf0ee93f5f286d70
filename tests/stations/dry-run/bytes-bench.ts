import { VirtualClock } from '@/stations/clock/virtual-clock';
import { openBench } from '@/stations/instruments/open-bench';
import { dryBoard } from '@/stations/dry-run/dry-board';
import { benchOptions, operatorFor, outcomeOf, planOf, type Trial } from '@/stations/dry-run/run-board';
import { RunPerformer } from '@/stations/run/run-performer';
import { simulateBench } from '@/stations/simulation/simulated-bench';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';

/** The same board of the same trial through the whole stack: SCPI in bytes over mock serial lines, on a virtual clock. */
export async function runBoardInBytes(trial: Trial, index: number) {
  const clock = new VirtualClock();
  const options = benchOptions(trial, index);
  const { hasController, hasWiperProbe } = options;
  const simulation = simulateBench({ ...options, clock });
  const { seed } = options;
  const link = { kind: 'simulated', seed, baudRate: trial.station.baudRate as 115_200, hasController } as const;
  const bench = await openBench({ link, hasWiperProbe, simulation }, clock);
  // The first exchange of a link asks twice who is there; the bench without bytes begins where that is over.
  await bench.health();
  const board = new SimulatedBoard(dryBoard(trial.boardType, trial.settings, index));
  simulation.fixture.seat(board);
  const operator = operatorFor(trial, index, {
    fixture: simulation.fixture,
    clock,
    tell: (event) => performer.tell(event),
  });
  const performer: RunPerformer = new RunPerformer({
    plan: planOf(trial, index),
    bench,
    clock,
    watchdogMs: 20_000,
    log: { record: () => undefined },
    onView: ({ screen }) => operator.see(screen),
    onReading: () => undefined,
  });
  const startedMs = clock.now();
  operator.see(performer.view().screen);
  const result = await performer.perform();
  const seconds = (clock.now() - startedMs) / 1000;
  await bench.close();
  const outcome = outcomeOf({
    trial,
    board,
    result,
    stepIndex: performer.stepIndex,
    seconds,
    personSeconds: operator.waitedForMs / 1000,
  });
  return { outcome, result };
}
