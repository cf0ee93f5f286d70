import { z } from 'zod';

const ohms = z.number().finite().nonnegative();
const positive = z.number().finite().positive();

export const boardDesignSchema = z.object({
  reference: z.object({ nominalVolts: positive, ratedAmps: positive, kneeVolts: positive, feedOhms: positive }),
  trimmerOhms: positive,
  supplyEndOhms: ohms,
  groundEndOhms: ohms,
  feedbackOhms: positive,
  outputDropVolts: z.number().nonnegative(),
  outputLowVolts: z.number().nonnegative(),
  loadOhms: positive,
  quiescentAmps: z.number().nonnegative(),
  reservoirFarads: z.number().nonnegative(),
});

export const trimmerTravelSchema = z.object({
  turns: positive.max(40),
  clockwise: z.enum(['raises', 'lowers']),
  backlashTurns: z.number().nonnegative().max(0.5),
});

const band = z
  .object({ min: z.number().finite(), max: z.number().finite() })
  .refine((b) => b.max > b.min, { error: 'The upper limit must be above the lower limit.' });

/** Limits belong to the board type's specification. Volts, amperes, seconds. */
export const boardLimitsSchema = z.object({
  tripVolts: band,
  releaseVolts: band,
  hysteresisVolts: band,
  referenceVolts: band,
  /** High output is supply minus drop, so the limit is on the drop. */
  outputHighDropVolts: z.object({ max: positive }),
  outputLowVolts: z.object({ max: positive }),
  quiescentAmps: z.object({ max: positive }),
  rideThroughSeconds: z.object({ min: positive }),
});
export type BoardLimits = z.infer<typeof boardLimitsSchema>;

/** How the state of the output is told: from channel 102 (high means on) or from the step in supply current. */
export const outputSensingSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('output-voltage'), thresholdVolts: positive }),
  z.object({ kind: z.literal('load-current'), thresholdAmps: positive }),
]);
export type OutputSensing = z.infer<typeof outputSensingSchema>;

/** Where the search may look. The coupling only speeds it up; evidence drops it. Volts. */
export const searchRangesSchema = z.object({
  supplyMinVolts: positive,
  tripVolts: band,
  hysteresisVolts: band,
  /** Comparator noise at the supply terminals, one standard deviation. */
  noiseVolts: positive,
});

export const boardTypeSchema = z.object({
  code: z.string().regex(/^[A-Z0-9]{3,12}$/, { error: 'Use 3 to 12 capitals and digits.' }),
  name: z.string().min(3).max(80),
  design: boardDesignSchema,
  trimmer: trimmerTravelSchema,
  limits: boardLimitsSchema,
  search: searchRangesSchema,
  /** Never exceeded at the board's terminals, overshoot included. */
  absoluteMaximumVolts: positive,
  sensing: outputSensingSchema,
  /** Regular expression that a serial number of this type matches, such as ^CB1210\d{4}\d{5}$ */
  serialPattern: z.string().min(3).max(120),
  mostAttempts: z.number().int().min(1).max(10),
});
/** A board type as the engine and the simulator see it. */
export type BoardType = z.infer<typeof boardTypeSchema>;
