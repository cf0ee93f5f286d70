import type { Ending } from '../decision/decide-verdict';
import { faultCodes } from './fault-codes';
import type { RunState } from './state';
import type { NoVerdictReason, RunEvent } from './types';

type NoVerdict = Extract<Ending, { kind: 'no-verdict' }>;

const noVerdict = (reason: NoVerdictReason, code: string | null = null): NoVerdict => ({
  kind: 'no-verdict',
  reason,
  code,
  detail: null,
  fault: null,
});

/** The ending that an event forces at any time, whatever the step; null when the step may have the event. */
export function interruptionBy(event: RunEvent, state: RunState): NoVerdict | null {
  switch (event.kind) {
    case 'stop':
      return noVerdict('operator-stop');
    case 'bench-lost':
      return noVerdict('bench-lost');
    case 'shutdown':
      return noVerdict('shutdown');
    case 'fault':
      return {
        ...noVerdict(event.reason, event.code),
        detail: { code: 'run.fault', params: { detail: event.detail } },
        fault: event.detail,
      };
    case 'lid':
      return event.closed || !energised(state) ? null : noVerdict('lid-opened', faultCodes.lidOpened);
    case 'board':
      return event.present || !energised(state)
        ? null
        : { ...noVerdict('board-removed', faultCodes.boardRemoved), detail: { code: 'run.board-removed' } };
    case 'supply-is-off':
      return event.confirmed
        ? null
        : {
            ...noVerdict('supply-fault', faultCodes.notConfirmedOff),
            detail: { code: 'run.supply-not-confirmed-off' },
          };
    default:
      return null;
  }
}

/** Supply on, or about to be: anything but asking the fixture may energise the board. */
function energised({ facts, outstanding }: RunState): boolean {
  return facts.supply.state !== 'off' || (outstanding !== null && outstanding.answer !== 'fixture-read');
}
