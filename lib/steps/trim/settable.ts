import type { BoardType } from '../../contracts/board-type';
import { pointsAt, wiperFor } from '../../trim/board-model';

/** The finest turn of a hand with a screwdriver, 1 degree; common practice, no source. */
const handTurns = 1 / 360;
/** Share of the backlash that a finish from one side leaves, as lib/trim takes it. */
const backlashLeft = 1 / 4;
const step = 1e-4;

/** How near to a trip point a person can set the screw of a nominal board. Volts. */
export function settableVolts({ design, trimmer }: Pick<BoardType, 'design' | 'trimmer'>, tripVolts: number): number {
  const wiper = Math.min(0.999, Math.max(0.001, wiperFor(design, tripVolts)));
  const at = (a: number) => pointsAt(design, a).tripVolts;
  const voltsPerTurn = Math.abs(at(wiper - step) - at(wiper + step)) / (2 * step * trimmer.turns);
  return voltsPerTurn * Math.hypot(handTurns, trimmer.backlashTurns * backlashLeft);
}
