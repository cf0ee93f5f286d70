import { describe, expect, it } from 'vitest';
import { faultStands, soundBetween, tickIntervalMs } from '@/components/bench/sound/sounds-between';
import { tones } from '@/components/bench/sound/tones';
import { galleryViews } from '@/tests/browser/gallery/views';

const view = (name: string) => galleryViews[name]!.view;
const nearing = (volts: number) => {
  const shown = structuredClone(view('01-prompted-clockwise'));
  if (shown.run?.screen.kind === 'trim') shown.run.screen.trim.liveTripVolts = volts;
  return shown;
};

describe('the sounds of the bench', () => {
  it('tells pass and reject when they come, once', () => {
    expect(soundBetween(view('measuring'), view('03-pass'))).toBe('pass');
    expect(soundBetween(view('03-pass'), { ...view('03-pass'), revision: 2 })).toBeNull();
    expect(soundBetween(view('measuring-verify'), view('04-reject'))).toBe('reject');
  });

  it('is silent after a reload but for a fault that still stands', () => {
    expect(soundBetween(null, view('03-pass'))).toBeNull();
    expect(soundBetween(null, view('05-fault'))).toBe('fault');
  });

  it('sounds a fault until touched, and not for a stop with the supply confirmed off', () => {
    expect(faultStands(view('05-fault'))).toBe(true);
    expect(faultStands(view('stopped'))).toBe(false);
    expect(faultStands(view('fault-not-confirmed'))).toBe(true);
  });

  it('ticks faster near the target, steadily inside the tolerance, and not when nobody turns', () => {
    expect(tickIntervalMs(nearing(10.5))).toBeNull();
    expect(tickIntervalMs(nearing(10.6))!).toBeGreaterThan(tickIntervalMs(nearing(10.7))!);
    expect(tickIntervalMs(nearing(10.79))).toBe(0);
    expect(tickIntervalMs(view('a1-first-beep'))).toBeNull();
  });

  it('beeps 220 ms at 1.8 kHz', () => {
    expect(tones.beep).toEqual([{ atMs: 0, lengthMs: 220, hertz: 1800 }]);
  });

  it('tells its sounds apart by rhythm alone', () => {
    const rhythms = (['scan-accepted', 'scan-refused', 'beep', 'pass', 'reject', 'fault'] as const).map((tone) =>
      tones[tone].map(({ atMs, lengthMs }) => `${atMs}+${lengthMs}`).join(' '),
    );
    expect(new Set(rhythms).size).toBe(rhythms.length);
  });
});
