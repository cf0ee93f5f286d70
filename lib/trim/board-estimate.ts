import type { BoardDesign } from '../circuit/board-design';
import { nodeAt, pointsAt, wiperFor } from './board-model';
import type { FoundPoints, TrimSettings } from './types';

/**
 * What is known of one board: wiper fraction `a`, and the logarithms of its reference, of its trimmer's resistance and of
 * how far its wiper goes per turn asked (travel and hand together), relative to the design. Means and covariance.
 *
 * An iterated extended Kalman filter: each measurement re-linearises at its own solution, which the steep dependence of the
 * trip point on `a` needs (Bar-Shalom, Li, Kirubarajan: Estimation with Applications to Tracking and Navigation, 10.5.2).
 */
export interface BoardEstimate {
  /** [a, ln reference, ln trimmer resistance, ln travel per turn] */
  mean: number[];
  covariance: number[][];
}

/** Spread of boards about their design, one standard deviation: a 5 % reference, a 10 % trimmer, its travel. */
const referenceSd = 0.03;
const trimmerSd = 0.05;
const travelSd = 0.03;

/** People turn about as asked: within a few per cent plus a few degrees (domain knowledge, no published source). */
const turnErrorFraction = 0.03;
const turnErrorTurns = 4 / 360;

export function estimateBoard(settings: TrimSettings, found: FoundPoints): BoardEstimate {
  const start: BoardEstimate = {
    mean: [inside(wiperFor(settings.design, found.tripVolts)), 0, 0, 0],
    covariance: diagonal([0.09, referenceSd ** 2, trimmerSd ** 2, travelSd ** 2]),
  };
  // The release point adds nothing to it and would mislead it where the feedback resistor is wrong.
  return observeTrip(withReference(start, settings, found), settings, found.tripVolts, found.tripUncertaintyVolts);
}

/** Before the trip point, whose solution then belongs to the reference as read. */
function withReference(start: BoardEstimate, settings: TrimSettings, found: FoundPoints): BoardEstimate {
  if (settings.referenceVolts === null) return start;
  const readAt = settings.referenceAtVolts ?? found.tripVolts;
  const reference = (mean: number[]) => nodeAt(designOf(mean, settings), readAt);
  return update(start, reference, settings.referenceVolts, 0.002);
}

/** A trip point measured where the screw now stands. */
export function observeTrip(
  estimate: BoardEstimate,
  settings: TrimSettings,
  tripVolts: number,
  standardUncertaintyVolts: number,
): BoardEstimate {
  return update(estimate, (mean) => tripOf(mean, settings), tripVolts, Math.max(0.0005, standardUncertaintyVolts));
}

/** The screw was turned by about `raisingTurns`, positive where they raise the trip point. */
export function turnedBy(estimate: BoardEstimate, settings: TrimSettings, raisingTurns: number): BoardEstimate {
  const perTurn = Math.exp(estimate.mean[3]!) / settings.trimmer.turns;
  const move = -raisingTurns * perTurn;
  const jacobian = diagonal([1, 1, 1, 1]);
  jacobian[0]![3] = move;
  const covariance = multiply(multiply(jacobian, estimate.covariance), transpose(jacobian));
  const error = Math.hypot(turnErrorFraction * raisingTurns, turnErrorTurns, settings.trimmer.backlashTurns / 4);
  covariance[0]![0]! += (error * perTurn) ** 2;
  return { mean: [inside(estimate.mean[0]! + move), ...estimate.mean.slice(1)], covariance };
}

/** The screw was turned, nobody knows how far: only what the board is made of is kept. */
export function turnedFreely(estimate: BoardEstimate): BoardEstimate {
  const covariance = estimate.covariance.map((row, i) =>
    row.map((value, j) => (i === 0 || j === 0 ? (i === j ? 0.09 : 0) : value)),
  );
  return { mean: [...estimate.mean], covariance };
}

/** Turns that raise the trip point to `toVolts` from where the screw is now; negative where they lower it. Not clipped. */
export function raisingTurnsTo(estimate: BoardEstimate, settings: TrimSettings, toVolts: number): number {
  const wanted = wiperFor(designOf(estimate.mean, settings), toVolts);
  return ((estimate.mean[0]! - wanted) * settings.trimmer.turns) / Math.exp(estimate.mean[3]!);
}

