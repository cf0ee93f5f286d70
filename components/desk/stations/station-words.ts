import type { StationRow, StationState } from '@/lib/contracts/station-overview';

export const stationStateWords: Record<StationState, string> = {
  calls: 'Calls the engineer',
  'may-not-test': 'May not test',
  'waits-for-bin': 'Waits for the bin',
  testing: 'Testing',
  idle: 'Idle',
};

/** Counts over all benches, for the sentence above the list. */
export function countStations(stations: readonly StationRow[]) {
  const lots = new Map(stations.flatMap((station) => (station.lot ? [[station.lot.lotId, station.lot] as const] : [])));
  const sum = (pick: (lot: { size: number; tested: number; rejected: number }) => number) =>
    [...lots.values()].reduce((total, lot) => total + pick(lot), 0);
  return {
    testing: stations.filter((station) => station.state === 'testing').length,
    calling: stations.filter((station) => station.state === 'calls').map((station) => station.name),
    tested: sum((lot) => lot.tested),
    boards: sum((lot) => lot.size),
    rejected: sum((lot) => lot.rejected),
  };
}
