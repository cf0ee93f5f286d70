import { z } from 'zod';
import { stepCommon, volts } from '../step-common';

export const trimProcedures = ['two-beeps', 'prompted', 'wiper-probe'] as const;

/** Tells the operator which way and how far, until the trip point lies within the tolerance of its target. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('trim'),
  procedure: z.enum(trimProcedures),
  targetVolts: volts,
  toleranceVolts: z.number().positive(),
  mostRounds: z.number().int().positive(),
});
export type TrimStep = z.infer<typeof schema>;
