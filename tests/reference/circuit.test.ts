import { describe, expect, it } from 'vitest';
import type { BoardDesign } from '@/lib/circuit/board-design';
import { wiperConductances } from '@/lib/circuit/divider';
import { inferBoard, inferReference, wiperForTrip } from '@/lib/circuit/inverse';
import { linearZenerThresholds } from '@/lib/circuit/linear-zener';
import { pointsOnRamp } from '@/lib/circuit/ramp-lag';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import { thresholdsAt, thresholdSlopes } from '@/lib/circuit/thresholds';
import { turnsBetween } from '@/lib/circuit/trimmer';
import reference from './circuit.json';

interface Parts {
  trimmerOhms: number;
  feedbackOhms: number;
  outputDropVolts: number;
  outputLowVolts?: number;
}

function design(parts: Parts, zener: Partial<BoardDesign['reference']> = {}): BoardDesign {
  return {
    supplyEndOhms: 0,
    groundEndOhms: 0,
    outputLowVolts: 0.01,
    loadOhms: 1000,
    quiescentAmps: 0.001,
    reservoirFarads: 0,
    reference: { nominalVolts: 5.1, kneeVolts: 0.2, ratedAmps: 0.005, feedOhms: 10_000, ...zener },
    ...parts,
  };
}

/** ngspice resolves its own switching instant to this; the closed form has no such error. */
const ngspiceStepVolts = 50e-6;

describe('closed form with an ideal zener', () => {
  it.each(reference.idealZener.cases)('$id: points and slopes', (c) => {
    const board = design(c);
    const points = thresholdsAt(board, c.wiper, c.referenceVolts);
    expect(points.tripVolts).toBeCloseTo(c.tripVolts, 6);
    expect(points.releaseVolts).toBeCloseTo(c.releaseVolts, 6);
    expect(Math.abs(points.tripVolts - c.tripNgspiceVolts)).toBeLessThan(ngspiceStepVolts);
    expect(Math.abs(points.releaseVolts - c.releaseNgspiceVolts)).toBeLessThan(ngspiceStepVolts);
    const slopes = thresholdSlopes(board, c.wiper, c.referenceVolts);
    expect(slopes.tripVoltsPerTravel).toBeCloseTo(c.tripVoltsPerTravel, 5);
    expect(slopes.releaseVoltsPerTravel).toBeCloseTo(c.releaseVoltsPerTravel, 5);
  });

  it.each(reference.idealZener.cases)('$id: the same with part of the trimmer as end resistors', (c) => {
    const padded: BoardDesign = {
      ...design(c),
      trimmerOhms: c.trimmerOhms * 0.12,
      supplyEndOhms: (1 - c.wiper) * c.trimmerOhms * 0.9,
    };
    padded.groundEndOhms = c.trimmerOhms - padded.trimmerOhms - padded.supplyEndOhms;
    const wiper = (c.wiper * c.trimmerOhms - padded.groundEndOhms) / padded.trimmerOhms;
    expect(thresholdsAt(padded, wiper, c.referenceVolts).tripVolts).toBeCloseTo(c.tripVolts, 6);
    expect(thresholdSlopes(padded, wiper, c.referenceVolts).tripVoltsPerTravel).toBeCloseTo(
      c.tripVoltsPerTravel * 0.12,
      5,
    );
    expect(wiperForTrip(padded, c.tripVolts, c.referenceVolts)).toBeCloseTo(wiper, 5);
  });
});

describe('linear zener', () => {
  it.each(reference.linearZener.cases)('$id', (c) => {
    const points = linearZenerThresholds(design(c, { feedOhms: c.feedOhms }), c.wiper, c);
    expect(points.tripVolts).toBeCloseTo(c.tripVolts, 6);
    expect(points.releaseVolts).toBeCloseTo(c.releaseVolts, 6);
    expect(Math.abs(points.tripVolts - c.tripNgspiceVolts)).toBeLessThan(ngspiceStepVolts);
    expect(Math.abs(points.releaseVolts - c.releaseNgspiceVolts)).toBeLessThan(ngspiceStepVolts);
  });
});

