import { z } from 'zod';
import { milliseconds, stepCommon, volts } from '../step-common';

/** Brings the supply to a voltage, on the side of the points given by how it gets there, and waits. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('apply-voltage'),
  volts,
  waitMs: milliseconds,
});
export type ApplyVoltageStep = z.infer<typeof schema>;
