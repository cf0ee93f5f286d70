import { z } from 'zod';
import { mostBoards } from './lot-serials';

const line = (what: string, most: number) =>
  z
    .string()
    .trim()
    .min(1, { error: `Enter ${what}.` })
    .max(most, { error: `Use at most ${most} characters.` });

/** As it stands in the barcode of the lot sheet, which scanners read in capitals. */
export const lotCodeSchema = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{1,19}$/, { error: 'Use 2 to 20 capitals, digits and hyphens, such as 2648-B.' });

/** Which boards are in the lot: counted up from the first serial, or listed in a file. */
export const lotSerialsSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('counted'),
    firstSerial: line('the first serial number', 40),
    quantity: z.coerce
      .number({ error: 'Enter how many boards.' })
      .int({ error: 'Enter a whole number of boards.' })
      .min(1, { error: 'A lot has at least one board.' })
      .max(mostBoards, { error: `A lot takes at most ${mostBoards} boards.` }),
  }),
  z.object({
    kind: z.literal('listed'),
    /** The file as it was chosen. */
    text: z
      .string()
      .min(1, { error: 'Choose a file with the serial numbers.' })
      .max(500_000, { error: 'The file is larger than 500 kB. Choose one with serial numbers only.' }),
    /** Store the good rows although others are bad. */
    leaveOutBad: z.boolean().default(false),
  }),
]);
export type LotSerials = z.infer<typeof lotSerialsSchema>;

export const checkLotSerialsSchema = z.object({
  sequenceRevisionId: z.uuid({ error: 'Choose a board type and sequence.' }),
  serials: lotSerialsSchema,
});

export const createLotSchema = checkLotSerialsSchema.extend({ code: lotCodeSchema });
export type CreateLot = z.infer<typeof createLotSchema>;

export const lotChanges = ['open', 'pause', 'close'] as const;
export const changeLotSchema = z.object({ lotId: z.uuid(), change: z.enum(lotChanges) });
export type LotChange = (typeof lotChanges)[number];

export const lotReasonSchema = z.object({ lotId: z.uuid(), reason: line('the reason', 300) });
/** A release is signed with the password. */
export const lotReleaseSchema = lotReasonSchema.extend({
  password: z.string().min(1, { error: 'Enter your password.' }).max(200),
});

export const componentBatchSchema = z.object({
  lotId: z.uuid(),
  component: line('the component, such as D1 reference', 40),
  batch: line('the batch number', 40),
});
export type ComponentBatchForm = z.infer<typeof componentBatchSchema>;
