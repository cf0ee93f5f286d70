import { z } from 'zod';
import type { CapabilityResult } from '../statistics/capability/capability-study';
import type { RunRule } from '../statistics/charts/run-rules';
import type { OneWayResult } from '../statistics/anova/one-way';
import type { Yield } from '../statistics/proportions/yields';

/** What the charts of a lot or a board type can show. Volts, turns, seconds. */
export const chartQuantities = ['trip-volts', 'release-volts', 'hysteresis-volts', 'turns', 'seconds'] as const;
export type ChartQuantity = (typeof chartQuantities)[number];

export const intervalMethods = ['exact', 'wilson'] as const;
export type IntervalMethod = (typeof intervalMethods)[number];

/** Limits of the specification and as drawn in by the newest board's guard band; null where there is none. */
export interface ReviewLimits {
  min: number | null;
  max: number | null;
  guardedMin: number | null;
  guardedMax: number | null;
}

/** Boards with a first verdict, in test order; every list has one entry a board. */
export interface ReviewPoints {
  serials: string[];
  /** Verified at the first attempt with a verdict; null where it was rejected before. */
  values: (number | null)[];
  /** As found before trim, at the same attempt. */
  found: (number | null)[];
  /** Marks of the lot rule; see components/ui/lot-rule.tsx. */
  marks: string;
  /** Seconds since 1970, of the end of that attempt. */
  endedAt: number[];
  /** Index into `stationCodes`. */
  station: number[];
  /** Index into the groups of the comparison; -1 in none. */
  group: number[];
}

/** Frozen centre and spread that limits and rules come from. */
export interface ReviewBaseline {
  kind: 'frozen';
  centre: number;
  sigma: number;
  lower: number;
  upper: number;
  meanRange: number;
  rangeUpper: number;
  boards: number;
  frozenIso: string;
  /** Lots it was estimated from; empty: the first boards of this lot. */
  fromLots: string[];
  /** Null: frozen by itself. */
  byName: string | null;
}

/** A rule broken from one board to another: places in test order, from 1. */
export interface RunStretch {
  rule: RunRule;
  from: number;
  to: number;
  /** Measured boards in it. */
  boards: number;
  side: 'above' | 'below' | null;
  /** Of rule 3: which way. */
  direction: 'rising' | 'falling' | null;
}

export interface ReviewYields {
  tested: number;
  passedFirst: number;
  passedLast: number;
  first: Yield | null;
  final: Yield | null;
  rolled: Yield | null;
  operations: { name: 'find' | 'trim' | 'verify'; entered: number; passedFirst: number; share: Yield | null }[];
}

export interface HistogramBin {
  from: number;
  to: number;
  boards: number;
}

export interface ComparedGroup {
  label: string;
  boards: number;
  mean: number;
  /** Null of fewer than two. */
  deviation: number | null;
}

/** Where a lot's values stand in one number, and whether the chart says that it means anything yet. */
export interface QuotedIndex {
  index: number;
  /** Cp and Cpk family, or Ppk by percentiles where the values are not normal. */
  method: 'normal' | 'percentile';
  stable: boolean;
}

/** Everything that the review of a lot shows of one quantity. */
export interface LotReview {
  quantity: ChartQuantity;
  size: number;
  stationCodes: string[];
  points: ReviewPoints;
  limits: ReviewLimits | null;
  baseline: ReviewBaseline | { kind: 'waiting'; values: number; needed: number } | { kind: 'no-spread' };
  /** Of the chosen rules. */
  stretches: RunStretch[];
  /** Points at which each of the eight rules is broken, chosen or not. */
  broken: Record<RunRule, number>;
  yields: ReviewYields;
  quoted: { trip: QuotedIndex | null; release: QuotedIndex | null };
  capability: CapabilityResult;
  /** Standard deviation of all values; null of fewer than two. */
  deviation: number | null;
  bins: HistogramBin[];
  /** What the boards can be compared by: value for the address, and its word. */
  factors: { value: string; label: string }[];
  comparison: { factor: string; groups: ComparedGroup[]; result: OneWayResult };
  /** Runs without a verdict, which touch no yield: by station and operator. */
  withoutVerdict: { station: string; operator: string; runs: number }[];
}

/** A lot that a baseline can be chosen from. */
export interface BaselineCandidate {
  lotId: string;
  code: string;
  boards: number;
  mean: number;
  sigma: number;
  /** None of the usual hold rules is broken against its own limits. */
  stable: boolean;
}

export const chooseBaselineSchema = z.object({
  lotId: z.uuid(),
  quantity: z.enum(chartQuantities),
  fromLotIds: z.array(z.uuid()).min(1, { error: 'Choose at least one lot.' }).max(20),
  /** For this lot, or for every lot of the board type made from now on. */
  scope: z.enum(['lot', 'board-type']),
  reason: z.string().trim().min(1, { error: 'Enter the reason.' }).max(300, { error: 'Use at most 300 characters.' }),
});
export type ChooseBaseline = z.infer<typeof chooseBaselineSchema>;
