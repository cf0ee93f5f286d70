import { z } from 'zod';
import { stepCommon } from '../step-common';

/** Supply off with read-back, verdict, label or red bin. Always last. */
export const schema = z.object({ ...stepCommon, kind: z.literal('record') });
export type RecordStep = z.infer<typeof schema>;
