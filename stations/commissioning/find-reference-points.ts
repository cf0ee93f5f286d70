import type { Thresholds } from '@/lib/circuit/thresholds';
import { beginSearch, nextSearchCommand, observeSearch } from '@/lib/search/search';
import type { SearchResult } from '@/lib/search/types';
import { commissioningFault } from './commissioning-fault';
import type { ReferenceProbe } from './reference-probe';

/** A middling supply; the search learns the true value, and the creeping afterwards does not depend on it. */
const assumedOvershoot = 0.05;
const mostSettles = 150;

/** About where the points of the reference board are, by the joint search in an unknown station. */
export async function findReferencePoints(
  probe: ReferenceProbe,
  known: Thresholds & { toleranceVolts: number },
  onDone: (done: number, of: number) => void,
): Promise<Thresholds> {
  const { search, absoluteMaximumVolts } = probe.boardType;
  let state = beginSearch(
    {
      supplyMinVolts: search.supplyMinVolts,
      supplyMaxVolts: absoluteMaximumVolts,
      tripMinVolts: search.tripVolts.min,
      tripMaxVolts: search.tripVolts.max,
      hysteresisMinVolts: search.hysteresisVolts.min,
      hysteresisMaxVolts: search.hysteresisVolts.max,
      noiseVolts: search.noiseVolts,
      wantedUncertaintyVolts: 2 * search.noiseVolts,
      mostSettles,
      overshoot: assumedOvershoot,
      endCheck: false,
    },
    { volts: probe.volts, output: stateOf(probe) },
  );
  for (let settle = 1; ; settle++) {
    const command = nextSearchCommand(state);
    if (command.kind === 'finished') return checked(command.result, known);
    const voltsBefore = probe.volts;
    await probe.applyExactly(command.volts);
    state = observeSearch(state, { voltsBefore, volts: probe.volts, output: stateOf(probe) });
    onDone(Math.min(settle, usualSettles), usualSettles);
  }
}

const usualSettles = 40;

const stateOf = (probe: ReferenceProbe) => (probe.isOn ? 'on' : 'off');

/**
 * What was found, where it can be the board that is known. With an overshoot far from the usual the search is wrong; the
 * known points are then a start for creeping, which does not depend on it and finds out.
 */
function checked(result: SearchResult, known: Thresholds & { toleranceVolts: number }): Thresholds {
  if (result.kind === 'stuck-off') throw commissioningFault('notOn');
  if (result.kind !== 'found') return known;
  const found = { tripVolts: result.trip.volts, releaseVolts: result.release.volts };
  return agree(found, known, known.toleranceVolts + slackVolts) ? found : known;
}

/** Of a quick search on a station that is not yet known. */
const slackVolts = 0.05;

export function agree(found: Thresholds, known: Thresholds, withinVolts: number): boolean {
  return (
    Math.abs(found.tripVolts - known.tripVolts) <= withinVolts &&
    Math.abs(found.releaseVolts - known.releaseVolts) <= withinVolts
  );
}
