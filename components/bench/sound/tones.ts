/** One note: when it starts within the sound, how long, how high. */
export interface Note {
  atMs: number;
  lengthMs: number;
  hertz: number;
}

const note = (atMs: number, lengthMs: number, hertz: number): Note => ({ atMs, lengthMs, hertz });

/** Rhythms differ, so that sounds are told apart where pitch is not heard. */
export const tones = {
  'scan-accepted': [note(0, 90, 1200)],
  'scan-refused': [note(0, 130, 280), note(210, 130, 280)],
  beep: [note(0, 220, 1800)],
  pass: [note(0, 130, 880), note(150, 220, 1320)],
  reject: [note(0, 170, 620), note(220, 170, 480), note(440, 300, 350)],
  /** Repeated at 2 Hz until somebody touches the screen. */
  fault: [note(0, 250, 720)],
  tick: [note(0, 14, 1000)],
} as const satisfies Record<string, readonly Note[]>;

export type Tone = keyof typeof tones;
