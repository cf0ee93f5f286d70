import { z } from 'zod';
import { stepCommon } from '../step-common';

/** A question that only a person can answer, such as whether the lamp lights. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('operator-check'),
  question: z.string().min(3).max(120),
});
export type OperatorCheckStep = z.infer<typeof schema>;
