import { z } from 'zod';
import { amps, milliseconds, stepCommon, volts } from '../step-common';

/** Current limit and overvoltage protection first, then the supply. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('power-up'),
  volts,
  currentLimitAmps: amps,
  overvoltageVolts: volts,
  settleMs: milliseconds,
});
export type PowerUpStep = z.infer<typeof schema>;
