import { z } from 'zod';

/** The step line of the bench groups steps under these words, in this order. */
export const stepGroups = ['seat', 'find', 'trim', 'seal', 'verify', 'check', 'record'] as const;
export type StepGroup = (typeof stepGroups)[number];

/**
 * Common to every step. `id` stays with the step through edits, so that drafts are compared and merged by it; `name` is what the
 * engineer calls it, empty for the word of its kind; a step that is not `enabled` is kept but not run.
 */
export const stepCommon = {
  id: z.string().regex(/^[a-z0-9-]{1,40}$/),
  name: z.string().max(40),
  enabled: z.boolean(),
};

const volts = z.number().finite().nonnegative();
const amps = z.number().finite().positive();
const milliseconds = z.number().finite().nonnegative();
/** Scanner channels: 101 the board's supply, 102 its output, 103 its reference, 104 the wiper. */
const channelNumber = z.union([z.literal(101), z.literal(102), z.literal(103), z.literal(104)]);

/** Lid, board present, then a contact check at low voltage and low current. */
export const seatStep = z.object({
  ...stepCommon,
  kind: z.literal('seat'),
  contactCheck: z.object({ volts, currentLimitAmps: amps, mostMilliohms: z.number().positive() }),
});
/** Current limit and overvoltage protection first, then the supply. */
export const powerUpStep = z.object({
  ...stepCommon,
  kind: z.literal('power-up'),
  volts,
  currentLimitAmps: amps,
  overvoltageVolts: volts,
  settleMs: milliseconds,
});
/** Channel 103 near the supply voltage given, against the reference limits of the board type. */
export const referenceStep = z.object({
  ...stepCommon,
  kind: z.literal('reference'),
  atVolts: volts,
  settleMs: milliseconds,
});
/** Joint search for trip and release inside a window of supply volts. */
export const findPointsStep = z.object({
  ...stepCommon,
  kind: z.literal('find-points'),
  windowMinVolts: volts,
  windowMaxVolts: volts,
  wantedUncertaintyVolts: z.number().positive(),
  mostSettles: z.number().int().positive(),
  settleMs: milliseconds,
});
export const trimProcedures = ['two-beeps', 'prompted', 'wiper-probe'] as const;
export const trimStep = z.object({
  ...stepCommon,
  kind: z.literal('trim'),
  procedure: z.enum(trimProcedures),
  targetVolts: volts,
  toleranceVolts: z.number().positive(),
  mostRounds: z.number().int().positive(),
});
/** Supply off and below 2 V, lid open, paint or compound on the screw, lid closed, contact check again. */
export const sealStep = z.object({ ...stepCommon, kind: z.literal('seal') });
/** Trip, release and hysteresis once more, `repeats` times, against the limits of the board type. */
export const verifyStep = z.object({
  ...stepCommon,
  kind: z.literal('verify'),
  repeats: z.number().int().min(1).max(10),
  wantedUncertaintyVolts: z.number().positive(),
  mostSettles: z.number().int().positive(),
  settleMs: milliseconds,
  mostSpreadVolts: z.number().positive(),
});
export const outputLevelsStep = z.object({ ...stepCommon, kind: z.literal('output-levels'), settleMs: milliseconds });
export const quiescentStep = z.object({ ...stepCommon, kind: z.literal('quiescent-current'), settleMs: milliseconds });
export const rideThroughStep = z.object({
  ...stepCommon,
  kind: z.literal('ride-through'),
  milliseconds: z.number().positive().max(1000),
  atVolts: volts,
});
/** A question that only a person can answer, such as whether the lamp lights. */
export const operatorCheckStep = z.object({
  ...stepCommon,
  kind: z.literal('operator-check'),
  question: z.string().min(3).max(120),
});
/** A channel against limits, with the supply as it stands or brought to `atVolts` first. A bound that is null is not judged. */
export const measureChannelStep = z.object({
  ...stepCommon,
  kind: z.literal('measure-channel'),
  channel: channelNumber,
  atVolts: volts.nullable(),
  settleMs: milliseconds,
  integrationCycles: z.number().min(0.02).max(100),
  minVolts: z.number().finite().nullable(),
  maxVolts: z.number().finite().nullable(),
});
/** Brings the supply to a voltage, on the side of the points given by how it gets there, and waits. */
export const applyVoltageStep = z.object({
  ...stepCommon,
  kind: z.literal('apply-voltage'),
  volts,
  waitMs: milliseconds,
});
/** Reads a channel again and again: the fitted straight line must not move by more than `mostDriftVolts` over the soak. */
export const soakStep = z.object({
  ...stepCommon,
  kind: z.literal('soak'),
  channel: channelNumber,
  atVolts: volts.nullable(),
  readings: z.number().int().min(3).max(500),
  everyMs: z.number().min(20).max(600_000),
  mostDriftVolts: z.number().positive(),
});
export const branchQuantities = [
  'trip-volts',
  'release-volts',
  'hysteresis-volts',
  'reference-volts',
  'channel-volts',
  'drift-volts',
] as const;
/** Goes on at the step `goTo` when the newest value of `quantity` lies below or above `value`; at most `mostTimes` in a run. */
export const branchStep = z.object({
  ...stepCommon,
  kind: z.literal('branch'),
  quantity: z.enum(branchQuantities),
  is: z.enum(['below', 'above']),
  value: z.number().finite(),
  /** `id` of a step of this sequence. */
  goTo: z.string(),
  mostTimes: z.number().int().min(1).max(5),
});
/** Something only a person can do, confirmed at the screen; with `supplyOff` the supply is off and below 2 V before it is asked. */
export const instructionStep = z.object({
  ...stepCommon,
  kind: z.literal('instruction'),
  text: z.string().trim().min(3).max(160),
  /** A stored file (db/schema/files.ts); null: words only. */
  pictureId: z.uuid().nullable(),
  supplyOff: z.boolean(),
});
/** Supply off with read-back, verdict, label or red bin. Always last. */
export const recordStep = z.object({ ...stepCommon, kind: z.literal('record') });

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
export type StepCommon = Pick<Step, 'id' | 'name' | 'enabled'>;
export type StepOf<K extends StepKind> = Extract<Step, { kind: K }>;

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