describe('soft-knee zener', () => {
  /** Finite gain of the macro moves the trip by (VOH/A) S/(G1+Gf), 0.11 mV here; the release by nothing. */
  const gainVolts = 0.12e-3;

  it.each(reference.softKnee.cases)('$id: points and reference', (c) => {
    const board = design(c, c);
    const points = softKneeThresholds(board, c.wiper);
    if (points.kind !== 'found') throw new Error(points.kind);
    expect(points.tripVolts).toBeCloseTo(c.tripVolts, 6);
    expect(points.releaseVolts).toBeCloseTo(c.releaseVolts, 6);
    expect(Math.abs(c.tripNgspiceVolts - points.tripVolts)).toBeLessThan(gainVolts);
    expect(Math.abs(c.releaseNgspiceVolts - points.releaseVolts)).toBeLessThan(gainVolts);
    expect(points.tripReferenceVolts).toBeCloseTo(c.tripReferenceVolts, 4);
    expect(points.releaseReferenceVolts).toBeCloseTo(c.releaseReferenceVolts, 4);
    const node = referenceAt(board.reference, c.tripNgspiceVolts);
    expect(node.kind === 'found' && node.x).toBeCloseTo(c.tripReferenceVolts, 4);
  });
});

describe('observed pairs of trip and release', () => {
  it.each(reference.observed.cases)('Rf/Rp $feedbackOhms/$trimmerOhms, knee $kneeVolts, wiper $wiper', (c) => {
    const board = design({ ...c, outputDropVolts: 1.3 }, { kneeVolts: c.kneeVolts ?? 0.2 });
    const points =
      c.kneeVolts === null
        ? { kind: 'found' as const, ...thresholdsAt(board, c.wiper, 5.1) }
        : softKneeThresholds(board, c.wiper);
    if (points.kind !== 'found') throw new Error(points.kind);
    // The wiper is given to six decimals, worth 20 microvolts.
    expect(Math.abs(points.tripVolts - c.tripVolts)).toBeLessThan(2e-5);
    expect(Math.abs(points.releaseVolts - c.releaseVolts)).toBeLessThan(2e-5);
    expect(Math.abs(points.tripVolts - c.tripNgspiceVolts)).toBeLessThan(2.5e-4);
    expect(Math.abs(points.releaseVolts - c.releaseNgspiceVolts)).toBeLessThan(2.5e-4);
  });

  it.each(reference.observedRatio.cases)('knee $kneeVolts, drop $outputDropVolts: wiper for 9 and 10 V', (c) => {
    const board = design(
      { trimmerOhms: 10_000, feedbackOhms: 10_000 * c.feedbackOverTrimmer, outputDropVolts: c.outputDropVolts },
      { kneeVolts: c.kneeVolts ?? 0.2 },
    );
    for (const [volts, wiper, releaseVolts] of [
      [9, c.wiperAt9, c.releaseAt9Volts],
      [10, c.wiperAt10, c.releaseAt10Volts],
    ] as const) {
      const node = referenceAt(board.reference, volts);
      const nodeVolts = c.kneeVolts === null ? 5.1 : node.kind === 'found' ? node.x : NaN;
      expect(wiperForTrip(board, volts, nodeVolts)).toBeCloseTo(wiper, 5);
      const points = softKneeThresholds(board, wiper);
      const found = c.kneeVolts === null ? thresholdsAt(board, wiper, 5.1) : points;
      if (!('releaseVolts' in found)) throw new Error('no points');
      expect(Math.abs(found.releaseVolts - releaseVolts)).toBeLessThan(1e-4);
    }
  });
});

describe('inverse: parts from two measured points', () => {
  it.each(reference.inverse.cases)('$id: wiper and feedback, with their sensitivities', (c) => {
    const board = design({ ...c, feedbackOhms: 1 });
    const infer = (trip: number, release: number, volts = c.referenceVolts) => {
      const parts = inferBoard(board, { tripVolts: trip, releaseVolts: release }, volts);
      if (parts.kind !== 'found') throw new Error(parts.kind);
      return parts;
    };
    const parts = infer(c.tripVolts, c.releaseVolts);
    expect(parts.wiper).toBeCloseTo(c.wiper, 7);
    expect(parts.feedbackOhms / c.feedbackOhms).toBeCloseTo(1, 7);
    const d = 1e-5;
    const slope = (pick: 'wiper' | 'feedbackOhms', trip: number, release: number, volts: number) =>
      (infer(c.tripVolts + trip, c.releaseVolts + release, c.referenceVolts + volts)[pick] -
        infer(c.tripVolts - trip, c.releaseVolts - release, c.referenceVolts - volts)[pick]) /
      (2 * d);
    expect(slope('wiper', d, 0, 0) / c.wiperPerTripVolt).toBeCloseTo(1, 5);
    expect(slope('wiper', 0, d, 0) / c.wiperPerReleaseVolt).toBeCloseTo(1, 5);
    expect(slope('wiper', 0, 0, d) / c.wiperPerReferenceVolt).toBeCloseTo(1, 5);
    expect(slope('feedbackOhms', d, 0, 0) / c.feedbackPerTripVolt).toBeCloseTo(1, 5);
    expect(slope('feedbackOhms', 0, d, 0) / c.feedbackPerReleaseVolt).toBeCloseTo(1, 5);
  });

  it('finds the reference from the points at two settings, as badly conditioned as it is', () => {
    const c = reference.twoSettings;
    const board = design({ ...c, feedbackOhms: 1 });
    const between = { minVolts: 4.5, maxVolts: 6 };
    const found = inferReference(board, c.first, c.second, between);
    expect(found.kind === 'found' && found.referenceVolts).toBeCloseTo(c.referenceVolts, 6);
    const first = inferBoard(board, c.first, c.referenceVolts);
    expect(first.kind === 'found' && first.wiper).toBeCloseTo(c.wipers[0]!, 6);
    const shifted = { ...c.first, tripVolts: c.first.tripVolts + 0.002 };
    const moved = inferReference(board, shifted, c.second, between);
    expect(moved.kind === 'found' && moved.referenceVolts).toBeCloseTo(
      c.referenceVoltsWhenFirstTripReads2MillivoltsHigh,
      5,
    );
  });
});

