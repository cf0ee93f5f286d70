import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import type { Clock } from '@/stations/clock/clock';
import { drawBoard } from '@/stations/simulation/draw-board';
import type { BoardTruth } from '@/stations/simulation/board-truth';
import { seededRandom } from '@/stations/simulation/random';
import { SimulatedBoard } from '@/stations/simulation/simulated-board';
import { SimulatedFixture } from '@/stations/simulation/simulated-fixture';
import { runNetlist } from './ngspice';

/** Own netlists, Debian's ngspice, run here; agreement with the simulated board of the same parts. */

function partsOf(board: SimulatedBoard): Record<string, number> {
  const { design } = board.truth;
  const { reference, ...others } = design;
  return {
    ...others,
    ...reference,
    upperOhms: (1 - board.wiper) * design.trimmerOhms,
    lowerOhms: board.wiper * design.trimmerOhms,
  };
}

const boards = boardTypes.flatMap((boardType) =>
  [1, 2].map((seed) => ({ name: `${boardType.code} board ${seed}`, truth: drawBoard(boardType, seed, 'none') })),
);

describe('the simulated board against ngspice', () => {
  it.each(boards)('$name: trip, release and reference', ({ truth }) => {
    const board = new SimulatedBoard(truth);
    const points = board.thresholds();
    const highVolts = points.releaseVolts + 0.6;
    const lowVolts = points.tripVolts - 0.6;
    const found = runNetlist('thresholds', {
      ...partsOf(board),
      highVolts,
      lowVolts,
      rampSeconds: highVolts - lowVolts,
    });
    expect(Math.abs(found.trip! - points.tripVolts)).toBeLessThan(2e-4);
    expect(Math.abs(found.release! - points.releaseVolts)).toBeLessThan(2e-4);
    expect(Math.abs(found.tripreference! - board.referenceVolts(points.tripVolts))).toBeLessThan(1e-4);
  });

  it.each(boards)('$name: how long the reservoir carries it', ({ truth }) => {
    const board = new SimulatedBoard(truth);
    const { tripVolts, releaseVolts } = board.thresholds();
    const supplyVolts = (tripVolts + releaseVolts) / 2 + 0.1;
    const found = runNetlist('ride-through', {
      ...partsOf(board),
      supplyVolts,
      tripVolts,
      tripReferenceVolts: board.referenceVolts(tripVolts),
      stopSeconds: 0.5,
    });
    const carriedMs = (found.fell! - 0.001) * 1000;
    // The simulated reservoir discharges through a constant resistance instead of a part constant current.
    expect(holds(truth, supplyVolts, carriedMs * 0.97)).toBe(true);
    expect(holds(truth, supplyVolts, carriedMs * 1.03)).toBe(false);
  });

  it.each([
    { factor: 0.6, chatters: false },
    { factor: 1.8, chatters: true },
  ])('a contact whose drop is $factor of the hysteresis chatters: $chatters', ({ factor, chatters }) => {
    const truth = boards[0]!.truth;
    const board = new SimulatedBoard({ ...truth, noiseVolts: 0 });
    const { tripVolts, releaseVolts } = board.thresholds();
    const loadAmps = tripVolts / truth.design.loadOhms;
    const contactOhms = ((releaseVolts - tripVolts) * factor) / loadAmps;
    const found = runNetlist('contact-chatter', {
      ...partsOf(board),
      contactOhms,
      highVolts: releaseVolts + loadAmps * contactOhms + 0.5,
      lowVolts: tripVolts - 0.3,
      rampSeconds: 0.2,
    });
    expect(found.tripsource).toBeGreaterThan(tripVolts);
    expect(found.second !== undefined).toBe(chatters);
    expect(chattersOnBench({ ...truth, noiseVolts: 0, padOhms: contactOhms })).toBe(chatters);
  });
});

function bench(truth: BoardTruth) {
  let now = 0;
  const clock = { now: () => now } as Clock;
  const fixture = new SimulatedFixture(clock, seededRandom(1), {
    step: { overshoot: 1e-4, peakMs: 5 },
    contactOhms: 0,
  });
  fixture.setLid(true);
  fixture.seat(new SimulatedBoard({ ...truth, noiseVolts: 0 }));
  const settle = (volts: number) => {
    fixture.setTarget(volts);
    now += 100;
    fixture.advance();
  };
  const wait = (ms: number) => {
    now += ms;
    fixture.advance();
  };
  return { fixture, settle, wait };
}

function holds(truth: BoardTruth, supplyVolts: number, interruptedMs: number): boolean {
  const { fixture, settle, wait } = bench(truth);
  fixture.switchOn();
  settle(supplyVolts + 3);
  settle(supplyVolts);
  fixture.interrupt(interruptedMs);
  wait(interruptedMs + 50);
  return fixture.outputOn();
}

/** Falls in small steps and counts the changes of the output. */
function chattersOnBench(truth: BoardTruth): boolean {
  const { fixture, settle } = bench(truth);
  fixture.switchOn();
  settle(30);
  const states: boolean[] = [];
  for (let volts = 30; volts > 9; volts -= 0.02) {
    settle(volts);
    states.push(fixture.outputOn());
  }
  return states.filter((on, i) => i > 0 && on !== states[i - 1]).length > 1;
}
