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

  it('refuses a factor that is not above zero', () => {
    expect(() => new ScaledClock(0)).toThrow(RangeError);
  });
});
