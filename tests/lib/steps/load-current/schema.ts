import { z } from 'zod';
import { amps, milliseconds, stepCommon } from '@/lib/steps/step-common';

/** The board's current at the standing supply against a limit of its own. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('load-current'),
  settleMs: milliseconds,
  mostAmps: amps,
});
export type LoadCurrentStep = z.infer<typeof schema>;
