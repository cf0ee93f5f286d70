import type { RailFlag, RailsView } from '../contracts/bench-view';
import { heightOf, railsBox } from './rails-geometry';
import { stackBlocks, type Block } from './stack-blocks';

/** What is written between the tubes. Volts. */
export interface RailsInside {
  /** Supply held for the operator. */
  heldVolts: number | null;
  /** How far the trip point is to move: blue arrow and signed number at its flag. */
  shiftVolts: number | null;
  stoppedAtVolts: number | null;
  boardAbsent: boolean;
}

export const nothingInside: RailsInside = {
  heldVolts: null,
  shiftVolts: null,
  stoppedAtVolts: null,
  boardAbsent: false,
};

export interface PlacedFlag {
  flag: RailFlag;
  key: string;
  /** Height of the value on the scale, and centre of the box. */
  pointY: number;
  boxY: number;
  height: number;
  noteBelow: boolean;
  shift: boolean;
}

export interface PlacedInside {
  flags: PlacedFlag[];
  heldY: number | null;
  hysteresisY: number | null;
}

export const flagHeight = (hollow: boolean) => (hollow ? 50 : 58);
const noteRoom = 36;
const arrowRoom = 56;

/** Heights of everything between the tubes, so that nothing overlaps. */
export function placeInside(rails: RailsView, inside: RailsInside): PlacedInside {
  const shifted = shiftedFlag(rails.flags);
  const flags = rails.flags.map((found, i) => {
    const solid = rails.flags.some((other) => other.side === found.side && !other.hollow);
    // A hollow flag beside a solid one explains itself.
    const flag = found.hollow && solid ? { ...found, note: null } : found;
    const key = `${i}`;
    const shift = found === shifted && inside.shiftVolts !== null;
    const rises = (inside.shiftVolts ?? 0) > 0;
    const noteBelow = shift ? rises : flag.note !== 'too-high' || flag.side === 'release';
    return { flag, key, pointY: heightOf(rails, flag.volts), height: flagHeight(flag.hollow), noteBelow, shift, rises };
  });
  const blocks: Block[] = flags.map(({ key, flag, pointY, height, noteBelow, shift, rises }) => ({
    key,
    wantedY: pointY,
    above: height / 2 + (flag.note && !noteBelow ? noteRoom : 0) + (shift && rises ? arrowRoom : 0),
    below: height / 2 + (flag.note && noteBelow ? noteRoom : 0) + (shift && !rises ? arrowRoom : 0),
  }));
  if (inside.heldVolts !== null)
    blocks.push({ key: 'held', wantedY: heightOf(rails, inside.heldVolts) - 20, above: 20, below: 20 });
  const ends = hysteresisEnds(rails.flags);
  if (rails.hysteresisVolts !== null && ends)
    blocks.push({
      key: 'hysteresis',
      wantedY: (heightOf(rails, ends[0].volts) + heightOf(rails, ends[1].volts)) / 2,
      above: 30,
      below: 28,
    });
  const centres = stackBlocks(blocks, railsBox.topY + 4, railsBox.bottomY + 8);
  return {
    flags: flags.map(({ rises: _rises, ...flag }) => ({ ...flag, boxY: centres.get(flag.key)! })),
    heldY: centres.get('held') ?? null,
    hysteresisY: centres.get('hysteresis') ?? null,
  };
}

/** The trip flag that the blue arrow starts from: the newest measured one. */
export function shiftedFlag(flags: readonly RailFlag[]): RailFlag | null {
  const trips = flags.filter((flag) => flag.side === 'trip');
  return trips.findLast((flag) => !flag.hollow) ?? trips.at(-1) ?? null;
}

/** Release and trip flag of the same measurement, between which the hysteresis is drawn. */
export function hysteresisEnds(flags: readonly RailFlag[]): [RailFlag, RailFlag] | null {
  const release = flags.findLast((flag) => flag.side === 'release' && !flag.hollow);
  const trip = flags.findLast((flag) => flag.side === 'trip' && !flag.hollow);
  return release && trip ? [release, trip] : null;
}
