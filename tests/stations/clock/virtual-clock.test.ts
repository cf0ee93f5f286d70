import { PassThrough } from 'node:stream';
import { describe, expect, it } from 'vitest';
import { VirtualClock } from '@/stations/clock/virtual-clock';

describe('VirtualClock', () => {
  it('fires timers by time, and those of one instant in the order they were set', async () => {
    const clock = new VirtualClock();
    const heard: string[] = [];
    clock.after(20, () => heard.push('late'));
    clock.after(10, () => heard.push('first'));
    clock.after(10, () => heard.push('second'));
    await clock.sleep(30);
    expect(heard).toEqual(['first', 'second', 'late']);
    expect(clock.now()).toBe(30);
  });

  it('does not advance while streams still carry bytes', async () => {
    const clock = new VirtualClock();
    const pipe = new PassThrough();
    const far = pipe.pipe(new PassThrough()).pipe(new PassThrough());
    let arrivedAt = NaN;
    far.once('data', () => {
      arrivedAt = clock.now();
    });
    clock.after(5, () => pipe.write('x'));
    await clock.sleep(6);
    expect(arrivedAt).toBe(5);
  });

  it('stands still while real work is awaited', async () => {
    const clock = new VirtualClock();
    const before = clock.now();
    const work = clock.standStill(new Promise((resolve) => setTimeout(() => resolve(clock.now()), 20)));
    const sleep = clock.sleep(1000);
    expect(await work).toBe(before);
    await sleep;
    expect(clock.now()).toBe(1000);
  });

  it('never fires a cancelled timer and rejects an aborted sleep with its reason', async () => {
    const clock = new VirtualClock();
    let fired = false;
    const cancel = clock.after(5, () => {
      fired = true;
    });
    const abort = new AbortController();
    const sleep = clock.sleep(50, abort.signal);
    clock.after(10, () => abort.abort(new Error('stop')));
    cancel();
    await expect(sleep).rejects.toThrow('stop');
    expect(fired).toBe(false);
    expect(clock.now()).toBe(10);
  });

  it('passes an hour in well under a second', async () => {
    const clock = new VirtualClock();
    const startedAt = performance.now();
    for (let minute = 0; minute < 60; minute++) await clock.sleep(60_000);
    expect(clock.now()).toBe(3_600_000);
    expect(clock.wallTimeMs()).toBe(Date.UTC(2026, 0, 5, 7));
    expect(performance.now() - startedAt).toBeLessThan(1000);
  });
});
