import { z } from 'zod';
import { milliseconds, stepCommon, volts } from '../step-common';

/** Channel 103 near the supply voltage given, against the reference limits of the board type. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('reference'),
  atVolts: volts,
  settleMs: milliseconds,
});
export type ReferenceStep = z.infer<typeof schema>;
