import { z } from 'zod';
import { milliseconds, stepCommon, volts } from '../step-common';

/** Joint search for trip and release inside a window of supply volts. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('find-points'),
  windowMinVolts: volts,
  windowMaxVolts: volts,
  wantedUncertaintyVolts: z.number().positive(),
  mostSettles: z.number().int().positive(),
  settleMs: milliseconds,
});
export type FindPointsStep = z.infer<typeof schema>;
