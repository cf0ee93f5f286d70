import type { Thresholds } from '../circuit/thresholds';
import type { Points, RunFacts } from '../run/facts';
import type { PointEstimate } from '../search/types';
import type { BenchState } from './typical-bench';

/** A search that is this near the board's true points has found them. */
const foundWithinVolts = 0.02;

const rounded = (value: number, step: number) => Math.round(value / step) * step;

/**
 * What a step leaves, without the chance of its search: points found are the board's own. So that a change in one step does
 * not change what the next ones find by less than anyone can see, and they need not be played again.
 */
export function settledFacts(facts: RunFacts, board: Thresholds): RunFacts {
  const settled = (points: Points): Points => ({
    ...points,
    trip: near(points.trip, board.tripVolts),
    release: near(points.release, board.releaseVolts),
  });
  const { found, trimmed, verified, supply, reference } = facts;
  return {
    ...facts,
    found: found && settled(found),
    trimmed: trimmed && settled(trimmed),
    verified: verified.map(settled),
    supply: supply.state === 'on' ? { ...supply, ...volts(supply.setVolts) } : supply,
    reference: reference && {
      volts: rounded(reference.volts, 1e-3),
      supplyVolts: rounded(reference.supplyVolts, 1e-2),
    },
  };
}

/** `trimmedTurns`: where a trim that reached its target leaves the screw, whichever way it came. */
export function settledBench(bench: BenchState, trimmedTurns: number | null): BenchState {
  const screwTurns = rounded(trimmedTurns ?? bench.screwTurns, 1e-3);
  return { ...bench, setVolts: rounded(bench.setVolts, 1e-3), screwTurns };
}

function near(point: PointEstimate, trueVolts: number): PointEstimate {
  const isFound = Math.abs(point.volts - trueVolts) < foundWithinVolts;
  return {
    volts: rounded(isFound ? trueVolts : point.volts, 1e-3),
    standardUncertaintyVolts: Math.ceil(point.standardUncertaintyVolts * 1e4) / 1e4,
  };
}

const volts = (setVolts: number) => ({ setVolts: rounded(setVolts, 1e-3), volts: rounded(setVolts, 1e-3) });
