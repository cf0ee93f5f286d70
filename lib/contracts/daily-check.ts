import { z } from 'zod';

const number = (what: string) => z.coerce.number({ error: `Enter ${what} as a number.` });
const volts = (what: string) =>
  number(what)
    .positive({ error: `Enter ${what}, above zero.` })
    .max(100, { error: 'Enter volts, at most 100.' });

/** A board of known points. Its tolerance is the limit of the daily check. */
export const referenceBoardSchema = z
  .object({
    code: z
      .string()
      .trim()
      .toUpperCase()
      .regex(/^[A-Z0-9][A-Z0-9-]{1,23}$/, { error: 'Use 2 to 24 capitals, digits and hyphens, such as RB-02.' }),
    boardTypeId: z.uuid({ error: 'Choose a board type.' }),
    tripVolts: volts('the trip point'),
    releaseVolts: volts('the release point'),
    toleranceVolts: number('the tolerance')
      .min(0.001, { error: 'Use at least 0.001 V.' })
      .max(1, { error: 'Use at most 1 V.' }),
  })
  .refine(({ tripVolts, releaseVolts }) => releaseVolts > tripVolts, {
    error: 'The release point must be above the trip point.',
    path: ['releaseVolts'],
  });
export type ReferenceBoardForm = z.infer<typeof referenceBoardSchema>;

export const changeReferenceBoardSchema = z.object({
  referenceBoardId: z.uuid(),
  tripVolts: volts('the trip point'),
  releaseVolts: volts('the release point'),
  toleranceVolts: number('the tolerance')
    .min(0.001, { error: 'Use at least 0.001 V.' })
    .max(1, { error: 'Use at most 1 V.' }),
  retired: z.boolean(),
});
export type ChangeReferenceBoardForm = z.infer<typeof changeReferenceBoardSchema>;

/** A check made by hand with instruments outside the station; the bench records its own. */
export const dailyCheckSchema = z.object({
  stationId: z.uuid({ error: 'Choose a station.' }),
  referenceBoardId: z.uuid({ error: 'Choose a reference board.' }),
  tripVolts: volts('the trip point that was measured'),
  releaseVolts: volts('the release point that was measured'),
  validHours: number('the hours')
    .min(1, { error: 'Use at least one hour.' })
    .max(72, { error: 'Use at most 72 hours.' }),
});
export type DailyCheckForm = z.infer<typeof dailyCheckSchema>;
