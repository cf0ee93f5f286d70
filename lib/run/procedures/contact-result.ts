import type { Ending } from '../../decision/decide-verdict';
import { faultCodes } from '../fault-codes';
import type { StepContext } from '../machine';
import type { ContactResult, ContactSettings } from '../procedures/contact-check';
import type { Measurement } from '../types';

/** Stands for an open contact, whose resistance is beyond what can be told; JSON has no infinity. */
const openMilliohms = 1e9;

/** A failed contact is the fixture's: it is noted, and judged only when it holds, so that it never rejects a board. */
export function contactMeasurement(
  { holds, milliohms }: ContactResult,
  settings: ContactSettings,
  { stepIndex }: StepContext,
): Measurement {
  return {
    quantity: 'contact-milliohms',
    phase: 'check',
    value: Math.min(milliohms, openMilliohms),
    standardUncertainty: null,
    expandedUncertainty: null,
    min: null,
    max: settings.mostMilliohms,
    guardedMin: null,
    guardedMax: settings.mostMilliohms,
    passed: holds ? true : null,
    stepIndex,
    settles: null,
  };
}

export function contactLost({ milliohms }: ContactResult): Ending {
  const open = !Number.isFinite(milliohms);
  return {
    kind: 'no-verdict',
    reason: 'contact-lost',
    code: open ? faultCodes.contactOpen : faultCodes.contactTooHigh,
    detail: open
      ? { code: 'run.contact-open' }
      : { code: 'run.contact-too-high', params: { ohms: Number((milliohms / 1000).toPrecision(3)) } },
    fault: null,
  };
}
