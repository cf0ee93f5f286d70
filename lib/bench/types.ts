import type { BenchCommand } from '../contracts/bench-command';
import type { BenchView, LotStrip, ReadinessItem, ReferencePoint, Say, TrialOffer } from '../contracts/bench-view';
import type { BoardType } from '../contracts/board-type';
import type { CommissioningValues, NoVerdictReason, RunEvent, RunPlan, Verdict } from '../run/types';

/** Who is signed in at a bench, for as long as `sessionId` is valid. */
export interface BenchOperator {
  accountId: string;
  sessionId: string;
  number: string;
  locale: string;
  mayCommission: boolean;
}

export interface OpenLot {
  lotId: string;
  code: string;
  boardTypeCode: string;
  size: number;
  tested: number;
}

/** A rejected board whose bin has not been scanned yet. */
export interface PendingBin {
  runId: string;
  serial: string;
  binCode: string;
}

export type NextRun = NonNullable<BenchView['next']>;

/** Engineering runs of an offered draft, instead of production, until they are left. */
export interface BenchTrial {
  offer: TrialOffer;
  next: NextRun;
}

/** A run of the reference board, and what it is compared with. Volts. */
export interface ReferenceCheck {
  referenceCode: string;
  tripVolts: number;
  releaseVolts: number;
  toleranceVolts: number;
}

/** What the server is asked for. One question at a time; answered by `answered` with the same id. */
export type BenchAsk =
  | { kind: 'badge'; badgeCode: string; byHand: boolean }
  | { kind: 'pin'; accountId: string; digits: string }
  | { kind: 'lot'; by: { code: string } | { lotId: string } }
  /**
   * May this board be tested here, now, by this operator? The answer has opened the run. A reference board needs no
   * lot, and starts the daily check. With an offer it is run with the offered draft, as an engineering run.
   */
  | { kind: 'board'; serial: string; lotId: string | null; offerId: string | null; byHand: boolean }
  /** Takes an offered draft for a trial. */
  | { kind: 'offer'; offerId: string }
  | { kind: 'end-offer'; offerId: string }
  /** The reference board that an engineer scans for commissioning. */
  | { kind: 'reference'; code: string }
  | { kind: 'bin'; runId: string; binCode: string }
  | { kind: 'component-batch'; lotId: string; component: string; batch: string }
  | { kind: 'call-engineer' }
  | { kind: 'print-label'; serial: string }
  | { kind: 'lots' };

export interface BenchAnswers {
  badge: { accountId: string; number: string };
  pin: { operator: BenchOperator; lots: OpenLot[]; standing: Standing };
  lot: { lot: LotStrip; next: NextRun; standing: Standing };
  board: { plan: RunPlan; check: ReferenceCheck | null; engineering: boolean };
  offer: BenchTrial & { standing: Standing };
  'end-offer': null;
  reference: { check: ReferenceCheck; boardType: BoardType };
  bin: { lot: LotStrip | null };
  'component-batch': null;
  'call-engineer': { call: NonNullable<BenchView['call']> };
  'print-label': { label: NonNullable<BenchView['label']> };
  lots: { lots: OpenLot[] };
}

export interface BenchRefusal {
  ok: false;
  refusal: Say;
  /** When the same may be tried again, after failed PINs. */
  retryAtIso?: string;
}
export type BenchAnswerTo<K extends keyof BenchAnswers> = { ok: true; kind: K; value: BenchAnswers[K] };
export type BenchAnswer = { [K in keyof BenchAnswers]: BenchAnswerTo<K> }[keyof BenchAnswers] | BenchRefusal;

/** Where the station stands with the server: read when something changed and every few seconds. */
export interface Standing {
  readiness: ReadinessItem[];
  /** Why this station may not test this lot by this operator; empty when it may. */
  reasons: (Say & { faultCode: string })[];
  otherStation: string | null;
  /** The bench session of the operator still holds. */
  signedIn: boolean;
  lot: LotStrip | null;
  /** Of the lot; null without one. */
  next: NextRun | null;
  /** Open at this station. */
  offer: TrialOffer | null;
  call: BenchView['call'];
  label: BenchView['label'];
}

/** Who works at a station on what. */
export interface BenchPlace {
  accountId: string | null;
  sessionId: string | null;
  lotId: string | null;
  /** Of the trial that goes on. */
  offerId: string | null;
  /** Of the board last passed: its label is watched. */
  serial: string | null;
}

