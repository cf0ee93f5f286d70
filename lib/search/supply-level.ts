/**
 * Where the supply really settles, learnt from the meter while the search runs. The meter is the value, the setpoint is
 * not: a supply has offset, gain error and resolution of some millivolts. Yet the reading at the end of a dwell still
 * contains the ring of the step. Both are one linear model, estimated by recursive least squares (a Kalman filter
 * without process noise) over four unknowns:
 *
 *   reading - setpoint = offset + gain (setpoint - middle) - ring(dwell) (before - level) + noise
 */
export interface SupplyModel {
  middleVolts: number;
  /** offset (volts), gain, ring at a settle, ring at a waypoint. */
  mean: readonly number[];
  /** Row by row, 4 by 4. */
  covariance: readonly number[];
}

export type Dwell = 'settle' | 'waypoint';

/** Setting error that no offset or gain explains: the supply's resolution. */
const resolutionSdVolts = 1e-3;
const readingSdVolts = 0.3e-3;
/** What is left of the ring that does not scale with the step. */
const ringScatter = 0.003;
const priorMean = [0, 0, 0.012, 0.025];
const priorSd = [0.01, 0.001, 0.012, 0.02];

export function beginSupplyModel(minVolts: number, maxVolts: number): SupplyModel {
  const covariance = Array.from({ length: 16 }, (_, i) => (i % 5 === 0 ? priorSd[i / 5]! ** 2 : 0));
  return { middleVolts: (minVolts + maxVolts) / 2, mean: priorMean, covariance };
}

function quadratic(covariance: readonly number[], a: readonly number[]): number {
  let sum = 0;
  for (let i = 0; i < 4; i++) for (let j = 0; j < 4; j++) sum += a[i]! * covariance[4 * i + j]! * a[j]!;
  return sum;
}

/** How far above its setpoint the supply settles, with the standard deviation of that belief. Volts. */
export function supplyErrorAt(model: SupplyModel, setpoint: number): { volts: number; sd: number } {
  const a = [1, setpoint - model.middleVolts, 0, 0];
  return {
    volts: model.mean[0]! + model.mean[1]! * a[1]!,
    sd: Math.sqrt(quadratic(model.covariance, a)),
  };
}

/** The setpoint that settles at `volts`. */
export const setpointFor = (model: SupplyModel, volts: number) => volts - supplyErrorAt(model, volts).volts;

/**
 * The level a step settled at, weighing the corrected reading against the model's prediction, and the variance of it
 * beyond a plain reading's own; and the model with the reading learnt.
 */
export function learnSupplyLevel(
  model: SupplyModel,
  step: { setpoint: number; before: number; reading: number; dwell: Dwell },
): { level: number; extraVariance: number; model: SupplyModel } {
  const ring = step.dwell === 'settle' ? 2 : 3;
  const error = supplyErrorAt(model, step.setpoint);
  const predicted = step.setpoint + error.volts;
  const jump = step.before - predicted;
  const scatter = (ringScatter * jump) ** 2;
  const a = [1, step.setpoint - model.middleVolts, 0, 0];
  a[ring] = -jump;

  const predictedVariance = error.sd ** 2 + resolutionSdVolts ** 2;
  const corrected = step.reading + model.mean[ring]! * jump;
  const correctedVariance = readingSdVolts ** 2 + model.covariance[5 * ring]! * jump ** 2 + scatter;
  const level =
    (predicted * correctedVariance + corrected * predictedVariance) / (predictedVariance + correctedVariance);
  const variance = (predictedVariance * correctedVariance) / (predictedVariance + correctedVariance);
  const plain = 1 / (1 / resolutionSdVolts ** 2 + 1 / readingSdVolts ** 2);

  const noise = resolutionSdVolts ** 2 + readingSdVolts ** 2 + scatter;
  const gain = [0, 1, 2, 3].map((i) => a.reduce((sum, aj, j) => sum + model.covariance[4 * i + j]! * aj, 0));
  const total = noise + a.reduce((sum, ai, i) => sum + ai * gain[i]!, 0);
  const innovation = step.reading - step.setpoint - a.reduce((sum, ai, i) => sum + ai * model.mean[i]!, 0);
  return {
    level,
    extraVariance: Math.max(0, variance - plain),
    model: {
      middleVolts: model.middleVolts,
      mean: model.mean.map((m, i) => m + (gain[i]! * innovation) / total),
      covariance: model.covariance.map((c, k) => c - (gain[k >> 2]! * gain[k & 3]!) / total),
    },
  };
}
