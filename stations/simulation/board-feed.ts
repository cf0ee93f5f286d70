import type { SimulatedBoard } from './simulated-board';

/** How a board hangs on its supply: through nails, behind a current limit, and for a while on its reservoir alone. */
export interface Feed {
  board: SimulatedBoard;
  /** Nails, without what the board's own pads add. */
  contactOhms: number;
  /** Whether the load is on. */
  on: boolean;
}

/** Stray capacitance where the reservoir is missing. */
const strayFarads = 1e-7;
/** Up to here the current is taken as that at the sense point, an error of some microvolts. */
const smallDropVolts = 0.02;

/** At the board's terminals: the sense point less the drop at the nails. */
export function voltsAtBoard({ board, contactOhms, on }: Feed, senseVolts: number): number {
  const ohms = contactOhms + board.truth.padOhms;
  const drop = ohms * board.amps(senseVolts, on);
  if (drop < smallDropVolts) return senseVolts - drop;
  return bisect((volts) => volts + ohms * board.amps(volts, on) - senseVolts, senseVolts);
}

export function feedAmps(feed: Feed, senseVolts: number): number {
  return feed.board.amps(voltsAtBoard(feed, senseVolts), feed.on);
}

/** What is left of `volts` at the sense point when the current limit holds. */
export function limitedVolts(feed: Feed, limitAmps: number, volts: number): number {
  if (feedAmps(feed, volts) <= limitAmps) return volts;
  return bisect((lower) => feedAmps(feed, lower) - limitAmps, volts);
}

/** The board's terminals after its reservoir alone has fed it for so long. */
export function voltsOnReservoir({ board, on }: Feed, startVolts: number, milliseconds: number): number {
  if (startVolts <= 0) return 0;
  const farads = Math.max(board.truth.design.reservoirFarads, strayFarads);
  const ohms = startVolts / Math.max(1e-6, board.amps(startVolts, on));
  return startVolts * Math.exp(-milliseconds / 1000 / (ohms * farads));
}

/** Zero of a rising function between 0 and `high`; the bracket is halved to a microvolt. */
function bisect(rising: (volts: number) => number, high: number): number {
  let low = 0;
  let top = high;
  while (top - low > 1e-6) {
    const middle = (low + top) / 2;
    if (rising(middle) > 0) top = middle;
    else low = middle;
  }
  return (low + top) / 2;
}
