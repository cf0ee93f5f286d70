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

/** Part tolerances as fractions of the nominal value, the comparator's offset in volts at its inputs. Parts lie within, not beyond. */
const tolerance = z.number().min(0).max(0.5, { error: 'A tolerance is at most 50 %.' });
export const partTolerancesSchema = z.object({
  referenceVolts: tolerance,
  referenceKnee: tolerance,
  feedOhms: tolerance,
  trimmerOhms: tolerance,
  supplyEndOhms: tolerance,
  groundEndOhms: tolerance,
  feedbackOhms: tolerance,
  outputDropVolts: tolerance,
  outputLowVolts: tolerance,
  loadOhms: tolerance,
  quiescentAmps: tolerance,
  reservoirFarads: tolerance,
  comparatorOffsetVolts: z.number().min(0).max(0.1),
});
export type PartTolerances = z.infer<typeof partTolerancesSchema>;

/** What a board type has that does not give its own, and what the simulator drew before they were kept. */
export const usualTolerances: PartTolerances = {
  referenceVolts: 0.02,
  referenceKnee: 0.1,
  feedOhms: 0.01,
  trimmerOhms: 0.1,
  supplyEndOhms: 0.01,
  groundEndOhms: 0.01,
  feedbackOhms: 0.01,
  outputDropVolts: 0.08,
  outputLowVolts: 0.3,
  loadOhms: 0.05,
  quiescentAmps: 0.15,
  reservoirFarads: 0.2,
  comparatorOffsetVolts: 0,
};

/** Where the trimmer sits on a photograph, as fractions of its width and height. */
export const trimmerFrameSchema = z.object({
  x: z.number().min(0).max(1),
  y: z.number().min(0).max(1),
  width: z.number().min(0.02).max(1),
  height: z.number().min(0.02).max(1),
});
export type TrimmerFrame = z.infer<typeof trimmerFrameSchema>;
const trimmerPhotoSchema = z.object({ fileId: z.uuid(), frame: trimmerFrameSchema });
export type TrimmerPhoto = z.infer<typeof trimmerPhotoSchema>;

/** Lines of the label beside barcode and serial; the label itself is 40 by 20 mm. */
export const labelLayoutSchema = z.object({ typeLine: z.boolean(), pointsLine: z.boolean() });
export type LabelLayout = z.infer<typeof labelLayoutSchema>;

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
  /** Absent: the usual ones. */
  tolerances: partTolerancesSchema.optional(),
  trimmer: trimmerTravelSchema,
  /** How the travel is spoken of. Absent: turns where there is more than one, else degrees. */
  travelUnit: z.enum(['turns', 'degrees']).optional(),
  limits: boardLimitsSchema,
  search: searchRangesSchema,
  /** Never exceeded at the board's terminals, overshoot included. */
  absoluteMaximumVolts: positive,
  sensing: outputSensingSchema,
  /** Regular expression that a serial number of this type matches, such as ^CB1210\d{4}\d{5}$ */
  serialPattern: z.string().min(3).max(120),
  mostAttempts: z.number().int().min(1).max(10),
  /** Absent: both lines. */
  label: labelLayoutSchema.optional(),
  /** Photograph of the board, shown where turning has no effect. Absent: none. */
  trimmerPhoto: trimmerPhotoSchema.optional(),
  fixtureDrawing: z.object({ fileId: z.uuid() }).optional(),
});
/** A board type as the engine and the simulator see it. */
export type BoardType = z.infer<typeof boardTypeSchema>;

export function tolerancesOf({ tolerances }: Pick<BoardType, 'tolerances'>): PartTolerances {
  return tolerances ?? usualTolerances;
}
