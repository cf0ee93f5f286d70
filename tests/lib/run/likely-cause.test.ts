import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import { causeOfHysteresis, causeOfReference } from '@/lib/run/likely-cause';
import { e24Near } from '@/lib/circuit/preferred-values';

const { design } = cb1210;
const supplyVolts = 10.8;
const referenceWith = (nominalVolts: number) => {
  const root = referenceAt({ ...design.reference, nominalVolts }, supplyVolts);
  return root.kind === 'found' ? root.x : NaN;
};
const pointsWith = (feedbackOhms: number) => {
  const points = softKneeThresholds({ ...design, feedbackOhms }, 0.35);
  if (points.kind !== 'found') throw new Error('no points');
  return points;
};

describe('reference', () => {
  it.each([3.9, 4.3, 4.7, 5.6, 6.2, 6.8])('of a %d V zener is likely the wrong zener', (nominalVolts) => {
    expect(causeOfReference(referenceWith(nominalVolts), supplyVolts, design)).toBe('wrong-zener');
  });
  it('near the supply is likely an open or reversed zener', () => {
    expect(causeOfReference(10.79, supplyVolts, design)).toBe('zener-open-or-reversed');
  });
  it('near 0.7 V is likely a reversed zener', () => {
    expect(causeOfReference(0.68, supplyVolts, design)).toBe('zener-reversed');
  });
  it('a little off its own value says nothing', () => {
    expect(causeOfReference(referenceWith(5.1) - 0.1, supplyVolts, design)).toBeNull();
  });
});

describe('hysteresis', () => {
  it.each([10, 2.2, 1.1, 0.9, 0.45, 0.1])(
    'of a feedback resistor %d times too large is the wrong resistor',
    (ratio) => {
      const points = pointsWith(design.feedbackOhms * ratio);
      expect(causeOfHysteresis(points, null, design)).toBe('wrong-feedback-resistor');
      const read = { volts: points.tripReferenceVolts, supplyVolts: points.tripVolts };
      expect(causeOfHysteresis(points, read, design)).toBe('wrong-feedback-resistor');
    },
  );
  it('next to nothing is likely no feedback at all', () => {
    expect(causeOfHysteresis(pointsWith(design.feedbackOhms * 100), null, design)).toBe('feedback-open');
  });
  it('of the right resistor on a zener at its tolerance says nothing, once the reference was read', () => {
    const reference = { ...design.reference, nominalVolts: 5.25 };
    const points = softKneeThresholds({ ...design, reference }, 0.35);
    if (points.kind !== 'found') throw new Error('no points');
    const read = { volts: points.tripReferenceVolts, supplyVolts: points.tripVolts };
    expect(causeOfHysteresis(points, read, design)).toBeNull();
  });
  it('of the right resistor says nothing', () => {
    expect(causeOfHysteresis(pointsWith(design.feedbackOhms), null, design)).toBeNull();
  });
});

describe('E24', () => {
  it.each([
    [4.9, 5.1],
    [4.88, 4.7],
    [97, 100],
    [0.0103, 0.01],
    [9.6e4, 1e5],
    [8.9, 9.1],
  ])('nearest to %d is %d', (value, expected) => {
    expect(e24Near(value)).toBeCloseTo(expected, 9);
  });
});
