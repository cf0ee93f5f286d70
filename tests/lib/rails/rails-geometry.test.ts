import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dotPosition, heightOf, railsBox, scaleTicks } from '@/lib/rails/rails-geometry';
import { placeInside } from '@/lib/rails/inside-blocks';
import { stackBlocks, type Block } from '@/lib/rails/stack-blocks';
import type { RailFlag, RailsView } from '@/lib/contracts/bench-view';

const rails: RailsView = {
  scaleMinVolts: 9.5,
  scaleMaxVolts: 13.5,
  tripLimits: { min: 10.7, max: 10.9 },
  releaseLimits: { min: 12.1, max: 12.5 },
  guardVolts: null,
  targetVolts: 10.8,
  flags: [],
  travelled: { fallingOnToVolts: null, fallingOffToVolts: null, risingOffToVolts: null, risingOn: false },
  hysteresisVolts: null,
};

describe('the scale of the rails', () => {
  it('puts higher volts higher, and the ends at the ends of the straight part', () => {
    expect(heightOf(rails, 13.5)).toBe(railsBox.topY);
    expect(heightOf(rails, 9.5)).toBe(railsBox.bottomY);
    fc.assert(
      fc.property(fc.double({ min: 9.5, max: 13.4, noNaN: true }), (volts) => {
        expect(heightOf(rails, volts)).toBeGreaterThan(heightOf(rails, volts + 0.05));
      }),
    );
  });

  it('has between 10 and 46 ticks on every scale, all within it, and at least two numbered', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), fc.integer({ min: 2, max: 60 }), (low, halves) => {
        const min = low / 2;
        const max = min + halves / 2;
        const ticks = scaleTicks(min, max);
        expect(ticks.length).toBeGreaterThanOrEqual(10);
        expect(ticks.length).toBeLessThanOrEqual(46);
        expect(ticks.every(({ volts }) => volts >= min - 1e-6 && volts <= max + 1e-6)).toBe(true);
        expect(ticks.filter(({ rank }) => rank === 'major').length).toBeGreaterThanOrEqual(2);
      }),
    );
  });
});

describe('the dot of the live supply', () => {
  it('runs down the trip rail and up the release rail', () => {
    expect(dotPosition(rails, { volts: 11, output: 'on', rail: 'falling' })?.x).toBe(railsBox.tripX);
    expect(dotPosition(rails, { volts: 11, output: 'off', rail: 'rising' })?.x).toBe(railsBox.releaseX);
  });

  it('waits on the bend beyond either end', () => {
    expect(dotPosition(rails, { volts: 14, output: 'on', rail: 'falling' })?.y).toBeLessThan(railsBox.topY);
    expect(dotPosition(rails, { volts: 5, output: 'off', rail: 'falling' })?.y).toBeGreaterThan(railsBox.bottomY);
  });

  it('is not drawn while the supply is off', () => {
    expect(dotPosition(rails, { volts: 0.2, output: null, rail: 'off' })).toBeNull();
  });
});

describe('what is written between the rails', () => {
  const blocks = fc.array(
    fc.record({
      wantedY: fc.integer({ min: 180, max: 640 }),
      above: fc.integer({ min: 10, max: 40 }),
      below: fc.integer({ min: 10, max: 40 }),
    }),
    { minLength: 1, maxLength: 5 },
  );
  const keyed = (given: Omit<Block, 'key'>[]) => given.map((block, i) => ({ ...block, key: `${i}` }));

  it('never overlaps and stays in its room', () => {
    fc.assert(
      fc.property(blocks, (given) => {
        const all = keyed(given);
        const centres = stackBlocks(all, 180, 650);
        const spans = all
          .map(({ key, above, below }) => [centres.get(key)! - above, centres.get(key)! + below] as const)
          .sort((a, b) => a[0] - b[0]);
        spans.forEach(([top, bottom], i) => {
          expect(top).toBeGreaterThanOrEqual(180 - 1e-6);
          expect(bottom).toBeLessThanOrEqual(650 + 1e-6);
          if (i > 0) expect(top).toBeGreaterThanOrEqual(spans[i - 1]![1] - 1e-6);
        });
      }),
    );
  });

  it('leaves alone what has room', () => {
    const centres = stackBlocks(
      keyed([
        { wantedY: 250, above: 20, below: 20 },
        { wantedY: 500, above: 20, below: 20 },
      ]),
      180,
      650,
    );
    expect([...centres.values()].sort()).toEqual([250, 500]);
  });

  it('keeps the order of the volts', () => {
    fc.assert(
      fc.property(blocks, (given) => {
        const all = keyed(given);
        const centres = stackBlocks(all, 180, 650);
        const sorted = [...all].sort((a, b) => a.wantedY - b.wantedY);
        const ys = sorted.map(({ key }) => centres.get(key)!);
        expect(ys).toEqual([...ys].sort((a, b) => a - b));
      }),
    );
  });

  it('points every flag at its own value, wherever its box is pushed', () => {
    const flag = (side: RailFlag['side'], volts: number): RailFlag => ({ side, volts, hollow: false, note: null });
    const crowded = { ...rails, flags: [flag('trip', 10.81), flag('release', 10.95)], hysteresisVolts: 0.14 };
    const { flags } = placeInside(crowded, {
      heldVolts: null,
      shiftVolts: null,
      stoppedAtVolts: null,
      boardAbsent: false,
    });
    expect(flags.map(({ pointY }) => pointY)).toEqual([heightOf(rails, 10.81), heightOf(rails, 10.95)]);
    expect(Math.abs(flags[0]!.boxY - flags[1]!.boxY)).toBeGreaterThanOrEqual(58);
  });
});
