import { normalQuantile } from '../statistics/distributions/normal-quantile';
import { halfWidthDivisor, type BudgetLine } from './budget-line';

/** How the points are approached: what "the trip point" depends on beside the board. */
export interface Approach {
  /** Standard deviation of the comparator's noise at the supply terminals. */
  noiseVolts: number;
  /** Independent looks that the comparator takes while the supply rests at a level: dwell over its correlation time. */
  looksPerSettle: number;
  /** 0 where the supply moves in settled steps. */
  rampVoltsPerSecond: number;
  /** Time constants of the board's divider and of the sense filter: they lag in opposite senses. */
  boardSeconds: number;
  senseSeconds: number;
  /** Bound on the overshoot as a share of a move, and the largest move that can have flipped the output. */
  overshoot: number;
  decidingMoveVolts: number;
}

export interface DefinitionTerm {
  name: 'dwell' | 'lag' | 'overshoot';
  /** By how much the trip point reads high; the release point reads as much low. Uncorrected. */
  tripVolts: number;
}

/**
 * Terms that belong to the definition of the points, not to the meter. With several looks a level the first flip decides, so
 * the level of even chances moves by the noise times the quantile of 0.5^(1/looks); a ramp is recorded late by the sense
 * filter and acts late on the board; an overshoot of the deciding move reaches further than the level read afterwards. All
 * three have opposite signs in trip and release. A known shift is better corrected than carried here.
 */
export function definitionTerms(approach: Approach): DefinitionTerm[] {
  const { noiseVolts, looksPerSettle, rampVoltsPerSecond, boardSeconds, senseSeconds } = approach;
  return [
    { name: 'dwell', tripVolts: noiseVolts * normalQuantile(0.5 ** (1 / looksPerSettle)) },
    { name: 'lag', tripVolts: rampVoltsPerSecond * (senseSeconds - boardSeconds) },
    { name: 'overshoot', tripVolts: approach.overshoot * approach.decidingMoveVolts },
  ];
}

const sensitivities = { trip: 1, release: -1, hysteresis: -2 } as const;

/**
 * The terms as rows of a budget: rectangular over ± the shift, fully correlated between the points, so they add in
 * hysteresis (release less trip) where the meter's gain cancels. Terms of 0 are left out.
 */
export function definitionLines(quantity: keyof typeof sensitivities, terms: readonly DefinitionTerm[]): BudgetLine[] {
  return terms
    .filter(({ tripVolts }) => tripVolts !== 0)
    .map(({ name, tripVolts }) => ({
      contributor: name,
      distribution: 'rectangular',
      spread: Math.abs(tripVolts),
      divisor: halfWidthDivisor.rectangular,
      sensitivity: sensitivities[quantity],
      degrees: Infinity,
    }));
}
