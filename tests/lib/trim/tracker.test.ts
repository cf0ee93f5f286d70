import { describe, expect, it } from 'vitest';
import type { OutputState } from '../../../lib/search/types';
import { beginTracker, track, trackedRelease, type Tracker, type TrackerModel } from '../../../lib/trim/tracker';
import { seededRandom } from '../../figures/random';

const model: TrackerModel = {
  briskVoltsPerSecond: 0.35,
  askedSign: 1,
  noiseVolts: 0.001,
  overshoot: 0.07,
  hysteresisVolts: 0.45,
};

/** Looks every 50 ms at a trip point that moves as `tripAt` says, each where the output flips as likely as not. */
function follow(tripAt: (seconds: number) => number, seconds: number, seed: number) {
  const random = seededRandom(seed);
  let tracker: Tracker = beginTracker(tripAt(0), 0.002, 0.003, 0);
  let output: OutputState = 'on';
  let supply = tripAt(0) + 0.03;
  const errors: { at: number; volts: number; movingShare: number }[] = [];
  for (let at = 0.05; at <= seconds; at += 0.05) {
    const before = output;
    const volts = output === 'on' ? tracker.trip.volts : trackedRelease(tracker, model.hysteresisVolts);
    const peak = volts + 0.05 * (volts - supply);
    const trip = tripAt(at) + random.normal(0, model.noiseVolts);
    if (before === 'on' && Math.min(volts, peak) <= trip) output = 'off';
    if (before === 'off' && Math.max(volts, peak) >= trip + model.hysteresisVolts) output = 'on';
    tracker = track(tracker, model, { fromVolts: supply, volts, before, after: output, atMs: at * 1000 });
    supply = volts;
    errors.push({ at, volts: tracker.trip.volts - tripAt(at), movingShare: tracker.trip.movingShare });
  }
  return { errors, tracker };
}

const rms = (values: number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

describe('the tracker', () => {
  it('stays within 5 mV RMS of a resting point', () => {
    const errors = [1, 2, 3, 4].flatMap((seed) => follow(() => 9.5, 5, seed).errors);
    // Source: the trim study, 2.3 mV RMS at rest.
    expect(rms(errors.filter(({ at }) => at > 1).map(({ volts }) => volts))).toBeLessThan(0.005);
  });

  it('follows a brisk turn, 0.35 V a second, and sees that it stopped', () => {
    const turn = (seconds: number) => 9 + 0.35 * Math.min(2.5, Math.max(0, seconds - 1));
    const runs = [5, 6, 7, 8, 12, 13, 14, 15].map((seed) => follow(turn, 5.5, seed).errors);
    const moving = runs.flatMap((errors) => errors.filter(({ at }) => at > 1.6 && at < 3.5));
    expect(rms(moving.map(({ volts }) => volts))).toBeLessThan(0.03);
    const last = runs.map((errors) => errors.at(-1)!);
    expect(rms(last.map(({ volts }) => volts))).toBeLessThan(0.01);
    for (const { movingShare } of last) expect(movingShare).toBeLessThan(0.3);
  });

  it('is found again when the point went against the way asked', () => {
    const back = (seconds: number) => 9.5 - 0.35 * Math.min(1.5, Math.max(0, seconds - 1));
    for (const seed of [9, 10, 11]) expect(Math.abs(follow(back, 5, seed).errors.at(-1)!.volts)).toBeLessThan(0.01);
  });

  it('repeats itself exactly, and leaves the tracker before untouched', () => {
    const first = beginTracker(9.5, 0.002, 0.003, 0);
    const copy = structuredClone(first);
    const look = { fromVolts: 9.53, volts: 9.5, before: 'on', after: 'off', atMs: 50 } as const;
    expect(track(first, model, look)).toEqual(track(copy, model, look));
    expect(first).toEqual(copy);
  });
});
