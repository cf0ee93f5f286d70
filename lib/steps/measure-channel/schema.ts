import { z } from 'zod';
import { channelNumber, milliseconds, stepCommon, volts } from '../step-common';

/** A channel against limits, with the supply as it stands or brought to `atVolts` first. A bound that is null is not judged. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('measure-channel'),
  channel: channelNumber,
  atVolts: volts.nullable(),
  settleMs: milliseconds,
  integrationCycles: z.number().min(0.02).max(100),
  minVolts: z.number().finite().nullable(),
  maxVolts: z.number().finite().nullable(),
});
export type MeasureChannelStep = z.infer<typeof schema>;
