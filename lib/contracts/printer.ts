import { z } from 'zod';

export const printerSchema = z.object({
  /** Null: a new printer. */
  printerId: z.uuid().nullable(),
  name: z.string().trim().min(2, { error: 'Write the name.' }).max(60),
  uri: z
    .string()
    .trim()
    .regex(/^ipps?:\/\/[^\s/]+\/\S*$/, {
      error: 'Write an IPP address, such as ipp://printer-1.plant.example/ipp/print.',
    }),
});
export type PrinterForm = z.input<typeof printerSchema>;

export const printerIdSchema = z.object({ printerId: z.uuid() });
