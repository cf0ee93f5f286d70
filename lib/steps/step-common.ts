import { z } from 'zod';

/**
 * Common to every step. `id` stays with the step through edits, so that drafts are compared and merged by it; `name` is what the
 * engineer calls it, empty for the word of its kind; a step that is not `enabled` is kept but not run.
 */
export const stepCommon = {
  id: z.string().regex(/^[a-z0-9-]{1,40}$/),
  name: z.string().max(40),
  enabled: z.boolean(),
};

export interface StepCommon {
  id: string;
  name: string;
  enabled: boolean;
}

/** What the engine takes any step to have. */
export type AnyStep = StepCommon & { kind: string };

export const volts = z.number().finite().nonnegative();
export const amps = z.number().finite().positive();
export const milliseconds = z.number().finite().nonnegative();
/** Scanner channels: 101 the board's supply, 102 its output, 103 its reference, 104 the wiper. */
export const channelNumber = z.union([z.literal(101), z.literal(102), z.literal(103), z.literal(104)]);
