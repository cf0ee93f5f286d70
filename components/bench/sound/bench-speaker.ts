import { tones, type Tone } from './tones';

/** Plays the tones of a bench. Silent until the browser allows sound, which takes a touch or a key after every load. */
export interface BenchSpeaker {
  /** Whether the browser lets us sound. */
  allowed: () => boolean;
  /** Call from a touch or a key. Resolves once known whether it worked. */
  unlock: () => Promise<boolean>;
  play: (tone: Tone) => void;
  /** Starts or ends a quiet steady tone. */
  steady: (on: boolean) => void;
}

const loudness = 0.35;

export function createBenchSpeaker(): BenchSpeaker {
  let context: AudioContext | null = null;
  let holding: OscillatorNode | null = null;
  const open = () => (context ??= new AudioContext());
  const oscillator = (audio: AudioContext, hertz: number, gain: number, from: number, until: number | null) => {
    const source = audio.createOscillator();
    const level = audio.createGain();
    source.type = 'square';
    source.frequency.value = hertz;
    level.gain.setValueAtTime(0, from);
    level.gain.linearRampToValueAtTime(gain, from + 0.004);
    source.connect(level).connect(audio.destination);
    source.start(from);
    if (until !== null) {
      level.gain.setValueAtTime(gain, until - 0.004);
      level.gain.linearRampToValueAtTime(0, until);
      source.stop(until);
    }
    return source;
  };
  return {
    allowed: () => open().state === 'running',
    unlock: async () => {
      await open()
        .resume()
        .catch(() => {});
      return open().state === 'running';
    },
    play: (tone) => {
      const audio = open();
      if (audio.state !== 'running') return;
      for (const { atMs, lengthMs, hertz } of tones[tone]) {
        const from = audio.currentTime + atMs / 1000;
        oscillator(audio, hertz, loudness, from, from + lengthMs / 1000);
      }
    },
    steady: (on) => {
      const audio = open();
      if (on === (holding !== null) || (on && audio.state !== 'running')) return;
      holding?.stop();
      holding = on ? oscillator(audio, 1000, loudness / 4, audio.currentTime, null) : null;
    },
  };
}
