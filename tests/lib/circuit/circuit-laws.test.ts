import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { BoardDesign } from '@/lib/circuit/board-design';
import { dividerFraction, wiperOfFraction } from '@/lib/circuit/divider';
import { inferBoard, inferSoftKneeBoard, wiperForRelease, wiperForTrip } from '@/lib/circuit/inverse';
import { linearZenerThresholds } from '@/lib/circuit/linear-zener';
import { referenceAt, softKneeThresholds, supplyForReference } from '@/lib/circuit/soft-knee';
import { thresholdsAt, thresholdSlopes } from '@/lib/circuit/thresholds';
import { turnsAt, turnsBetween, wiperAt } from '@/lib/circuit/trimmer';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** Boards as they are built: hysteresis a small part of the trip point, ends padded or not. */
const designs: fc.Arbitrary<BoardDesign> = fc
  .record({
    trimmerOhms: between(500, 100_000),
    supplyEnd: between(0, 3),
    groundEnd: between(0, 3),
    feedback: between(4, 40),
    outputDropVolts: between(0.5, 1.5),
    outputLowVolts: between(0, 0.1),
    nominalVolts: between(3.3, 9.1),
    kneeVolts: between(0.05, 0.3),
    feedOhms: between(1000, 10_000),
  })
  .map(({ trimmerOhms, supplyEnd, groundEnd, feedback, nominalVolts, kneeVolts, feedOhms, ...output }) => ({
    ...output,
    trimmerOhms,
    supplyEndOhms: supplyEnd * trimmerOhms,
    groundEndOhms: groundEnd * trimmerOhms,
    feedbackOhms: feedback * trimmerOhms * (1 + supplyEnd + groundEnd),
    reference: { nominalVolts, kneeVolts, feedOhms, ratedAmps: 0.005 },
    loadOhms: 1000,
    quiescentAmps: 0.001,
    reservoirFarads: 0,
  }));
const wipers = between(0.1, 0.9);

describe('trip and release', () => {
  it('depend on ratios of resistances only', () => {
    fc.assert(
      fc.property(designs, wipers, between(0.1, 10), (design, wiper, scale) => {
        const scaled = {
          ...design,
          trimmerOhms: design.trimmerOhms * scale,
          supplyEndOhms: design.supplyEndOhms * scale,
          groundEndOhms: design.groundEndOhms * scale,
          feedbackOhms: design.feedbackOhms * scale,
        };
        const [a, b] = [thresholdsAt(design, wiper, 5), thresholdsAt(scaled, wiper, 5)];
        expect(b.tripVolts).toBeCloseTo(a.tripVolts, 8);
        expect(b.releaseVolts).toBeCloseTo(a.releaseVolts, 8);
      }),
    );
  });

  it('both fall as the wiper nears the supply, as fast as the slopes say', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        const d = 1e-6;
        const slopes = thresholdSlopes(design, wiper, 5);
        const [low, high] = [thresholdsAt(design, wiper - d, 5), thresholdsAt(design, wiper + d, 5)];
        expect(slopes.tripVoltsPerTravel).toBeLessThan(0);
        expect((high.tripVolts - low.tripVolts) / (2 * d) / slopes.tripVoltsPerTravel).toBeCloseTo(1, 5);
        expect((high.releaseVolts - low.releaseVolts) / (2 * d) / slopes.releaseVoltsPerTravel).toBeCloseTo(1, 5);
      }),
    );
  });

  it('lie where the comparator’s inputs are equal, with the soft knee too', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        const points = softKneeThresholds(design, wiper);
        if (points.kind !== 'found') return;
        expect(supplyForReference(design.reference, points.tripReferenceVolts)).toBeCloseTo(points.tripVolts, 6);
        expect(thresholdsAt(design, wiper, points.tripReferenceVolts).tripVolts).toBeCloseTo(points.tripVolts, 5);
        expect(thresholdsAt(design, wiper, points.releaseReferenceVolts).releaseVolts).toBeCloseTo(
          points.releaseVolts,
          5,
        );
        const node = referenceAt(design.reference, points.tripVolts);
        expect(node.kind === 'found' && node.x).toBeCloseTo(points.tripReferenceVolts, 6);
      }),
    );
  });

  it('are those of a fixed reference when the zener has no slope resistance', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        const fixed = thresholdsAt(design, wiper, 5);
        const linear = linearZenerThresholds(design, wiper, { kneeVolts: 5, slopeOhms: 0 });
        expect(linear.tripVolts).toBeCloseTo(fixed.tripVolts, 9);
        expect(linear.releaseVolts).toBeCloseTo(fixed.releaseVolts, 9);
      }),
    );
  });
});

