import type { Ending } from '../../decision/decide-verdict';
import { canTrimReach } from '../../trim/reach';
import type { FoundPoints, TrimSettings } from '../../trim/types';
import { causeOfHysteresis } from '../../run/likely-cause';
import type { StepContext } from '../../run/machine';

/**
 * The reject of a board for which no setting of the trimmer meets all limits; null when one does. The value is what would
 * be measured at the best setting.
 */
export function refuseUntrimmable(
  settings: TrimSettings,
  found: FoundPoints,
  { plan, facts }: StepContext,
): Ending | null {
  const { design, limits } = plan.boardType;
  const reach = canTrimReach(settings, found, limits);
  if (reach.reachable) return null;
  const measured = { value: reach.bestVolts, unit: 'V', limit: reach.limitVolts };
  if (reach.reason === 'trip-too-low' || reach.reason === 'trip-too-high') {
    return { kind: 'reject', reason: 'trim-cannot-reach', cause: null, measured };
  }
  const cause = causeOfHysteresis(found, facts.reference, design);
  return { kind: 'reject', reason: reach.reason, cause, measured };
}
