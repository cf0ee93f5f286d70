import { z } from 'zod';

/** The query part of the address of the list of boards; anything unknown falls back to the first choice. */
export const unitFilterSchema = z.object({
  show: z.enum(['all', 'reject', 'no-verdict', 'pass']).catch('all'),
  station: z.string().min(1).max(20).nullable().catch(null),
});
export type UnitFilter = z.infer<typeof unitFilterSchema>;
