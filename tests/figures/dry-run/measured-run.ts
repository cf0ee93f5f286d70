import type { BoardType } from '@/lib/contracts/board-type';
import { isFastLink, pollMsAt } from '@/lib/run/link-pace';
import type { Verdict } from '@/lib/run/types';
import type { StationKind } from '@/lib/sequence/station-kind';
import type { Sequence } from '@/lib/sequence/step';
import type { Clock } from '@/stations/clock/clock';
import { openBench } from '@/stations/instruments/open-bench';
import { RunPerformer } from '@/stations/run/run-performer';
import { drawBoard } from '@/stations/simulation/draw-board';
import { seededRandom } from '@/stations/simulation/random';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';
import { SimulatedOperator, usualHabits } from '@/stations/simulation/simulated-operator';

export interface MeasuredRun {
  verdict: Verdict;
  /** What the station needed, and what it waited for a person. */
  stationMs: number;
  personMs: number;
}

/** One drawn board through the station's own code over bytes, on any clock. */
export async function measureRun(
  sequence: Sequence,
  boardType: BoardType,
  station: StationKind,
  seed: number,
  clock: Clock,
): Promise<MeasuredRun> {
  const { baudRate, hasController, hasWiperProbe, commissioning, meter } = station;
  const link = { kind: 'simulated', seed, baudRate, hasController } as const;
  const bench = await openBench({ link, hasWiperProbe }, clock);
  // Links are synchronised long before a board comes.
  await bench.health();
  const { fixture } = bench.simulation!;
  fixture.seat(new SimulatedBoard(drawBoard(boardType, seed, 'none')));
  const operator = new SimulatedOperator({
    fixture,
    clock,
    random: seededRandom(seed),
    habits: usualHabits,
    tell: (event) => performer.tell(event),
  });
  const performer: RunPerformer = new RunPerformer({
    plan: {
      runId: `measured-${seed}`,
      serial: String(seed),
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
      seed,
    },
    bench,
    clock,
    watchdogMs: 20_000,
    log: { record: () => undefined },
    onView: ({ screen }) => operator.see(screen),
    onReading: () => undefined,
  });
  const startedMs = clock.now();
  operator.see(performer.view().screen);
  const { verdict } = await performer.perform();
  const tookMs = clock.now() - startedMs;
  await bench.close();
  return { verdict, stationMs: tookMs - operator.waitedForMs, personMs: operator.waitedForMs };
}
