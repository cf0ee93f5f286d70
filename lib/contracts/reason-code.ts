import { z } from 'zod';
import { reasonCodeUses, type ReasonCodeUse } from './stored-states';

/** A reason that may be chosen. */
export interface ReasonChoice {
  id: string;
  use: ReasonCodeUse;
  word: string;
}

/** One row of the page of reason codes. */
export interface ReasonCodeRow extends ReasonChoice {
  createdByName: string;
  createdIso: string;
  /** Null: may be chosen. */
  retiredIso: string | null;
  /** Word of the code that counts in its place. */
  mergedInto: string | null;
  /** Decisions that name it. */
  used: number;
}

export const newReasonCodeSchema = z.object({
  use: z.enum(reasonCodeUses, { error: 'Choose what it is a reason for.' }),
  word: z.string().trim().min(1, { error: 'Enter the reason.' }).max(80, { error: 'Use at most 80 characters.' }),
});
export type NewReasonCodeForm = z.infer<typeof newReasonCodeSchema>;

/** `retired` false brings it back. */
export const retireReasonCodeSchema = z.object({ id: z.uuid(), retired: z.boolean() });

export const mergeReasonCodeSchema = z.object({
  id: z.uuid(),
  intoId: z.uuid({ error: 'Choose the reason that counts in its place.' }),
});
export type MergeReasonCodeForm = z.infer<typeof mergeReasonCodeSchema>;