/** How a run ended, as the bench needs it. */
export interface RunEnding {
  verdict: Verdict;
  seconds: number;
  noVerdictReason: NoVerdictReason | null;
  supplyConfirmedOff: boolean;
  bin: PendingBin | null;
  /** Of a daily check; null for a board. */
  reference: { passed: boolean; points: ReferencePoint[]; validUntilIso: string | null } | null;
}

export type LinkName = 'supply' | 'meter' | 'controller';

export type BenchPhase =
  | { kind: 'badge' }
  | {
      kind: 'pin';
      accountId: string;
      number: string;
      badgeReadIso: string;
      retryAtIso: string | null;
      problem: Say | null;
    }
  | { kind: 'choose-lot'; lots: OpenLot[] }
  /** `nextSerial` was scanned and waits for the fixture to be seen empty. */
  | { kind: 'idle'; next: { serial: string; byHand: boolean } | null }
  | { kind: 'run'; serial: string; check: ReferenceCheck | null }
  | { kind: 'over'; serial: string; verdict: Verdict }
  | { kind: 'bin'; bin: PendingBin }
  | { kind: 'daily-check'; passed: boolean; points: ReferencePoint[]; validUntilIso: string | null }
  | {
      kind: 'commissioning';
      state: 'seat' | 'measuring' | 'done' | 'failed';
      reference: BenchAnswers['reference'] | null;
      what: Say;
      done: number;
      of: number;
      values: CommissioningValues | null;
    };

export interface BenchState {
  station: BenchView['station'];
  phase: BenchPhase;
  operator: BenchOperator | null;
  lot: LotStrip | null;
  next: NextRun | null;
  /** Null: production. */
  trial: BenchTrial | null;
  standing: Standing;
  pendingBin: PendingBin | null;
  /** Links of the instruments answer; the supply was read back as off. Neither is needed while a run goes on. */
  ready: {
    opened: boolean;
    linksDown: LinkName[];
    /** Answer, but not as the instruments that the station was set up with. */
    strangers: LinkName[];
    supplyOff: boolean;
    databaseAway: boolean;
  };
  fixture: { lidClosed: boolean | null; boardPresent: boolean | null; seenEmpty: boolean; heldSerial: string | null };
  last: { serial: string; verdict: Verdict; seconds: number } | null;
  refusal: BenchView['refusal'];
  asked: { id: number; ask: BenchAsk } | null;
  lastId: number;
}

type Unstamped<E> = E extends unknown ? Omit<E, 'atMs'> : never;
/** A run event that a person or the bench causes; the station stamps it. */
export type PersonsRunEvent = Unstamped<
  Extract<
    RunEvent,
    { kind: 'stop' | 'will-not-turn' | 'screw-found' | 'confirm' | 'answer' | 'bench-lost' | 'shutdown' }
  >
>;

export type BenchEvent = { atIso: string } & (
  | { kind: 'command'; command: BenchCommand }
  | { kind: 'answered'; id: number; answer: BenchAnswer }
  | { kind: 'standing'; standing: Standing; pendingBin?: PendingBin | null }
  | { kind: 'database'; away: boolean }
  | { kind: 'instruments'; opened: boolean; linksDown: LinkName[]; strangers: LinkName[] }
  | { kind: 'supply'; confirmedOff: boolean }
  | { kind: 'fixture'; lidClosed: boolean; boardPresent: boolean }
  | { kind: 'run-over'; ending: RunEnding }
  | { kind: 'commissioning-progress'; step: string; done: number; of: number }
  | { kind: 'commissioning-over'; values: CommissioningValues | null; problem: Say | null; supplyConfirmedOff: boolean }
);

export type BenchEffect =
  | { kind: 'ask'; id: number; ask: BenchAsk }
  | { kind: 'start-run'; plan: RunPlan; check: ReferenceCheck | null; engineering: boolean }
  | { kind: 'run-event'; event: PersonsRunEvent }
  | { kind: 'start-commissioning'; reference: BenchAnswers['reference'] }
  | { kind: 'stop-commissioning' }
  | { kind: 'end-session'; sessionId: string }
  | { kind: 'save-scheme'; scheme: 'day' | 'night' | 'system' }
  | { kind: 'save-locale'; accountId: string; locale: string }
  /** Something changed that the server knows more about: read the standing again. */
  | { kind: 'read-standing' };

export interface BenchStep {
  state: BenchState;
  effects: BenchEffect[];
}
