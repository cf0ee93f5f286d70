import type { TrimmerTravel } from './board-design';

/**
 * Wiper fraction from the ground end for a screw position in turns from the anticlockwise end. A wiper nearer the supply
 * lowers the trip point, so where clockwise raises it, clockwise moves the wiper towards ground.
 */
export function wiperAt(travel: TrimmerTravel, turns: number): number {
  const fraction = turns / travel.turns;
  return travel.clockwise === 'raises' ? 1 - fraction : fraction;
}

/** Screw position in turns from the anticlockwise end. */
export function turnsAt(travel: TrimmerTravel, wiper: number): number {
  return travel.turns * (travel.clockwise === 'raises' ? 1 - wiper : wiper);
}

/** Turns from one wiper fraction to another; positive is clockwise. Backlash is not in it. */
export function turnsBetween(travel: TrimmerTravel, fromWiper: number, toWiper: number): number {
  return turnsAt(travel, toWiper) - turnsAt(travel, fromWiper);
}
