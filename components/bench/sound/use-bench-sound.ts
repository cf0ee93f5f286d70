import { useCallback, useEffect, useRef, useState, useSyncExternalStore } from 'react';
import type { BenchView } from '@/lib/contracts/bench-view';
import type { SoundState } from '../bench-context';
import type { FloodStore } from '../beep/flood-store';
import { createBenchSpeaker, type BenchSpeaker } from './bench-speaker';
import { faultStands, soundBetween, tickIntervalMs } from './sounds-between';
import type { Tone } from './tones';

const mutedKey = 'sw-bench-muted';
const mutedEvent = 'sw-bench-muted';
const faultEveryMs = 500;

const readMuted = () => localStorage.getItem(mutedKey) === 'yes';
function watchMuted(listener: () => void) {
  window.addEventListener(mutedEvent, listener);
  return () => window.removeEventListener(mutedEvent, listener);
}

export interface BenchSoundControl {
  sound: SoundState;
  toggle: () => void;
  play: (tone: Tone) => void;
}

/** Sounds of the bench by its view. The beep comes with its flood, so that both start together. */
export function useBenchSound(view: BenchView | null, flood: FloodStore): BenchSoundControl {
  const [speaker] = useState<BenchSpeaker | null>(() => (typeof window === 'undefined' ? null : createBenchSpeaker()));
  const [allowed, setAllowed] = useState(false);
  const muted = useSyncExternalStore(watchMuted, readMuted, () => false);
  const play = useCallback(
    (tone: Tone) => {
      if (!muted) speaker?.play(tone);
    },
    [muted, speaker],
  );
  useUnlock(speaker, setAllowed);

  const before = useRef<BenchView | null>(null);
  useEffect(() => {
    if (!view) return;
    const sound = soundBetween(before.current, view);
    before.current = view;
    if (sound && sound !== 'fault') play(sound);
  }, [view, play]);
  useEffect(
    () =>
      flood.subscribe(() => {
        if (flood.showing() !== null) play('beep');
      }),
    [flood, play],
  );
  useFaultTone(view !== null && faultStands(view) ? runKey(view) : null, play);
  useTicks(view && !muted ? tickIntervalMs(view) : null, play, speaker);

  const toggle = useCallback(() => {
    if (!speaker) return;
    if (!speaker.allowed()) {
      void speaker.unlock().then(setAllowed);
      return;
    }
    localStorage.setItem(mutedKey, readMuted() ? 'no' : 'yes');
    window.dispatchEvent(new Event(mutedEvent));
  }, [speaker]);
  return { sound: muted ? 'muted' : allowed ? 'on' : 'locked', toggle, play };
}

const runKey = ({ run }: BenchView) => `${run?.serial} ${run?.startedAtMs}`;

/** Any touch or key allows sound. */
function useUnlock(speaker: BenchSpeaker | null, onAllowed: (allowed: boolean) => void) {
  useEffect(() => {
    if (!speaker) return;
    const unlock = () => void speaker.unlock().then(onAllowed);
    if (speaker.allowed()) unlock();
    window.addEventListener('pointerup', unlock);
    window.addEventListener('keydown', unlock);
    return () => {
      window.removeEventListener('pointerup', unlock);
      window.removeEventListener('keydown', unlock);
    };
  }, [speaker, onAllowed]);
}

/** 2 Hz until somebody touches the screen or a key. */
function useFaultTone(fault: string | null, play: (tone: Tone) => void) {
  const [heard, setHeard] = useState<string | null>(null);
  const sounding = fault !== null && fault !== heard;
  useEffect(() => {
    if (!sounding) return;
    play('fault');
    const timer = setInterval(() => play('fault'), faultEveryMs);
    const touch = () => setHeard(fault);
    window.addEventListener('pointerdown', touch);
    window.addEventListener('keydown', touch);
    return () => {
      clearInterval(timer);
      window.removeEventListener('pointerdown', touch);
      window.removeEventListener('keydown', touch);
    };
  }, [sounding, fault, play]);
}

/** Ticks that quicken near the target, then a steady tone inside the tolerance. */
function useTicks(intervalMs: number | null, play: (tone: Tone) => void, speaker: BenchSpeaker | null) {
  useEffect(() => {
    if (intervalMs === null) return;
    if (intervalMs === 0) {
      speaker?.steady(true);
      return () => speaker?.steady(false);
    }
    const timer = setInterval(() => play('tick'), intervalMs);
    return () => clearInterval(timer);
  }, [intervalMs, play, speaker]);
}
