import { beginSearch, nextSearchCommand, observeSearch, type SearchState } from '../../search/search';
import type { SearchPrior, SearchResult, SearchSettings } from '../../search/types';
import type { Answer, Ask, ProcedureTurn, StepContext } from '../machine';

export interface SearchPoints {
  settings: SearchSettings;
  settleMs: number;
  /** Null until the first reading says where the search starts. */
  search: SearchState | null;
  voltsBefore: number;
  settles: number;
}

export interface SearchWish {
  windowMinVolts: number;
  windowMaxVolts: number;
  wantedUncertaintyVolts: number;
  mostSettles: number;
  settleMs: number;
  prior: SearchPrior | null;
  endCheck: boolean;
  /** Without prior and coupling, over the whole window: when a first search did not resolve. */
  unassuming: boolean;
}

export function searchSettings(wish: SearchWish, { plan }: StepContext): SearchSettings {
  const { search, absoluteMaximumVolts } = plan.boardType;
  const supplyMinVolts = Math.max(search.supplyMinVolts, wish.windowMinVolts);
  const supplyMaxVolts = Math.min(absoluteMaximumVolts, wish.windowMaxVolts);
  const assumed = wish.unassuming
    ? {
        tripMinVolts: supplyMinVolts,
        tripMaxVolts: supplyMaxVolts,
        hysteresisMinVolts: 0,
        hysteresisMaxVolts: supplyMaxVolts - supplyMinVolts,
      }
    : {
        tripMinVolts: search.tripVolts.min,
        tripMaxVolts: search.tripVolts.max,
        hysteresisMinVolts: search.hysteresisVolts.min,
        hysteresisMaxVolts: search.hysteresisVolts.max,
        ...(wish.prior ? { prior: wish.prior } : {}),
      };
  return {
    supplyMinVolts,
    supplyMaxVolts,
    ...assumed,
    noiseVolts: Math.max(search.noiseVolts, plan.commissioning.noiseVolts),
    wantedUncertaintyVolts: wish.wantedUncertaintyVolts,
    mostSettles: wish.mostSettles,
    overshoot: plan.commissioning.overshoot,
    endCheck: wish.endCheck,
  };
}

/** Drives lib/search from the standing supply. The first reading tells it where it starts. */
export function beginSearchPoints(wish: SearchWish, context: StepContext): { machine: SearchPoints; ask: Ask } {
  const { supply } = context.facts;
  const settings = searchSettings(wish, context);
  const settleMs = Math.max(wish.settleMs, context.plan.commissioning.settleMs);
  const volts = supply.state === 'on' ? supply.setVolts : settings.supplyMinVolts;
  return {
    machine: { settings, settleMs, search: null, voltsBefore: volts, settles: 0 },
    ask: { kind: 'probe', volts, dwellMs: settleMs, readBefore: false },
  };
}

export function advanceSearchPoints(
  machine: SearchPoints,
  answer: Answer,
  { plan }: StepContext,
): ProcedureTurn<SearchPoints, SearchResult> | null {
  if (answer.kind !== 'probed') return null;
  const { volts, output } = answer;
  const search = machine.search
    ? observeSearch(machine.search, { voltsBefore: machine.voltsBefore, volts, output })
    : beginSearch(machine.settings, { volts, output });
  const command = nextSearchCommand(search);
  if (command.kind === 'finished') return { result: command.result };
  const dwellMs = command.dwell === 'settle' ? machine.settleMs : plan.commissioning.waypointMs;
  return {
    machine: { ...machine, search, voltsBefore: volts, settles: machine.settles + 1 },
    ask: { kind: 'probe', volts: command.volts, dwellMs, readBefore: false },
  };
}
