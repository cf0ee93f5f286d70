import { z } from 'zod';
import { stepCommon } from '../step-common';

/** Something only a person can do, confirmed at the screen; with `supplyOff` the supply is off and below 2 V before it is asked. */
export const schema = z.object({
  ...stepCommon,
  kind: z.literal('instruction'),
  text: z.string().trim().min(3).max(160),
  /** A stored file (db/schema/files.ts); null: words only. */
  pictureId: z.uuid().nullable(),
  supplyOff: z.boolean(),
});
export type InstructionStep = z.infer<typeof schema>;
