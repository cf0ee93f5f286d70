import type { OutputState, PointEstimate } from '../search/types';
import type { Adjustment, Measurement, RunEffect, RunEvent } from './types';

export interface Points {
  trip: PointEstimate;
  release: PointEstimate;
  settles: number;
}

export interface ReferenceReading {
  volts: number;
  supplyVolts: number;
}

export type SupplyFact =
  | { state: 'off'; volts: number | null; by: 'meter' | 'supply' | null }
  /** `setVolts` as commanded, `volts` as last read. */
  | { state: 'on'; setVolts: number; volts: number }
  | { state: 'maybe-on' };

/** How far the supply travelled in the current search. */
export interface Travel {
  fallingOnToVolts: number | null;
  fallingOffToVolts: number | null;
  risingOffToVolts: number | null;
  risingOn: boolean;
}
export const noTravel: Travel = {
  fallingOnToVolts: null,
  fallingOffToVolts: null,
  risingOffToVolts: null,
  risingOn: false,
};

/** What is known on the fixture, gathered from the events. Steps read it. */
export interface RunFacts {
  /** Null: not known, as on a station without a controller before the operator confirmed. */
  lidClosed: boolean | null;
  boardPresent: boolean | null;
  supply: SupplyFact;
  output: OutputState | null;
  travel: Travel;
  /** Channel 103, and the board's supply at which it was read. */
  reference: ReferenceReading | null;
  found: Points | null;
  trimmed: Points | null;
  trimBegan: boolean;
  /** One entry a repeat of the verification, in order. */
  verified: Points[];
  /** A finding during trim that trimming cannot correct, before it ended the run. */
  trimFailing: boolean;
  trimRounds: number;
  turnsAdvised: number;
  /** Turns asked for, on the station's clock. */
  adjustments: readonly Adjustment[];
  /** How often each branch went another way, by the id of its step. */
  branchesTaken: Readonly<Record<string, number>>;
  measurements: Measurement[];
}

export const noFacts: RunFacts = {
  lidClosed: null,
  boardPresent: null,
  supply: { state: 'off', volts: null, by: null },
  output: null,
  travel: noTravel,
  reference: null,
  found: null,
  trimmed: null,
  trimBegan: false,
  verified: [],
  trimFailing: false,
  trimRounds: 0,
  turnsAdvised: 0,
  adjustments: [],
  branchesTaken: {},
  measurements: [],
};

/** The board's points as last measured; null before. */
export function newestPoints({ verified, trimmed, found }: RunFacts): Points | null {
  return verified.at(-1) ?? trimmed ?? found;
}

/** Supply as it must be taken to be once an effect is asked for: on from the asking, off only from the read-back. */
export function factsAfterAsking(facts: RunFacts, effect: RunEffect): RunFacts {
  if (effect.kind === 'supply-on') {
    return { ...facts, supply: { state: 'on', setVolts: effect.volts, volts: effect.volts } };
  }
  if (effect.kind === 'probe' && facts.supply.state === 'on') {
    return { ...facts, supply: { ...facts.supply, setVolts: effect.volts } };
  }
  return facts;
}

export function factsAfter(facts: RunFacts, event: RunEvent): RunFacts {
  switch (event.kind) {
    case 'fixture-read':
      return { ...facts, lidClosed: event.lidClosed, boardPresent: event.boardPresent };
    case 'lid':
      return { ...facts, lidClosed: event.closed };
    case 'board':
      return { ...facts, boardPresent: event.present };
    case 'supply-is-on':
    case 'supply-measured':
      return withVolts(facts, event.volts);
    case 'probed':
      return withVolts(
        { ...facts, output: event.output, travel: travelAfter(facts, event.volts, event.output) },
        event.volts,
      );
    case 'sensed':
      return event.output === facts.output ? facts : { ...facts, output: event.output };
    case 'supply-is-off':
      return {
        ...facts,
        output: null,
        supply: event.confirmed ? { state: 'off', volts: event.volts, by: event.by } : { state: 'maybe-on' },
      };
    default:
      return facts;
  }
}

/** The same facts where a turn of a step told nothing new, as most do. */
export function factsAfterTurn(
  before: RunFacts,
  { facts = {}, measurements = [] }: { facts?: Partial<RunFacts>; measurements?: Measurement[] },
): RunFacts {
  const names = Object.keys(facts) as (keyof RunFacts)[];
  if (measurements.length === 0 && names.every((name) => Object.is(facts[name], before[name]))) return before;
  return { ...before, ...facts, measurements: [...before.measurements, ...measurements] };
}

function withVolts(facts: RunFacts, volts: number): RunFacts {
  return facts.supply.state === 'on' ? { ...facts, supply: { ...facts.supply, volts } } : facts;
}

function travelAfter({ travel, output: before }: RunFacts, volts: number, output: OutputState): Travel {
  if (output === 'on') {
    return {
      ...travel,
      fallingOnToVolts: Math.min(volts, travel.fallingOnToVolts ?? volts),
      risingOn: travel.risingOn || before === 'off',
    };
  }
  return {
    ...travel,
    fallingOffToVolts: Math.min(volts, travel.fallingOffToVolts ?? volts),
    risingOffToVolts: Math.max(volts, travel.risingOffToVolts ?? volts),
  };
}
