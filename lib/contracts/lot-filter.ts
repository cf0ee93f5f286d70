import { z } from 'zod';
import { lotStates } from './stored-states';

export const lotSpans = { '30d': 30, '7d': 7, '1d': 1, all: null } as const;

/** The query part of the address of the list of lots; anything unknown falls back to the first choice. */
export const lotFilterSchema = z.object({
  state: z.enum([...lotStates, 'held', 'all']).catch('open'),
  station: z.string().min(1).max(20).nullable().catch(null),
  from: z.enum(Object.keys(lotSpans) as [keyof typeof lotSpans, ...(keyof typeof lotSpans)[]]).catch('30d'),
});
export type LotListFilter = z.infer<typeof lotFilterSchema>;