describe('how far to turn', () => {
  it.each(reference.trimSteps.cases)('$id: from the measured to the wanted trip point', (c) => {
    const board = design(c);
    const now = wiperForTrip(board, c.measuredVolts, c.referenceVolts);
    const needed = wiperForTrip(board, c.targetVolts, c.referenceVolts);
    expect(now).toBeCloseTo(c.wiperNow, 7);
    expect(needed).toBeCloseTo(c.wiperNeeded, 7);
    const travel = { turns: c.fullTravel, clockwise: 'lowers', backlashTurns: 0 } as const;
    expect(turnsBetween(travel, now, needed)).toBeCloseTo(c.move, 4);
    expect(turnsBetween({ ...travel, clockwise: 'raises' }, now, needed)).toBeCloseTo(-c.move, 4);
    expect(thresholdsAt(board, needed, c.referenceVolts).releaseVolts).toBeCloseTo(c.releaseAtTargetVolts, 6);
  });

  it.each(reference.trimModelGap.cases)('$id: what the ideal-zener step does on a soft-knee board', (c) => {
    const board = design(c, { kneeVolts: c.kneeVolts });
    const wiperAt = (volts: number) => {
      const node = referenceAt(board.reference, volts);
      return node.kind === 'found' ? wiperForTrip(board, volts, node.x) : NaN;
    };
    expect(wiperAt(c.startVolts)).toBeCloseTo(c.trueWiperStart, 6);
    expect(wiperAt(c.targetVolts)).toBeCloseTo(c.trueWiperNeeded, 6);
    const idealStart = wiperForTrip(board, c.startVolts, 5.1);
    expect(idealStart).toBeCloseTo(c.idealWiperStart, 6);
    const idealMove = wiperForTrip(board, c.targetVolts, 5.1) - idealStart;
    expect(idealMove).toBeCloseTo(c.idealMove, 6);
    const after = softKneeThresholds(board, c.trueWiperStart + idealMove);
    expect(after.kind === 'found' && after.tripVolts).toBeCloseTo(c.tripAfterIdealMoveVolts, 4);
  });
});

describe('points found on a ramp', () => {
  it.each(reference.rampLag.cases)('$id at $rampVoltsPerSecond V/s', (c) => {
    const { toSupply, toGround, feedback } = wiperConductances(design(c), c.wiper);
    const boardSeconds = c.wiperFarads / (toSupply + toGround + feedback);
    expect(boardSeconds / c.boardSeconds).toBeCloseTo(1, 5);
    const { actual, sensed } = pointsOnRamp(thresholdsAt(design(c), c.wiper, c.referenceVolts), {
      ...c,
      boardSeconds,
      detectionSeconds: 0,
    });
    expect(actual.tripVolts).toBeCloseTo(c.tripActualVolts, 5);
    expect(actual.releaseVolts).toBeCloseTo(c.releaseActualVolts, 5);
    expect(Math.abs(actual.tripVolts - c.tripActualNgspiceVolts)).toBeLessThan(6e-5);
    expect(Math.abs(actual.releaseVolts - c.releaseActualNgspiceVolts)).toBeLessThan(6e-5);
    expect(Math.abs(sensed.tripVolts - c.tripSensedNgspiceVolts)).toBeLessThan(6e-5);
    expect(Math.abs(sensed.releaseVolts - c.releaseSensedNgspiceVolts)).toBeLessThan(6e-5);
  });
});
