import { z } from 'zod';
import { roles } from '../access/roles';

/** What the list of people shows, from the address; anything unknown falls back. */
export const peopleFilterSchema = z.object({
  state: z.enum(['active', 'locked', 'closed', 'all']).catch('active'),
  role: z.enum(roles).nullable().catch(null).default(null),
  named: z.string().trim().max(60).catch('').default(''),
  /** The person shown beside the list. */
  who: z.uuid().nullable().catch(null).default(null),
});
export type PeopleFilter = z.infer<typeof peopleFilterSchema>;
