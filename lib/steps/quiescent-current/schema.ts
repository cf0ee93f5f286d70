import { z } from 'zod';
import { milliseconds, stepCommon } from '../step-common';

/** The board's own current, its load off. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('quiescent-current'),
  settleMs: milliseconds,
});
export type QuiescentCurrentStep = z.infer<typeof schema>;
