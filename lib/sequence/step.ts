import { z } from 'zod';

/** The step line of the bench groups steps under these words, in this order. */
export const stepGroups = ['seat', 'find', 'trim', 'seal', 'verify', 'check', 'record'] as const;
export type StepGroup = (typeof stepGroups)[number];

const volts = z.number().finite().nonnegative();
const amps = z.number().finite().positive();
const milliseconds = z.number().finite().nonnegative();

/** Lid, board present, then a contact check at low voltage and low current. */
export const seatStep = z.object({
  kind: z.literal('seat'),
  contactCheck: z.object({ volts, currentLimitAmps: amps, mostMilliohms: z.number().positive() }),
});
/** Current limit and overvoltage protection first, then the supply. */
export const powerUpStep = z.object({
  kind: z.literal('power-up'),
  volts,
  currentLimitAmps: amps,
  overvoltageVolts: volts,
  settleMs: milliseconds,
});
/** Channel 103 near the supply voltage given, against the reference limits of the board type. */
export const referenceStep = z.object({ kind: z.literal('reference'), atVolts: volts, settleMs: milliseconds });
/** Joint search for trip and release inside a window of supply volts. */
export const findPointsStep = z.object({
  kind: z.literal('find-points'),
  windowMinVolts: volts,
  windowMaxVolts: volts,
  wantedUncertaintyVolts: z.number().positive(),
  mostSettles: z.number().int().positive(),
  settleMs: milliseconds,
});
export const trimProcedures = ['two-beeps', 'prompted', 'wiper-probe'] as const;
export const trimStep = z.object({
  kind: z.literal('trim'),
  procedure: z.enum(trimProcedures),
  targetVolts: volts,
  toleranceVolts: z.number().positive(),
  mostRounds: z.number().int().positive(),
});
/** Supply off and below 2 V, lid open, paint or compound on the screw, lid closed, contact check again. */
export const sealStep = z.object({ kind: z.literal('seal') });
/** Trip, release and hysteresis once more, `repeats` times, against the limits of the board type. */
export const verifyStep = z.object({
  kind: z.literal('verify'),
  repeats: z.number().int().min(1).max(10),
  wantedUncertaintyVolts: z.number().positive(),
  mostSettles: z.number().int().positive(),
  settleMs: milliseconds,
  mostSpreadVolts: z.number().positive(),
});
export const outputLevelsStep = z.object({ kind: z.literal('output-levels'), settleMs: milliseconds });
export const quiescentStep = z.object({ kind: z.literal('quiescent-current'), settleMs: milliseconds });
export const rideThroughStep = z.object({
  kind: z.literal('ride-through'),
  milliseconds: z.number().positive().max(1000),
  atVolts: volts,
});
/** A question that only a person can answer, such as whether the lamp lights. */
export const operatorCheckStep = z.object({ kind: z.literal('operator-check'), question: z.string().min(3).max(120) });
/** Supply off with read-back, verdict, label or red bin. Always last. */
export const recordStep = z.object({ kind: z.literal('record') });

export const stepSchema = z.discriminatedUnion('kind', [
  seatStep,
  powerUpStep,
  referenceStep,
  findPointsStep,
  trimStep,
  sealStep,
  verifyStep,
  outputLevelsStep,
  quiescentStep,
  rideThroughStep,
  operatorCheckStep,
  recordStep,
]);
export type Step = z.infer<typeof stepSchema>;
export type StepKind = Step['kind'];

/** Simple acceptance, or limits drawn in by `factor` times the expanded uncertainty U of the result (ILAC-G8:09/2019). */
export const decisionRuleSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('simple') }),
  z.object({ kind: z.literal('guard-band'), factor: z.number().min(0).max(3) }),
]);
export type DecisionRule = z.infer<typeof decisionRuleSchema>;

export const sequenceSchema = z.object({
  steps: z.array(stepSchema).min(2),
  decisionRule: decisionRuleSchema,
});
export type Sequence = z.infer<typeof sequenceSchema>;

export const stepGroupOf: Record<StepKind, StepGroup> = {
  seat: 'seat',
  'power-up': 'seat',
  reference: 'seat',
  'find-points': 'find',
  trim: 'trim',
  seal: 'seal',
  verify: 'verify',
  'output-levels': 'check',
  'quiescent-current': 'check',
  'ride-through': 'check',
  'operator-check': 'check',
  record: 'record',
};
