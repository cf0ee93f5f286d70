import { describe, expect, it } from 'vitest';
import { RealClock } from '@/stations/clock/real-clock';
import { ScaledClock } from '@/stations/clock/scaled-clock';

describe.each([
  ['RealClock', new RealClock(), 1],
  ['ScaledClock', new ScaledClock(20), 20],
] as const)('%s', (_name, clock, factor) => {
  it('sleeps at least as long as asked on its own scale', async () => {
    const [real, own] = [performance.now(), clock.now()];
    await clock.sleep(40 * factor);
    expect(performance.now() - real).toBeGreaterThan(38);
    expect(clock.now() - own).toBeGreaterThanOrEqual(38 * factor);
    expect(performance.now() - real).toBeLessThan(1000);
  });

  it('rejects an aborted sleep with the reason, before and during it', async () => {
    await expect(clock.sleep(1000, AbortSignal.abort(new Error('early')))).rejects.toThrow('early');
    const abort = new AbortController();
    const sleep = clock.sleep(100_000, abort.signal);
    abort.abort(new Error('meanwhile'));
    await expect(sleep).rejects.toThrow('meanwhile');
  });
});

describe('ScaledClock', () => {
  it('keeps calendar time', () => {
    expect(Math.abs(new ScaledClock(100).wallTimeMs() - Date.now())).toBeLessThan(50);
  });

  it('serves a near timer at once though a far one was set before', async () => {
    const clock = new ScaledClock(1);
    const far = new AbortController();
    const sleeping = clock.sleep(60_000, far.signal).catch(() => undefined);
    await new Promise((resolve) => setTimeout(resolve, 5));
    const before = performance.now();
    await clock.sleep(2);
    expect(performance.now() - before).toBeLessThan(18);
    far.abort();
    await sleeping;
  });

  it('fires timers in order after a stall of the machine, none early', async () => {
    const clock = new ScaledClock(20);
    const heard: number[] = [];
    const start = clock.now();
    for (const ms of [400, 100, 250]) clock.after(ms, () => heard.push(Math.round(clock.now() - start)));
    const until = performance.now() + 80;
    while (performance.now() < until);
    await clock.sleep(600);
    expect(heard).toEqual([100, 250, 400]);
  });

  it('refuses a factor that is not above zero', () => {
    expect(() => new ScaledClock(0)).toThrow(RangeError);
  });
});

describe('ScaledClock on a busy machine', () => {
  it('lets an answer that comes before the deadline be heard before it, however long the machine was away', async () => {
    const clock = new ScaledClock(20);
    const heard: string[] = [];
    clock.after(200, () => heard.push('deadline'));
    clock.after(20, () => void Promise.resolve().then(() => clock.after(20, () => heard.push('answer'))));
    const until = performance.now() + 100;
    while (performance.now() < until);
    await clock.sleep(400);
    expect(heard).toEqual(['answer', 'deadline']);
  });

  it('does not count what the machine spent elsewhere', () => {
    const clock = new ScaledClock(20);
    const before = clock.now();
    const until = performance.now() + 300;
    while (performance.now() < until);
    expect(clock.now() - before).toBeLessThan(300 * 20);
  });
});
