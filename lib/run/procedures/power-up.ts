import type { PowerUpStep } from '../../steps/power-up/schema';
import { faultCodes } from '../fault-codes';
import type { Answer, Ask, Learned, ProcedureTurn, StepContext } from '../machine';
import type { Ending } from '../../decision/decide-verdict';
import type { Measurement } from '../types';

export type PowerUpSettings = PowerUpStep;
export interface PowerUp {
  settings: PowerUpSettings;
}
export type PowerUpResult = Learned & { ending: Ending | null };

/** A supply within this share of its current limit is limiting. */
const atLimitShare = 0.97;

/** Current limit and overvoltage protection first, then the supply. Ends the run when the board draws all it may. */
export function beginPowerUp(settings: PowerUpSettings): { machine: PowerUp; ask: Ask } {
  const { currentLimitAmps, overvoltageVolts } = settings;
  return { machine: { settings }, ask: { kind: 'prepare-supply', currentLimitAmps, overvoltageVolts } };
}

export function advancePowerUp(
  machine: PowerUp,
  answer: Answer,
  context: StepContext,
): ProcedureTurn<PowerUp, PowerUpResult> | null {
  const { settings } = machine;
  if (answer.kind === 'prepared') {
    return { machine, ask: { kind: 'supply-on', volts: settings.volts, settleMs: settings.settleMs } };
  }
  if (answer.kind === 'supply-is-on') return { result: judge(settings, answer.volts, answer.amps, context) };
  return null;
}

function judge(settings: PowerUpSettings, volts: number, amps: number, context: StepContext): PowerUpResult {
  const limitAmps = settings.currentLimitAmps * atLimitShare;
  const passed = amps < limitAmps;
  const measurement: Measurement = {
    quantity: 'supply-amps',
    phase: 'check',
    value: amps,
    standardUncertainty: null,
    expandedUncertainty: null,
    min: null,
    max: settings.currentLimitAmps,
    guardedMin: null,
    guardedMax: limitAmps,
    passed,
    stepIndex: context.stepIndex,
    settles: null,
  };
  const measurements = [measurement];
  if (!passed) {
    return {
      measurements,
      ending: {
        kind: 'reject',
        reason: 'supply-current-at-limit',
        cause: 'short-or-reversed-part',
        measured: { value: amps, unit: 'A', limit: settings.currentLimitAmps },
      },
    };
  }
  if (volts < settings.volts / 2) {
    return {
      measurements,
      ending: {
        kind: 'no-verdict',
        reason: 'supply-fault',
        code: faultCodes.supplyTooLow,
        detail: { code: 'run.supply-too-low', params: { volts, wantedVolts: settings.volts } },
        fault: null,
      },
    };
  }
  return { measurements, ending: null };
}
