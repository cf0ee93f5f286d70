import type { ChartQuantity } from '../contracts/lot-review';
import type { RejectReason } from '../run/types';

/** The first attempt of a board that ended in a verdict: what charts and yields are made of. */
export interface ReviewBoard {
  serial: string;
  verdict: 'pass' | 'reject';
  rejectReason: RejectReason | null;
  /** Of the last attempt with a verdict. */
  lastVerdict: 'pass' | 'reject';
  startedAt: Date;
  endedAt: Date;
  stationCode: string;
  /** Whoever tested it, as the page may name them. */
  operator: string;
  trimRounds: number;
  /** Verified after sealing; null where the attempt ended before. */
  values: Record<ChartQuantity, number | null>;
  /** As found before trim; turns and seconds have none. */
  found: Record<ChartQuantity, number | null>;
}

/** The verified values of one quantity in test order, with the places (from 0) of the boards that have them. */
export function measuredValues(
  boards: readonly Pick<ReviewBoard, 'values'>[],
  quantity: ChartQuantity,
): { values: number[]; places: number[] } {
  const values: number[] = [];
  const places: number[] = [];
  boards.forEach((board, place) => {
    const value = board.values[quantity];
    if (value === null) return;
    values.push(value);
    places.push(place);
  });
  return { values, places };
}

/** Mark of the lot rule for a board with a first verdict: P pass, W pass on a later attempt, R reject. */
export const markOf = ({ verdict, lastVerdict }: Pick<ReviewBoard, 'verdict' | 'lastVerdict'>): 'P' | 'W' | 'R' =>
  lastVerdict === 'reject' ? 'R' : verdict === 'pass' ? 'P' : 'W';
