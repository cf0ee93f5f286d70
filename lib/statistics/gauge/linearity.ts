import { straightLine, type StraightLine } from '../anova/straight-line';
import { biasOf, type Bias } from './bias';

/** All readings of one reference board, and its known value in the same unit. */
export interface ReferenceReadings {
  reference: number;
  readings: readonly number[];
}

export interface Linearity {
  /** Readings less reference against reference: a slope or intercept that differs from 0 is a fault of the gauge. */
  line: StraightLine;
  /** Where the confidence band of the line does not hold 0, the reference values there. */
  biasedAt: number[];
  biases: (Bias & { reference: number })[];
}

/** Bias over the range of measurement, from at least three readings of at least two reference boards. AIAG MSA, 4th ed., III B. */
export function linearityOf(boards: readonly ReferenceReadings[], confidence = 0.95): Linearity {
  const points = boards.flatMap(({ reference, readings }) => readings.map((y) => ({ x: reference, y: y - reference })));
  const line = straightLine(points, confidence);
  const outside = (reference: number) => {
    if (line.kind !== 'found') return false;
    const { low, high } = line.at(reference);
    return low > 0 || high < 0;
  };
  return {
    line,
    biasedAt: boards.map(({ reference }) => reference).filter(outside),
    biases: boards.map(({ reference, readings }) => ({ reference, ...biasOf(readings, reference, { confidence }) })),
  };
}
