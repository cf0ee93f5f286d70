import { z } from 'zod';
import { milliseconds, stepCommon } from '../step-common';

/** The high output, as its drop below the supply, and the low output. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('output-levels'),
  settleMs: milliseconds,
});
export type OutputLevelsStep = z.infer<typeof schema>;
