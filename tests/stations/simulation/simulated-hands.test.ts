import { beforeEach, describe, expect, it } from 'vitest';
import type { HandsView } from '@/lib/contracts/bench-command';
import type { TrimView } from '@/lib/trim/types';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { simulateBench, type SimulatedBench } from '@/stations/simulation/simulated-bench';
import { SimulatedHands, type BoardOrder } from '@/stations/simulation/simulated-hands';
import { sampleBoardType } from './sample-board-type';

let clock: VirtualClock;
let bench: SimulatedBench;
let hands: SimulatedHands;
let prompt: TrimView | null | (() => TrimView);
let views: HandsView[];
let box: string[];

const trimView: TrimView = {
  stage: 'turn',
  direction: 'clockwise',
  turns: 1,
  words: null,
  targetVolts: 9,
  toleranceVolts: 0.02,
  heldVolts: null,
  lastTripVolts: 8.5,
  lastTripIsStale: false,
  liveTripVolts: null,
  finding: null,
  findingVolts: null,
  round: 1,
};

const orders: Record<string, BoardOrder> = {
  A: { kind: 'drawn', boardType: sampleBoardType, seed: 1, defect: 'none' },
  B: { kind: 'drawn', boardType: sampleBoardType, seed: 2, defect: 'zener-open' },
  REF: { kind: 'reference', boardType: sampleBoardType, points: { tripVolts: 9, releaseVolts: 9.6 } },
};

beforeEach(() => {
  clock = new VirtualClock();
  bench = simulateBench({ clock, seed: 4, hasController: true, hasWiperProbe: false });
  prompt = null;
  views = [];
  box = ['A', 'B'];
  hands = new SimulatedHands({
    bench,
    clock,
    seed: 9,
    box: { nextSerial: async () => box[0] ?? null, orderOf: async (serial) => orders[serial] ?? null },
    prompt: () => (typeof prompt === 'function' ? prompt() : prompt),
    onChange: (view) => views.push(view),
  });
});

describe('SimulatedHands with boards', () => {
  it('places the next board of the box, or the one named, and shows it', async () => {
    await hands.lookIntoBox();
    expect(hands.view()).toMatchObject({ boardSerial: null, nextSerial: 'A', defect: 'none' });
    expect(await hands.perform({ kind: 'place-board' })).toEqual({ ok: true });
    expect(hands.view()).toMatchObject({ boardSerial: 'A', travelTurns: 25 });
    await hands.perform({ kind: 'remove-board' });
    await hands.perform({ kind: 'place-board', serial: 'B' });
    expect(views.at(-1)).toMatchObject({ boardSerial: 'B', defect: 'zener-open' });
  });

  it('refuses what a person could not do, each with its code', async () => {
    expect(await hands.perform({ kind: 'remove-board' })).toMatchObject({ code: 'hands.no-board' });
    expect(await hands.perform({ kind: 'turn', turns: 1 })).toMatchObject({ code: 'hands.no-board' });
    expect(await hands.perform({ kind: 'defect', defect: 'none' })).toMatchObject({ code: 'hands.no-board' });
    expect(await hands.perform({ kind: 'place-board', serial: 'NOBODY' })).toMatchObject({
      code: 'hands.unknown-board',
    });
    await hands.perform({ kind: 'place-board' });
    expect(await hands.perform({ kind: 'place-board' })).toMatchObject({ code: 'hands.fixture-full' });
    expect(await hands.perform({ kind: 'turn-as-prompted' })).toMatchObject({ code: 'hands.no-prompt' });
    await hands.perform({ kind: 'lid', closed: true });
    expect(await hands.perform({ kind: 'remove-board' })).toMatchObject({ code: 'hands.lid-closed' });
    box = [];
    await hands.perform({ kind: 'lid', closed: false });
    await hands.perform({ kind: 'remove-board' });
    expect(await hands.perform({ kind: 'place-board' })).toMatchObject({ code: 'hands.box-empty' });
  });

  it('finds the screw of a board where it left it', async () => {
    await hands.perform({ kind: 'place-board' });
    await hands.perform({ kind: 'turn', turns: 0.5 });
    const left = hands.view().screwTurns;
    await hands.perform({ kind: 'remove-board' });
    await hands.perform({ kind: 'place-board', serial: 'B' });
    await hands.perform({ kind: 'remove-board' });
    await hands.perform({ kind: 'place-board', serial: 'A' });
    expect(hands.view().screwTurns).toBe(left);
  });

  it('places a reference board with its recorded points', async () => {
    await hands.perform({ kind: 'place-board', serial: 'REF' });
    const { tripVolts, releaseVolts } = bench.fixture.seated!.thresholds();
    expect(tripVolts).toBeCloseTo(9, 6);
    expect(releaseVolts).toBeCloseTo(9.6, 6);
  });

  it('fits a defect and takes it out again, the screw where it was', async () => {
    await hands.perform({ kind: 'place-board' });
    await hands.perform({ kind: 'turn', turns: 0.25 });
    const { screwTurns } = hands.view();
    const sound = bench.fixture.seated!.thresholds();
    await hands.perform({ kind: 'defect', defect: 'feedback-open' });
    const { tripVolts, releaseVolts } = bench.fixture.seated!.thresholds();
    expect(releaseVolts - tripVolts).toBeLessThan(0.001);
    await hands.perform({ kind: 'defect', defect: 'none' });
    expect(hands.view()).toMatchObject({ defect: 'none', screwTurns });
    expect(bench.fixture.seated!.thresholds().tripVolts).toBeCloseTo(sound.tripVolts, 2);
  });

  it('pulls and plugs cables', async () => {
    await hands.perform({ kind: 'cable', which: 'meter', plugged: false });
    expect(hands.view().cables).toEqual({ supply: true, meter: false, controller: true });
    await hands.perform({ kind: 'cable', which: 'meter', plugged: true });
    expect(hands.view().cables.meter).toBe(true);
  });
});

