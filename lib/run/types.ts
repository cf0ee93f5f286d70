import type { BoardType } from '../contracts/board-type';
import type { Sequence } from '../sequence/step';
import type { Direction, TurnWords } from '../trim/types';
import type { OutputState, SearchPrior } from '../search/types';

/** Verdicts are three; mixing them up ruins every figure downstream. */
export const verdicts = ['pass', 'reject', 'no-verdict'] as const;
export type Verdict = (typeof verdicts)[number];

/** Why a run ended without a verdict. The station's or a person's reason, never the board's. */
export const noVerdictReasons = [
  'operator-stop',
  'supply-fault',
  'meter-fault',
  'fixture-fault',
  'link-lost',
  'lid-opened',
  'bench-lost',
  'contact-lost',
  'board-removed',
  'overvoltage-tripped',
  'interrupted',
  'shutdown',
] as const;
export type NoVerdictReason = (typeof noVerdictReasons)[number];

/** Why a board was rejected; each is a measured finding. */
export const rejectReasons = [
  'trip-too-low',
  'trip-too-high',
  'release-too-low',
  'release-too-high',
  'hysteresis-too-small',
  'hysteresis-too-large',
  'reference-out-of-limits',
  'supply-current-at-limit',
  'never-on',
  'never-off',
  'output-chatters',
  'point-not-steady',
  'trim-no-effect',
  'trim-end-of-travel',
  'trim-cannot-reach',
  'trim-too-many-rounds',
  'trim-will-not-turn',
  'not-repeatable',
  'output-high-level',
  'output-low-level',
  'quiescent-current',
  'ride-through',
  'operator-check-failed',
  'channel-out-of-limits',
  'drift-too-large',
] as const;
export type RejectReason = (typeof rejectReasons)[number];

/** Likely causes, worded as likely; domain knowledge by signature. */
export const likelyCauses = [
  'short-or-reversed-part',
  'zener-open-or-reversed',
  'zener-reversed',
  'wrong-zener',
  'feedback-open',
  'wrong-feedback-resistor',
  'op-amp-missing-or-dead',
  'output-shorted',
  'trimmer-end-wiper-open-or-wrong-screw',
  'noisy-wiper-or-contact',
  'reservoir-missing',
] as const;
export type LikelyCause = (typeof likelyCauses)[number];

export interface CommissioningValues {
  /** Largest move toward the known point that does not flip it, as a fraction of the step. */
  overshoot: number;
  settleMs: number;
  waypointMs: number;
  noiseVolts: number;
}

/** Everything a run needs, fixed when it starts. */
export interface RunPlan {
  runId: string;
  serial: string;
  attempt: number;
  boardType: BoardType;
  sequence: Sequence;
  sequenceRevision: string;
  commissioning: CommissioningValues;
  hasController: boolean;
  hasWiperProbe: boolean;
  pollMs: number;
  fastLink: boolean;
  prior: SearchPrior | null;
  /** Relative and fixed part of the meter's standard uncertainty for a reading near the points; its last digit. */
  meter: { gain: number; offsetVolts: number; resolutionVolts: number };
  seed: number;
}

/** One finished measurement, as it is judged, stored and shown. */
export interface Measurement {
  quantity:
    | 'contact-milliohms'
    | 'reference-volts'
    | 'trip-volts'
    | 'release-volts'
    | 'hysteresis-volts'
    | 'trip-spread-volts'
    | 'output-high-drop-volts'
    | 'output-low-volts'
    | 'quiescent-amps'
    | 'ride-through-seconds'
    | 'supply-amps'
    | 'operator-check'
    /** A scanner channel against limits of its step. */
    | 'channel-volts'
    /** What a straight line through a soak's readings moved, as a magnitude. */
    | 'drift-volts';
  /** `found` before trim, `trimmed` after it, `verified` after sealing; a verdict rests on `verified`. */
  phase: 'found' | 'trimmed' | 'verified' | 'check';
  value: number;
  standardUncertainty: number | null;
  /** U, for a coverage of about 95 % (Welch-Satterthwaite). */
  expandedUncertainty: number | null;
  min: number | null;
  max: number | null;
  /** Limits as judged, drawn in by the guard band. */
  guardedMin: number | null;
  guardedMax: number | null;
  passed: boolean | null;
  stepIndex: number;
  settles: number | null;
}

/**
 * What the engine asks of the station. Each but `record-run` is answered by exactly one event with the same `id`, or by
 * `fault`. `kind` names follow what the station does with its instruments; the station decides nothing.
 *
 * At most one effect is outstanding, but for one case: a run that is stopped asks `supply-off` while another effect is
 * still being performed. The station breaks the older one off; an answer to it is ignored.
 */
