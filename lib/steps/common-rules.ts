import { guardBandOf } from '../decision/judge-value';
import { expectedUncertaintyAt } from '../run/expected-uncertainty';
import { commissionedSd } from '../search/overshoot-range';
import type { SequenceFinding } from '../sequence/finding';
import { firstOf } from '../sequence/enabled-steps';
import type { StationKind } from '../sequence/station-kind';
import { failing, setTo } from './failing';
import { millisecondsText, upTo, voltsText } from './number-words';
import type { AnyStep } from './step-common';
import type { RuleContext } from './step-kind';

/** The commissioned overshoot with twice its standard uncertainty, as a fraction of the step. */
export const overshootAtMost = ({ commissioning }: StationKind) => commissioning.overshoot + 2 * commissionedSd;

/** A supply that a step asks for: not above the board's maximum, nor above where the protection trips. */
export function supplyRules(
  step: AnyStep,
  field: string,
  volts: number | null,
  context: RuleContext,
): SequenceFinding[] {
  if (volts === null) return [];
  const most = context.boardType.absoluteMaximumVolts;
  const protection = firstOf(context, 'power-up')?.overvoltageVolts ?? most;
  if (volts > most) {
    return failing(true, 'error', step, {
      problem: 'supply-above-maximum',
      field,
      sentence: `${voltsText(volts)} is too high. The board bears ${voltsText(most)} at most.`,
      mend: setTo(step, field, Math.min(most, protection), voltsText(Math.min(most, protection))),
    });
  }
  return failing(volts > protection, 'error', step, {
    problem: 'supply-above-protection',
    field,
    sentence: `${voltsText(volts)} is too high. The protection switches the supply off at ${voltsText(protection)}.`,
    mend: setTo(step, field, protection, voltsText(protection)),
  });
}

/**
 * Time between the last move of the supply and a reading, for the supply's settling and the integration chosen: over more
 * cycles the noise falls with their root, and what is left of the settling has to fall as far. A settled supply has decayed
 * by four time constants (own study, simulation).
 */
export function neededSettleMs({ commissioning }: StationKind, integrationCycles = 1): number {
  return Math.ceil(commissioning.settleMs * (1 + Math.log(Math.max(1, integrationCycles)) / 8));
}

/** `severity` is a warning where the station takes its own time when that is longer. */
export function settleRules(
  step: AnyStep & { settleMs: number },
  context: RuleContext,
  severity: SequenceFinding['severity'] = 'error',
  integrationCycles = 1,
): SequenceFinding[] {
  const needed = neededSettleMs(context.station, integrationCycles);
  const of = integrationCycles > 1 ? ` before a reading over ${integrationCycles} cycles` : '';
  return failing(step.settleMs < needed, severity, step, {
    problem: 'settle-too-short',
    field: 'settleMs',
    sentence: `${millisecondsText(step.settleMs)} is too short. The supply needs ${millisecondsText(needed)} to settle${of}.`,
    mend: setTo(step, 'settleMs', needed, millisecondsText(needed)),
  });
}

/** U of a point when verified, and the guard band that follows. Volts. */
export function pointUncertainty(volts: number, context: RuleContext): { expanded: number; guard: number } {
  const expanded = expectedUncertaintyAt(volts, context, context.station.meter);
  return { expanded, guard: guardBandOf(context.decisionRule, expanded) };
}

/** Settles that a search takes with noise of about the wanted uncertainty: 50 as a rule, 75 in one board of twenty (own study). */
const usualSettles = 80;
export function settlesRules(step: AnyStep & { mostSettles: number }): SequenceFinding[] {
  return failing(step.mostSettles < usualSettles, 'warning', step, {
    problem: 'too-few-settles',
    field: 'mostSettles',
    sentence: `${step.mostSettles} settles are few. One board in twenty needs 75 or more, and one that runs out of them is rejected.`,
    mend: setTo(step, 'mostSettles', 150, '150'),
  });
}

/** Duration words for waits and soaks. */
export const longWaitMs = 10 * 60_000;
export const minutesText = (milliseconds: number) => `${upTo(milliseconds / 60_000, 0)} min`;
