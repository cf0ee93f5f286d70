import { z } from 'zod';

/** A person was trained for a board type; valid through the day. */
export const trainingSchema = z.object({
  accountId: z.uuid({ error: 'Choose a person.' }),
  boardTypeId: z.uuid({ error: 'Choose a board type.' }),
  validUntil: z.iso.date({ error: 'Enter the last day as year-month-day.' }),
});
export type TrainingForm = z.infer<typeof trainingSchema>;
