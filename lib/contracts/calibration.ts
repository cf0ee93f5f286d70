import { z } from 'zod';
import { instrumentKinds } from './stored-states';

const day = (what: string) => z.iso.date({ error: `Enter the ${what} as year-month-day.` });

export const instrumentCodeSchema = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{1,15}$/, { error: 'Use 2 to 16 capitals, digits and hyphens, such as DM-005.' });

/** A supply, multimeter or fixture controller as it stands on a sticker. */
export const instrumentSchema = z.object({
  code: instrumentCodeSchema,
  kind: z.enum(instrumentKinds, { error: 'Choose what it is.' }),
  /** Empty: in the store. */
  stationId: z.union([z.literal(''), z.uuid()]),
  /** Empty: any answer is taken. */
  expectedIdentity: z.string().trim().max(200, { error: 'Use at most 200 characters.' }),
});
export type InstrumentForm = z.infer<typeof instrumentSchema>;

export const changeInstrumentSchema = instrumentSchema
  .pick({ stationId: true, expectedIdentity: true })
  .extend({ instrumentId: z.uuid(), retired: z.boolean() });
export type ChangeInstrumentForm = z.infer<typeof changeInstrumentSchema>;

/** One certificate. The due day is the last on which the instrument may be used. */
export const calibrationSchema = z
  .object({
    instrumentId: z.uuid({ error: 'Choose an instrument.' }),
    calibratedOn: day('day of the calibration'),
    dueOn: day('due day'),
    certificateNumber: z
      .string()
      .trim()
      .min(1, { error: 'Enter the number of the certificate.' })
      .max(60, { error: 'Use at most 60 characters.' }),
  })
  .refine(({ calibratedOn, dueOn }) => dueOn > calibratedOn, {
    error: 'The due day must be after the calibration.',
    path: ['dueOn'],
  });
export type CalibrationForm = z.infer<typeof calibrationSchema>;