describe('inverse', () => {
  it('gives back the wiper and feedback that made the points', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        const parts = inferBoard(design, thresholdsAt(design, wiper, 5), 5);
        if (parts.kind !== 'found') throw new Error(parts.kind);
        expect(parts.wiper).toBeCloseTo(wiper, 6);
        expect(parts.feedbackOhms / design.feedbackOhms).toBeCloseTo(1, 6);
      }),
    );
  });

  it('does so with a reference that sags', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        const points = softKneeThresholds(design, wiper);
        if (points.kind !== 'found') return;
        const parts = inferSoftKneeBoard(design, points);
        if (parts.kind !== 'found') throw new Error(parts.kind);
        expect(parts.wiper).toBeCloseTo(wiper, 4);
        expect(parts.feedbackOhms / design.feedbackOhms).toBeCloseTo(1, 4);
      }),
    );
  });

  it('says impossible for points that no parts can have', () => {
    const design = fc.sample(designs, { numRuns: 1, seed: 1 })[0]!;
    expect(inferBoard(design, { tripVolts: 9, releaseVolts: 8.9 }, 5)).toEqual({ kind: 'impossible' });
    expect(inferBoard(design, { tripVolts: 4, releaseVolts: 4.1 }, 5)).toEqual({ kind: 'impossible' });
  });

  it('finds the wiper for a wanted trip and for a wanted release', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        const { tripVolts, releaseVolts } = thresholdsAt(design, wiper, 5);
        expect(wiperForTrip(design, tripVolts, 5)).toBeCloseTo(wiper, 6);
        expect(wiperForRelease(design, releaseVolts, 5)).toBeCloseTo(wiper, 6);
      }),
    );
  });
});

describe('soft knee', () => {
  it('returns notBracketed without a supply, and where the reference never regulates', () => {
    const design = fc.sample(designs, { numRuns: 1, seed: 2 })[0]!;
    expect(referenceAt(design.reference, 0)).toEqual({ kind: 'notBracketed' });
    const starved = { ...design, reference: { ...design.reference, kneeVolts: 3, feedOhms: 1e6 } };
    expect(softKneeThresholds(starved, 0.9).kind).toBe('notBracketed');
  });

  it('keeps the reference below the supply and rising with it', () => {
    fc.assert(
      fc.property(designs, between(0.01, 40), between(0.001, 5), ({ reference }, volts, more) => {
        const [low, high] = [referenceAt(reference, volts), referenceAt(reference, volts + more)];
        if (low.kind !== 'found' || high.kind !== 'found') throw new Error('not found');
        expect(low.x).toBeLessThanOrEqual(volts + 1e-9);
        expect(high.x).toBeGreaterThan(low.x - 1e-9);
      }),
    );
  });
});

describe('divider and trimmer', () => {
  it('turn fractions of the whole into fractions of the trimmer and back', () => {
    fc.assert(
      fc.property(designs, wipers, (design, wiper) => {
        expect(wiperOfFraction(design, dividerFraction(design, wiper))).toBeCloseTo(wiper, 9);
      }),
    );
  });

  it('turn wiper fractions into turns and back; clockwise raises the trip point where it says so', () => {
    fc.assert(
      fc.property(
        designs,
        between(0.2, 0.8),
        fc.constantFrom('raises', 'lowers'),
        between(0.5, 30),
        (design, wiper, clockwise, turns) => {
          const travel = { turns, clockwise, backlashTurns: 0 } as const;
          expect(wiperAt(travel, turnsAt(travel, wiper))).toBeCloseTo(wiper, 9);
          const further = wiperAt(travel, turnsAt(travel, wiper) + turns * 0.01);
          expect(turnsBetween(travel, wiper, further)).toBeCloseTo(turns * 0.01, 9);
          const change = thresholdsAt(design, further, 5).tripVolts - thresholdsAt(design, wiper, 5).tripVolts;
          expect(Math.sign(change)).toBe(clockwise === 'raises' ? 1 : -1);
        },
      ),
    );
  });
});