describe('SimulatedHands at the screw', () => {
  beforeEach(() => hands.perform({ kind: 'place-board' }));

  it('turns as far as told, taking time, and stops at the end of travel', async () => {
    const before = hands.view().screwTurns;
    const startedAt = clock.now();
    await hands.perform({ kind: 'turn', turns: -2 });
    expect(before - hands.view().screwTurns).toBeCloseTo(2, 6);
    expect(clock.now() - startedAt).toBeGreaterThan(1500);
    for (let i = 0; i < 8; i++) await hands.perform({ kind: 'turn', turns: -4 });
    expect(hands.view().screwTurns).toBe(0);
  });

  it('turns about as prompted: within a few per cent and a few degrees, never exactly', async () => {
    const errors: number[] = [];
    for (let i = 0; i < 24; i++) {
      prompt = { ...trimView, direction: i % 2 ? 'clockwise' : 'anticlockwise', turns: 1 };
      const before = hands.view().screwTurns;
      await hands.perform({ kind: 'turn-as-prompted' });
      errors.push(Math.abs(hands.view().screwTurns - before) - 1);
    }
    const rms = Math.sqrt(errors.reduce((sum, e) => sum + e * e, 0) / errors.length);
    expect(rms).toBeGreaterThan(0.015);
    expect(rms).toBeLessThan(0.06);
  });

  it('turns towards a beep until it comes, and a reaction longer', async () => {
    prompt = { ...trimView, stage: 'beep-1', direction: 'anticlockwise' };
    const before = hands.view().screwTurns;
    clock.after(3000, () => {
      prompt = { ...trimView, stage: 'beep-1-heard', direction: null };
    });
    const startedAt = clock.now();
    await hands.perform({ kind: 'turn-as-prompted' });
    expect(clock.now() - startedAt).toBeGreaterThan(3070);
    expect(clock.now() - startedAt).toBeLessThan(3400);
    expect(before - hands.view().screwTurns).toBeGreaterThan(1.1);
    expect(before - hands.view().screwTurns).toBeLessThan(2.1);
  });

  it('turns slowly towards the second beep', async () => {
    prompt = { ...trimView, stage: 'beep-2' };
    const before = hands.view().screwTurns;
    clock.after(2000, () => {
      prompt = null;
    });
    await hands.perform({ kind: 'turn-as-prompted' });
    expect(hands.view().screwTurns - before).toBeGreaterThan(0.15);
    expect(hands.view().screwTurns - before).toBeLessThan(0.32);
  });

  it('follows a dial that counts down and lets go near its end', async () => {
    const goal = hands.view().screwTurns + 1.3;
    const live = (): TrimView => {
      const left = goal - bench.fixture.seated!.screwTurns;
      return {
        ...trimView,
        liveTripVolts: 8.9,
        direction: left >= 0 ? 'clockwise' : 'anticlockwise',
        turns: Math.abs(left),
      };
    };
    prompt = live;
    await hands.perform({ kind: 'turn-as-prompted' });
    expect(Math.abs(hands.view().screwTurns - goal)).toBeLessThan(0.03);
  });

  it('loses a reversal’s backlash', async () => {
    const board = bench.fixture.seated!;
    board.turnTo(board.screwTurns + 1);
    const { tripVolts } = board.thresholds();
    board.turnTo(board.screwTurns - board.truth.trimmer.backlashTurns * 0.95);
    expect(board.thresholds().tripVolts).toBe(tripVolts);
    board.turnTo(board.screwTurns - 0.01);
    expect(board.thresholds().tripVolts).not.toBe(tripVolts);
  });
});
