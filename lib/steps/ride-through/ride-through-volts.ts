import type { BoardLimits } from '../../contracts/board-type';
import { downTo } from '../number-words';

/** Between the points of every board within its limits, near the upper end: that leaves the reservoir most to give. */
export function rideThroughVolts({ tripVolts, releaseVolts }: Pick<BoardLimits, 'tripVolts' | 'releaseVolts'>): number {
  return downTo(tripVolts.max + 0.9 * (releaseVolts.min - tripVolts.max), 2);
}
