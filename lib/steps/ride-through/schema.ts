import { z } from 'zod';
import { stepCommon, volts } from '../step-common';

/** The supply interrupted for so long; the output must stay on. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('ride-through'),
  milliseconds: z.number().positive().max(1000),
  atVolts: volts,
});
export type RideThroughStep = z.infer<typeof schema>;
