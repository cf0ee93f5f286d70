import { z } from 'zod';
import { stepCommon } from '../step-common';

/** Supply off and below 2 V, lid open, paint or compound on the screw, lid closed, contact check again. */
export const schema = z.object({ ...stepCommon, kind: z.literal('seal') });
export type SealStep = z.infer<typeof schema>;
