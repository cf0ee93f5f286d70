import { z } from 'zod';
import { amps, stepCommon, volts } from '../step-common';

/** Lid, board present, then a contact check at low voltage and low current. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('seat'),
  contactCheck: z.object({ volts, currentLimitAmps: amps, mostMilliohms: z.number().positive() }),
});
export type SeatStep = z.infer<typeof schema>;
