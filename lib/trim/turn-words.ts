import type { TurnWords } from './types';

/**
 * Words for a turn. Above half a turn whole turns and eighths, to the nearest eighth; from half a turn down, degrees
 * rounded to a step worth at most half the tolerance, so that the words never ask for less precision than is needed.
 * `turns` positive; `voltsPerTurn` of the board where it stands; the dial's end mark keeps the exact angle.
 */
export function wordTurns(turns: number, voltsPerTurn: number, toleranceVolts: number): TurnWords {
  const eighths = Math.round(turns * 8);
  if (turns > 0.5 && eighths > 4) {
    return { unit: 'turns', whole: Math.floor(eighths / 8), eighths: (eighths % 8) as 0 | 1 | 2 | 3 | 4 | 5 | 6 | 7 };
  }
  const step = degreeStep(((toleranceVolts / 2) * 360) / voltsPerTurn);
  const rounded = Math.round((turns * 360) / step) * step;
  return { unit: 'degrees', degrees: Math.min(180, Math.max(step, Number(rounded.toFixed(1)))) };
}

/** The roundest step of degrees that is no larger than `mostDegrees`; half a degree is the finest that a hand can use. */
function degreeStep(mostDegrees: number): number {
  return [30, 15, 10, 5, 2, 1].find((step) => step <= mostDegrees) ?? 0.5;
}
