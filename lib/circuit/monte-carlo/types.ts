import type { BoardLimits } from '../../contracts/board-type';
import type { PointPart } from '../sensitivities';
import type { Thresholds } from '../thresholds';

/** 1st and 99th percentile of the boards: 98 of 100 lie between. Volts. */
export interface VoltsBand {
  lowVolts: number;
  highVolts: number;
}

/** One position of the screw. Points are null where a board has none there. */
export interface TravelPosition {
  /** From the anticlockwise end. */
  turns: number;
  wiper: number;
  /** Nominal parts, an ideal zener of the nominal voltage. */
  ideal: Thresholds;
  /** Nominal parts, the zener's soft knee. */
  typical: Thresholds | null;
  bands: { trip: VoltsBand; release: VoltsBand; hysteresis: VoltsBand } | null;
}

export interface ReleaseHistogram {
  fromVolts: number;
  binVolts: number;
  counts: number[];
}

export const judgedQuantities = ['target', 'release', 'hysteresis', 'reference'] as const;
/** `target`: the trimmer's travel ends before the target. The others are of boards trimmed to it. */
export type JudgedQuantity = (typeof judgedQuantities)[number];

/** Shares of all boards, 0 to 1. Below: under the lower limit, or travel that ends below the target. */
export interface Misses {
  below: number;
  above: number;
}

export interface PartChange {
  part: PointPart;
  /** Nominal, in the part's own unit; absent: stays. */
  value?: number;
  /** As a fraction; of the comparator's offset, volts. Absent: stays. */
  tolerance?: number;
}

/** A change after which fewer than one board in 1,000 misses, tried on the same boards. */
export type LimitFix =
  | { kind: 'parts'; changes: PartChange[] }
  | { kind: 'limits'; quantity: Exclude<JudgedQuantity, 'target'>; minVolts: number; maxVolts: number }
  /** Trip points that the travel of all but one board in 1,000 covers. */
  | { kind: 'target'; minVolts: number; maxVolts: number };

export interface LimitFinding {
  quantity: JudgedQuantity;
  misses: Misses;
  /** Null for `target`. */
  limits: BoardLimits['releaseVolts'] | null;
  /** The part that brings most of the spread, and its share of the variance, 0 to 1. */
  driver: { part: PointPart; share: number };
  fix: LimitFix | null;
}

export interface BoardTypePrediction {
  boards: number;
  targetVolts: number;
  travel: TravelPosition[];
  /** Where the typical board's screw stands when trimmed; null where its travel does not reach. Turns. */
  typicalTurns: number | null;
  misses: Record<JudgedQuantity, Misses>;
  /** Boards that cannot be trimmed to the target, or miss a limit there. A share, 0 to 1. */
  cannotPass: number;
  /** Of the boards that reach the target. */
  release: ReleaseHistogram;
  findings: LimitFinding[];
}
