import { normalBelow } from '../statistics/distributions/normal';

/** The ramp begins this many deviations from the point, and the phase of its steps is averaged over so many places. */
const reach = 9;
const phases = 64;

/**
 * What a stepped ramp that stops at its first flip reports, in standard deviations of the comparator's noise: the mean
 * distance of the middle of the last step to the point, towards where the ramp came from (trip reads high, release low),
 * and its standard deviation. `step` in the same unit (> 0); `looks` independent looks of the comparator at every step.
 * Exact but for the average over the phase.
 */
export function firstPassage(step: number, looks: number): { bias: number; deviation: number } {
  let sum = 0;
  let squares = 0;
  for (let phase = 0; phase < phases; phase++) {
    let still = 1;
    for (let x = reach - ((phase + 0.5) / phases) * step; still > 1e-15; x -= step) {
      const stays = normalBelow(x) ** looks;
      const middle = x + step / 2;
      sum += still * (1 - stays) * middle;
      squares += still * (1 - stays) * middle * middle;
      still *= stays;
    }
  }
  const bias = sum / phases;
  return { bias, deviation: Math.sqrt(squares / phases - bias * bias) };
}
