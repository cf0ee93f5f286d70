import type { SeatStep } from '../../steps/seat/schema';
import type { Answer, Ask, ProcedureTurn, StepContext } from '../machine';

export type ContactSettings = SeatStep['contactCheck'];

export interface ContactCheck {
  settings: ContactSettings;
  boardVolts: number | null;
  milliohms: number | null;
}

/** `milliohms` is Infinity when no voltage reaches the board. */
export interface ContactResult {
  holds: boolean;
  milliohms: number;
}

/** Below this share of the sense voltage nothing worth the name reaches the board's terminals. */
const openShare = 0.5;
const leastAmps = 1e-6;

/**
 * Contact resistance at low voltage and low current: (sense voltage - channel 101) / current. Leaves the supply off,
 * read back. Ends `holds` when the resistance is within the limit.
 */
export function beginContactCheck(settings: ContactSettings): { machine: ContactCheck; ask: Ask } {
  return {
    machine: { settings, boardVolts: null, milliohms: null },
    ask: {
      kind: 'prepare-supply',
      currentLimitAmps: settings.currentLimitAmps,
      overvoltageVolts: settings.volts + overvoltageMarginVolts,
    },
  };
}
const overvoltageMarginVolts = 1;

export function advanceContactCheck(
  machine: ContactCheck,
  answer: Answer,
  context: StepContext,
): ProcedureTurn<ContactCheck, ContactResult> | null {
  switch (answer.kind) {
    case 'prepared':
      return {
        machine,
        ask: { kind: 'supply-on', volts: machine.settings.volts, settleMs: settleMs(machine.settings, context) },
      };
    case 'supply-is-on':
      return { machine, ask: { kind: 'measure', channel: 101, integrationCycles: 1 } };
    case 'measured':
      return { machine: { ...machine, boardVolts: answer.volts }, ask: { kind: 'measure-supply' } };
    case 'supply-measured':
      return {
        machine: { ...machine, milliohms: contactMilliohms(answer.volts, machine.boardVolts ?? 0, answer.amps) },
        ask: { kind: 'supply-off' },
      };
    case 'supply-is-off': {
      const milliohms = machine.milliohms ?? Infinity;
      return { result: { holds: milliohms <= machine.settings.mostMilliohms, milliohms } };
    }
    default:
      return null;
  }
}

/** Sense and board voltages in volts, current in amperes. A drop below zero is reading error and counts as none. */
export function contactMilliohms(senseVolts: number, boardVolts: number, amps: number): number {
  if (boardVolts < openShare * senseVolts && amps < 1e-4) return Infinity;
  return (Math.max(0, senseVolts - boardVolts) / Math.max(amps, leastAmps)) * 1000;
}

/** The reservoir is charged at the current limit first; twice its nominal time, for its tolerance and the board's own share. */
function settleMs({ volts, currentLimitAmps }: ContactSettings, { plan }: StepContext): number {
  const chargeMs = (plan.boardType.design.reservoirFarads * volts * 1000) / currentLimitAmps;
  return Math.ceil(plan.commissioning.settleMs + 2 * chargeMs);
}
