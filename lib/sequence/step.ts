import { z } from 'zod';
import type { StepCommon } from '../steps/step-common';
import { stepKinds } from '../steps/step-kinds';

/** The step line of the bench groups steps under these words, in this order. */
export const stepGroups = ['seat', 'find', 'trim', 'seal', 'verify', 'check', 'record'] as const;
export type StepGroup = (typeof stepGroups)[number];

export type { StepCommon };
/** A step of any of the kinds listed in lib/steps/step-kinds.ts. */
export type Step = z.infer<(typeof stepKinds)[number]['schema']>;
export type StepKind = Step['kind'];
export type StepOf<K extends StepKind> = Extract<Step, { kind: K }>;

type StepSchema = z.ZodObject<{ kind: z.ZodLiteral<StepKind> }>;
export const stepSchema = z.discriminatedUnion(
  'kind',
  stepKinds.map(({ schema }) => schema as unknown as StepSchema) as [StepSchema, ...StepSchema[]],
) as unknown as z.ZodType<Step>;

/** Simple acceptance, or limits drawn in by `factor` times the expanded uncertainty U of the result (ILAC-G8:09/2019). */
export const decisionRuleSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('simple') }),
  z.object({ kind: z.literal('guard-band'), factor: z.number().min(0).max(3) }),
]);
export type DecisionRule = z.infer<typeof decisionRuleSchema>;

export const sequenceSchema = z.object({
  steps: z.array(stepSchema).min(2).max(80),
  decisionRule: decisionRuleSchema,
});
export type Sequence = z.infer<typeof sequenceSchema>;