export type RunEffect =
  | { kind: 'read-fixture'; id: number }
  | { kind: 'prepare-supply'; id: number; currentLimitAmps: number; overvoltageVolts: number }
  /** Output on at `volts`; then wait. */
  | { kind: 'supply-on'; id: number; volts: number; settleMs: number }
  /** Set, wait, read channel 101 and the output's state. `fromVolts` is read first when `readBefore`. */
  | { kind: 'probe'; id: number; volts: number; dwellMs: number; readBefore: boolean }
  /** Read the output's state at the standing supply. */
  | { kind: 'sense'; id: number }
  | { kind: 'measure'; id: number; channel: 101 | 102 | 103 | 104; integrationCycles: number }
  | { kind: 'measure-supply'; id: number }
  | { kind: 'measure-wiper'; id: number }
  | { kind: 'pulse'; id: number; seconds: number }
  | { kind: 'wait'; id: number; milliseconds: number }
  /** Off, then read back by the meter at channel 101 or by the supply until below 2 V. */
  | { kind: 'supply-off'; id: number }
  /** The run is over: close the record. Nothing answers; the state is final. */
  | { kind: 'record-run' };

/** What happened. `atMs` is the station's clock. Recorded in full, so that a run can be replayed from its record. */
export type RunEvent = { atMs: number } & (
  | { kind: 'fixture-read'; id: number; lidClosed: boolean; boardPresent: boolean }
  | { kind: 'prepared'; id: number }
  | { kind: 'supply-is-on'; id: number; volts: number; amps: number }
  | {
      kind: 'probed';
      id: number;
      voltsBefore: number | null;
      volts: number;
      output: OutputState;
    }
  | { kind: 'sensed'; id: number; output: OutputState }
  | { kind: 'measured'; id: number; volts: number }
  | { kind: 'supply-measured'; id: number; volts: number; amps: number }
  | { kind: 'wiper-measured'; id: number; wiperVolts: number; supplyVolts: number }
  | { kind: 'pulsed'; id: number; seconds: number }
  | { kind: 'waited'; id: number }
  /** Read back below 2 V, by whom, or not confirmed. */
  | { kind: 'supply-is-off'; id: number; confirmed: true; volts: number; by: 'meter' | 'supply' }
  | { kind: 'supply-is-off'; id: number; confirmed: false }
  /** An instrument or link failed while performing effect `id` (null: while nothing was asked). */
  | { kind: 'fault'; id: number | null; reason: NoVerdictReason; code: string; detail: string }
  /** From the fixture, at any time. */
  | { kind: 'lid'; closed: boolean }
  | { kind: 'board'; present: boolean }
  /** From the operator, at any time. */
  | { kind: 'stop' }
  | { kind: 'will-not-turn' }
  /** Answers the finding that turning changes nothing: the right screw is found, prompt again. */
  | { kind: 'screw-found' }
  | { kind: 'confirm'; what: 'lid-and-board' | 'lid-open' | 'sealed' | 'lid-closed' | 'instruction-done' }
  | { kind: 'answer'; ok: boolean }
  /** The bench screen has been gone for over 5 s, or the server shuts down. */
  | { kind: 'bench-lost' }
  | { kind: 'shutdown' }
);

/** One turn of the screw that the station asked for. */
export interface Adjustment {
  /** Milliseconds since the run began. */
  atMs: number;
  round: number;
  direction: Direction;
  turns: number;
  words: TurnWords | null;
  /** Trip point before it; null while it was not known. */
  fromVolts: number | null;
  until: 'turned' | 'first-beep' | 'second-beep';
}

export interface RunResult {
  verdict: Verdict;
  rejectReason: RejectReason | null;
  likelyCause: LikelyCause | null;
  noVerdictReason: NoVerdictReason | null;
  faultCode: string | null;
  faultDetail: string | null;
  /** A run stopped or broken after a reading already outside what trimming can correct. */
  failingWhenStopped: boolean;
  supplyOff: { confirmed: boolean; volts: number | null; by: 'meter' | 'supply' | null };
  measurements: Measurement[];
  trimRounds: number;
  turnsAdvised: number;
  adjustments: Adjustment[];
}

/*
 * The engine, in lib/run/run.ts:
 *
 *   beginRun(plan: RunPlan, atMs: number): { state: RunState; effects: RunEffect[] }
 *   advanceRun(state: RunState, event: RunEvent): { state: RunState; effects: RunEffect[] }
 *   viewRun(state: RunState): RunView            what the bench shows, in lib/contracts/bench-view.ts
 *   resultOf(state: RunState): RunResult | null  once over
 */
