import { z } from 'zod';
import { stepCommon } from '../step-common';

export const branchQuantities = [
  'trip-volts',
  'release-volts',
  'hysteresis-volts',
  'reference-volts',
  'channel-volts',
  'drift-volts',
] as const;

/** Goes on at the step `goTo` when the newest value of `quantity` lies below or above `value`; at most `mostTimes` in a run. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('branch'),
  quantity: z.enum(branchQuantities),
  is: z.enum(['below', 'above']),
  value: z.number().finite(),
  /** `id` of a step of this sequence. */
  goTo: z.string(),
  mostTimes: z.number().int().min(1).max(5),
});
export type BranchStep = z.infer<typeof schema>;
