import { z } from 'zod';
import { milliseconds, stepCommon } from '../step-common';

/** Trip, release and hysteresis once more, `repeats` times, against the limits of the board type. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('verify'),
  repeats: z.number().int().min(1).max(10),
  wantedUncertaintyVolts: z.number().positive(),
  mostSettles: z.number().int().positive(),
  settleMs: milliseconds,
  mostSpreadVolts: z.number().positive(),
});
export type VerifyStep = z.infer<typeof schema>;
