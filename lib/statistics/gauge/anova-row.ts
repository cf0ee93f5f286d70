import { fAbove } from '../distributions/f-distribution';

export interface AnovaRow {
  degrees: number;
  squares: number;
  meanSquare: number;
  /** Against the row that a random effect is tested by; null for the residual, or where that row is 0. */
  f: number | null;
  p: number | null;
}

export const anovaRow = (squares: number, degrees: number): AnovaRow => ({
  degrees,
  squares,
  meanSquare: squares / degrees,
  f: null,
  p: null,
});

export function testedAgainst(tested: AnovaRow, residual: AnovaRow): AnovaRow {
  if (!(residual.meanSquare > 0)) return tested;
  const f = tested.meanSquare / residual.meanSquare;
  return { ...tested, f, p: fAbove(f, tested.degrees, residual.degrees) };
}
