import type { SearchObservation } from '../../lib/search/types';

/** What a search drives: a supply, a board and a meter. The figure uses the whole stack, tuning a pure model. */
export interface Plant {
  /** Sets the supply, waits out the dwell and reads. Volts. */
  apply(volts: number, dwell: 'settle' | 'waypoint'): Promise<SearchObservation> | SearchObservation;
}

/** A board under a threshold search. Volts. */
export interface SearchedBoard {
  trip: number;
  release: number;
  stuck?: 'on' | 'off';
}
