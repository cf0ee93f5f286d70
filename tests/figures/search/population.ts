import type { SearchPrior, SearchSettings } from '../../../lib/search/types';
import type { SearchedBoard } from '../plant';
import type { Random } from '../random';

type Ranges = Pick<
  SearchSettings,
  'supplyMinVolts' | 'supplyMaxVolts' | 'tripMinVolts' | 'tripMaxVolts' | 'hysteresisMinVolts' | 'hysteresisMaxVolts'
>;

export const ranges12: Ranges = {
  supplyMinVolts: 6,
  supplyMaxVolts: 12,
  tripMinVolts: 8,
  tripMaxVolts: 11,
  hysteresisMinVolts: 0.2,
  hysteresisMaxVolts: 1.5,
};
export const ranges24: Ranges = {
  supplyMinVolts: 14,
  supplyMaxVolts: 28,
  tripMinVolts: 17.5,
  tripMaxVolts: 23.5,
  hysteresisMinVolts: 0.2,
  hysteresisMaxVolts: 3.2,
};

export const wideLot: SearchPrior = {
  tripMeanVolts: 9.5,
  tripSdVolts: 0.3,
  hysteresisMeanVolts: 0.6,
  hysteresisSdVolts: 0.05,
};
export const tightLot: SearchPrior = { ...wideLot, tripSdVolts: 0.03, hysteresisSdVolts: 0.02 };

const at = (trip: number, hysteresis: number): SearchedBoard => ({ trip, release: trip + hysteresis });

/** Boards by name: the study's populations. */
export const populations = {
  /** T anywhere in its range, H anywhere in its own as long as release stays below 11.9 V. */
  ordinary(random: Random) {
    const trip = random.uniform(8, 11);
    return at(trip, random.uniform(0.2, Math.min(1.5, 11.9 - trip)));
  },
  wideLot: (random: Random) => fromLot(wideLot, random),
  tightLot: (random: Random) => fromLot(tightLot, random),
  /** One volt above or below what the lot's distribution says. */
  besideTightLot: (random: Random) =>
    at(tightLot.tripMeanVolts + (random.uniform(0, 1) < 0.5 ? -1 : 1), random.normal(0.6, 0.02)),
  noHysteresis: (random: Random) => at(random.uniform(8, 11), 0),
  smallHysteresis: (random: Random) => at(random.uniform(8, 11), 0.05),
  largeHysteresis: (random: Random) => at(random.uniform(8, 9.9), 2),
  /** Up to 1 V below or 0.5 V above the range of trip points. */
  outsideRange(random: Random) {
    const beyond = random.uniform(-1, 0.5);
    const trip = beyond < 0 ? 8 + beyond : 11 + beyond;
    return at(trip, random.uniform(0.2, Math.min(1.5, 11.95 - trip)));
  },
  stuckOn: (): SearchedBoard => ({ trip: 0, release: 0, stuck: 'on' }),
  stuckOff: (): SearchedBoard => ({ trip: 0, release: 0, stuck: 'off' }),
  volts24: (random: Random) => at(random.uniform(18, 23), random.uniform(0.2, 3)),
  volts24LargeHysteresis: (random: Random) => at(random.uniform(18, 23), 4),
  /** 98 of 100 ordinary, the rest defective in one of six ways. */
  mixed(random: Random): SearchedBoard {
    if (random.uniform(0, 1) < 0.98) return populations.ordinary(random);
    const defects = [
      populations.noHysteresis,
      populations.smallHysteresis,
      populations.largeHysteresis,
      populations.outsideRange,
      populations.stuckOn,
      populations.stuckOff,
    ];
    return defects[Math.floor(random.uniform(0, defects.length))]!(random);
  },
};
export type PopulationName = keyof typeof populations;

function fromLot(lot: SearchPrior, random: Random): SearchedBoard {
  return at(
    random.normal(lot.tripMeanVolts, lot.tripSdVolts),
    random.normal(lot.hysteresisMeanVolts, lot.hysteresisSdVolts),
  );
}

/** What a right search calls the board. */
export function classOf({ trip, release, stuck }: SearchedBoard): 'stuck-on' | 'stuck-off' | 'chatter' | 'found' {
  if (stuck) return stuck === 'on' ? 'stuck-on' : 'stuck-off';
  return release - trip < 1e-3 ? 'chatter' : 'found';
}
