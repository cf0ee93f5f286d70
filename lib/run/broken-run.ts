import type { RunResult } from './types';

/** The result of a run that the program itself broke off: the station's fault, never the board's, and nothing is judged. */
export function brokenRun(
  supply: { confirmed: true; volts: number; by: 'meter' | 'supply' } | { confirmed: false },
  fault: { code: string; detail: string } | null = null,
): RunResult {
  return {
    verdict: 'no-verdict',
    rejectReason: null,
    likelyCause: null,
    noVerdictReason: 'interrupted',
    faultCode: fault?.code ?? null,
    faultDetail: fault?.detail ?? null,
    failingWhenStopped: false,
    supplyOff: supply.confirmed
      ? { confirmed: true, volts: supply.volts, by: supply.by }
      : { confirmed: false, volts: null, by: null },
    measurements: [],
    trimRounds: 0,
    turnsAdvised: 0,
    adjustments: [],
  };
}