/** The estimate with the screw where the board trips at `tripVolts`, for a trip point followed live. */
export function standingAt(estimate: BoardEstimate, settings: TrimSettings, tripVolts: number): BoardEstimate {
  return {
    ...estimate,
    mean: [inside(wiperFor(designOf(estimate.mean, settings), tripVolts)), ...estimate.mean.slice(1)],
  };
}

/** Turns left before the end stop, raising or lowering the trip point, as estimated. */
export function turnsToEnd(estimate: BoardEstimate, settings: TrimSettings, raising: boolean): number {
  const left = raising ? estimate.mean[0]! : 1 - estimate.mean[0]!;
  return (left * settings.trimmer.turns) / Math.exp(estimate.mean[3]!);
}

/** Volts that one turn moves the trip point where the screw is now, positive. */
export function voltsPerTurnOf(estimate: BoardEstimate, settings: TrimSettings): number {
  const step = 1e-4;
  const at = (da: number) => tripOf([estimate.mean[0]! + da, ...estimate.mean.slice(1)], settings);
  const slope = (at(-step) - at(step)) / (2 * step);
  return Math.abs((slope * Math.exp(estimate.mean[3]!)) / settings.trimmer.turns);
}

/** The trip point that the estimate expects after so many raising turns. */
export function tripAfter(estimate: BoardEstimate, settings: TrimSettings, raisingTurns: number): number {
  const moved = estimate.mean[0]! - (raisingTurns * Math.exp(estimate.mean[3]!)) / settings.trimmer.turns;
  return tripOf([inside(moved), ...estimate.mean.slice(1)], settings);
}

/** The design with the board's own reference and trimmer put in. */
export function designOf(mean: number[], settings: TrimSettings): BoardDesign {
  const { design } = settings;
  return {
    ...design,
    trimmerOhms: design.trimmerOhms * Math.exp(mean[2]!),
    reference: { ...design.reference, nominalVolts: design.reference.nominalVolts * Math.exp(mean[1]!) },
  };
}

const inside = (a: number) => Math.min(0.9999, Math.max(0.0001, a));
const tripOf = (mean: number[], settings: TrimSettings) =>
  pointsAt(designOf(mean, settings), inside(mean[0]!)).tripVolts;

function update(
  prior: BoardEstimate,
  predicted: (mean: number[]) => number,
  measured: number,
  standardUncertainty: number,
): BoardEstimate {
  let mean = prior.mean;
  let gain: number[] = [];
  let row: number[] = [];
  for (let iteration = 0; iteration < 6; iteration++) {
    row = gradient(predicted, mean);
    const spread = prior.covariance.map((line) => dot(line, row));
    const variance = dot(row, spread) + standardUncertainty ** 2;
    gain = spread.map((value) => value / variance);
    const here = mean;
    const innovation =
      measured -
      predicted(mean) -
      dot(
        row,
        prior.mean.map((value, i) => value - here[i]!),
      );
    mean = prior.mean.map((value, i) => value + gain[i]! * innovation);
    mean[0] = inside(mean[0]!);
  }
  // Joseph's form keeps the covariance positive.
  const keep = prior.covariance.map((_, i) => row.map((value, j) => (i === j ? 1 : 0) - gain[i]! * value));
  const covariance = multiply(multiply(keep, prior.covariance), transpose(keep)).map((line, i) =>
    line.map((value, j) => value + gain[i]! * gain[j]! * standardUncertainty ** 2),
  );
  return { mean, covariance };
}

function gradient(f: (mean: number[]) => number, at: number[]): number[] {
  const step = 1e-5;
  return at.map((_, i) => {
    const shifted = (by: number) => f(at.map((value, j) => (i === j ? value + by : value)));
    return (shifted(step) - shifted(-step)) / (2 * step);
  });
}

const dot = (x: number[], y: number[]) => x.reduce((sum, value, i) => sum + value * y[i]!, 0);
const transpose = (m: number[][]) => m[0]!.map((_, j) => m.map((row) => row[j]!));
const multiply = (x: number[][], y: number[][]) => x.map((row) => transpose(y).map((column) => dot(row, column)));
const diagonal = (values: number[]) => values.map((value, i) => values.map((_, j) => (i === j ? value : 0)));
