import { z } from 'zod';

const reason = z
  .string()
  .trim()
  .min(1, { error: 'Enter the reason.' })
  .max(300, { error: 'Use at most 300 characters.' });
/** Signing asks for the password again. */
const password = z.string().min(1, { error: 'Enter your password.' }).max(200);

/** What is decided about a rejected or waiting board. Concessions and returns come with later work. */
export const signedDispositionKinds = ['rework', 'scrap'] as const;

export const dispositionSchema = z
  .object({
    unitId: z.uuid(),
    kind: z.enum(signedDispositionKinds, { error: 'Choose what is to be done.' }),
    /** What was done to the board. */
    action: z.string().trim().max(300, { error: 'Use at most 300 characters.' }),
    reason,
    password,
  })
  .refine(({ kind, action }) => kind !== 'rework' || action.length > 0, {
    error: 'Enter what was done to the board.',
    path: ['action'],
  });
export type DispositionForm = z.infer<typeof dispositionSchema>;

export const retestOrderSchema = z.object({ unitId: z.uuid(), reason, password });
export type RetestOrderForm = z.infer<typeof retestOrderSchema>;

export const printAgainSchema = z.object({ unitId: z.uuid() });
