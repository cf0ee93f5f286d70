import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { StepResponse, usualStep } from '@/stations/simulation/step-response';

function stepped(from: number, to: number, character = usualStep): StepResponse {
  const step = new StepResponse(character);
  step.restAt(from, 0);
  step.aim(to, 0);
  return step;
}

describe('StepResponse', () => {
  it('peaks 5 % beyond the step at 30 ms and is 2.4 % beyond it at 40 ms, as the study’s plant', () => {
    const step = stepped(0, 1);
    expect(step.at(30) - 1).toBeCloseTo(0.05, 6);
    expect(step.at(40) - 1).toBeCloseTo(0.024, 3);
    expect(step.at(29.9)).toBeLessThan(step.at(30));
    expect(step.at(30.1)).toBeLessThan(step.at(30));
    expect(Math.abs(step.at(150) - 1)).toBeLessThan(1e-5);
  });

  it('scales with the step and does not care which way', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -5, max: 5, noNaN: true }),
        fc.double({ min: 0, max: 200, noNaN: true }),
        (size, ms) => {
          expect(stepped(2, 2 + size).at(ms) - 2).toBeCloseTo(size * stepped(0, 1).at(ms), 9);
        },
      ),
    );
  });

  it('turns round exactly where a fine search finds the extremes', () => {
    const step = stepped(5, 9);
    step.aim(6, 13);
    const points = step.turningPoints(13, 150);
    expect(points.length).toBeGreaterThan(2);
    for (const ms of points) {
      const rises = step.at(ms - 0.05) < step.at(ms);
      expect(step.at(ms + 0.05) < step.at(ms)).toBe(rises);
    }
  });

  it('goes on smoothly when aimed anew in mid-swing', () => {
    const step = stepped(0, 10);
    const [value, slope] = [step.at(12), step.at(12.001) - step.at(12)];
    step.aim(3, 12);
    expect(step.at(12)).toBeCloseTo(value, 12);
    expect(step.at(12.001) - step.at(12)).toBeCloseTo(slope, 5);
  });

  it('has the mean of its samples over a window', () => {
    const step = stepped(0, 1);
    let sum = 0;
    for (let i = 0; i < 20_000; i++) sum += step.at(25 + (i + 0.5) / 1000);
    expect(step.meanBetween(25, 45)).toBeCloseTo(sum / 20_000, 3);
  });
});
