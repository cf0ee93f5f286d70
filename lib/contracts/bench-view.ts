import type { TrimmerPhoto } from './board-type';
import type { StepGroup } from '../sequence/step';
import type { CommissioningValues, LikelyCause, NoVerdictReason, RejectReason } from '../run/types';
import type { TrimView } from '../trim/types';

/** What the server sends to a bench screen: one whole view per change, with readings beside it at display rate. */

/** A sentence of the bench catalogue (`code` is its key) with its parameters. Numbers are formatted by the screen. */
export interface Say {
  code: string;
  params?: Record<string, string | number>;
}

/** Calibration, daily check, commissioning: one row of the station panel. */
export interface ReadinessItem {
  key: 'meter' | 'supply' | 'fixture' | 'daily-check' | 'commissioned' | 'training' | 'links' | 'database';
  label: string;
  state: 'good' | 'soon' | 'bad';
  /** ISO times; null where it does not expire or is unknown. */
  validFrom: string | null;
  validUntil: string | null;
  sentence: Say;
}

export interface RailFlag {
  side: 'trip' | 'release';
  volts: number;
  /** Hollow: an earlier attempt, or stale since the screw moved. */
  hollow: boolean;
  note: 'too-low' | 'too-high' | 'before' | 'after-beep-1' | 'no-change' | null;
}

/** The rails: what is printed (scale, limits) and what is measured. Volts. */
export interface RailsView {
  scaleMinVolts: number;
  scaleMaxVolts: number;
  tripLimits: { min: number; max: number } | null;
  releaseLimits: { min: number; max: number } | null;
  guardVolts: { tripMin: number; tripMax: number; releaseMin: number; releaseMax: number } | null;
  targetVolts: number | null;
  flags: RailFlag[];
  /** How far the supply travelled with the load on (falling) and off (rising) in the current or last search. */
  travelled: {
    fallingOnToVolts: number | null;
    fallingOffToVolts: number | null;
    risingOffToVolts: number | null;
    risingOn: boolean;
  };
  hysteresisVolts: number | null;
}

export type SupplyView = { state: 'off'; volts: number } | { state: 'maybe-on' } | { state: 'on'; volts: number };

/** The run on the fixture, as `viewRun` makes it. */
export interface RunView {
  serial: string;
  attempt: number;
  stepGroups: { group: StepGroup; state: 'done' | 'current' | 'ahead' }[];
  rails: RailsView;
  supply: SupplyView;
  startedAtMs: number;
  screen:
    | { kind: 'seat'; wants: 'close-lid' | 'place-board' | 'confirm-lid-and-board' | 'nothing' }
    /** `everyMs`: time from one count to the next where it is fixed, so that what is left is known. */
    | { kind: 'measuring'; what: Say; done: number; of: number | null; everyMs?: number }
    /** `photo`: where the screw sits on boards of this type. */
    | { kind: 'trim'; trim: TrimView; clockwiseRaises: boolean; photo?: TrimmerPhoto }
    | { kind: 'seal'; wants: 'supply-off' | 'open-lid' | 'seal-screw' | 'close-lid' }
    | { kind: 'operator-check'; question: string }
    /** `supplyOff`: the lid may be opened, once the supply is read back below 2 V. */
    | { kind: 'instruction'; text: string; pictureId: string | null; supplyOff: boolean }
    | { kind: 'pass'; seconds: number }
    | {
        kind: 'reject';
        reason: RejectReason;
        cause: LikelyCause | null;
        measured: { value: number; unit: string; limit: number | null } | null;
      }
    | {
        kind: 'no-verdict';
        reason: NoVerdictReason;
        code: string | null;
        detail: Say | null;
        failingWhenStopped: boolean;
        stoppedAtVolts: number | null;
      };
}

/** One mark a board, in serial or test order: . ahead, P pass, W pass on a later attempt, R reject, N no verdict, C current. */
export interface LotStrip {
  lotId: string;
  code: string;
  boardTypeCode: string;
  size: number;
  marks: string;
  tested: number;
  passed: number;
  rejected: number;
  secondsEach: number | null;
}

/** A known point of the reference board against what the station found. Volts. */
export interface ReferencePoint {
  quantity: 'trip-volts' | 'release-volts';
  knownVolts: number;
  toleranceVolts: number;
  measuredVolts: number | null;
  passed: boolean;
}

/** A draft that an engineer offers to this station for a trial. */
export interface TrialOffer {
  offerId: string;
  offeredBy: string;
  /** Such as r7. */
  revision: string;
  sequenceName: string;
  boardTypeCode: string;
  /** Empty: none. */
  note: string;
}

export interface BenchView {
  /** Rises with every change; a screen drops an older view. */
  revision: number;
  station: {
    code: string;
    name: string;
    fixture: string;
    simulated: boolean;
    hasController: boolean;
    hasWiperProbe: boolean;
    /** Day, night, or as the system says. */
    scheme: 'day' | 'night' | 'system';
  };
  operator: { accountId: string; number: string; locale: string; mayCommission: boolean } | null;
  lot: LotStrip | null;
  /** What the next run of the lot or the trial will be: shown while idle. Null without either. */
  next: { stepGroups: StepGroup[]; rails: RailsView } | null;
  run: RunView | null;
  /** May be taken for a trial now. Null: none, or not now. */
  offer: TrialOffer | null;
  /** The draft of which engineering runs are made: what is shown is no production, and `lot` is null. */
  engineering: TrialOffer | null;
  readiness: ReadinessItem[];
  call: { sinceIso: string; acknowledgedBy: string | null } | null;
  label: { serial: string; state: 'waiting' | 'printed' | 'failed'; problem: string | null } | null;
  /** The newest refusal of a scan or action, shown beside what was tried. */
  refusal: (Say & { serial: string | null; atIso: string }) | null;
  screen:
    | { kind: 'badge' }
    | { kind: 'pin'; operatorNumber: string; badgeReadIso: string; retryAtIso: string | null; problem: Say | null }
    | { kind: 'may-not-test'; reasons: (Say & { faultCode: string })[]; otherStation: string | null }
    | {
        kind: 'choose-lot';
        lots: { lotId: string; code: string; boardTypeCode: string; size: number; tested: number }[];
      }
    | { kind: 'idle'; last: { serial: string; verdict: 'pass' | 'reject' | 'no-verdict'; seconds: number } | null }
    /** The fixture was not seen empty since the last run. */
    | { kind: 'empty-fixture'; nextSerial: string | null }
    /** `run` says what to show. */
    | { kind: 'run' }
    /** A reject waits for its bin scan; `run` shows the reject. */
    | { kind: 'bin'; binCode: string }
    /** The reference board was measured. `continue` leaves this screen. */
    | { kind: 'daily-check'; passed: boolean; points: ReferencePoint[]; validUntilIso: string | null }
    /** An engineer measures the station with the reference board. `stop` ends it, `continue` leaves the result. */
    | {
        kind: 'commissioning';
        state: 'seat' | 'measuring' | 'done' | 'failed';
        what: Say;
        done: number;
        of: number;
        values: CommissioningValues | null;
      }
    /** The station starts, reconnects its instruments, or its database is away. */
    | { kind: 'starting'; what: Say };
}

/** Sent at display rate while the supply is on; never stored in the view. */
export interface BenchReading {
  volts: number;
  output: 'on' | 'off' | null;
  rail: 'falling' | 'rising' | 'off';
}
