import type { NoVerdictReason, RunEffect } from '@/lib/run/types';
import {
  instrumentErrorCodes,
  isInstrumentError,
  noVerdictReasonOf,
  type InstrumentName,
} from '../instruments/instrument-error';

/** What failed while the station acted, as the run is told. `code` is printed for the engineer: S supply, M meter, F fixture. */
export interface Fault {
  reason: NoVerdictReason;
  code: string;
  detail: string;
}

const base: Record<InstrumentName, [string, number]> = {
  supply: ['S', 204],
  meter: ['M', 304],
  controller: ['F', 204],
};

/** Anything unforeseen ends a run too, with R-903: the supply must go off. S-204, M-304 and F-204 stand for no answer; the next numbers follow `instrumentErrorCodes`. */
export function faultOf(error: unknown): Fault {
  if (isFault(error)) return error.fault;
  if (isInstrumentError(error)) {
    const [letter, first] = base[error.instrument];
    const code = `${letter}-${first + instrumentErrorCodes.indexOf(error.code)}`;
    return { reason: noVerdictReasonOf(error), code, detail: error.message };
  }
  const detail = error instanceof Error ? error.message : String(error);
  return { reason: 'interrupted', code: 'R-903', detail };
}

/** A fault that the station itself found, not an instrument's complaint. */
export class StationFault extends Error {
  override readonly name = 'StationFault';
  constructor(readonly fault: Fault) {
    super(fault.detail);
  }
}

function isFault(error: unknown): error is StationFault {
  return error instanceof Error && error.name === 'StationFault' && 'fault' in error;
}

export function overvoltageFault(commandedVolts: number): StationFault {
  return new StationFault({
    reason: 'overvoltage-tripped',
    code: 'S-220',
    detail: `The supply's overvoltage protection tripped at a command of ${commandedVolts.toFixed(3)} V.`,
  });
}

const instrumentOf: Partial<Record<RunEffect['kind'], NoVerdictReason>> = {
  'read-fixture': 'fixture-fault',
  pulse: 'fixture-fault',
  'prepare-supply': 'supply-fault',
  'supply-on': 'supply-fault',
};

/** The watchdog's: an effect made no progress although every instrument has deadlines of its own. */
export function stalledFault(effect: RunEffect): Fault {
  return {
    reason: instrumentOf[effect.kind] ?? 'meter-fault',
    code: 'R-902',
    detail: `The station made no progress with ${effect.kind}.`,
  };
}
