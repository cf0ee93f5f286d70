import { z } from 'zod';
import { channelNumber, stepCommon, volts } from '../step-common';

/** Reads a channel again and again: the fitted straight line must not move by more than `mostDriftVolts` over the soak. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('soak'),
  channel: channelNumber,
  atVolts: volts.nullable(),
  readings: z.number().int().min(3).max(500),
  everyMs: z.number().min(20).max(600_000),
  mostDriftVolts: z.number().positive(),
});
export type SoakStep = z.infer<typeof schema>;
