import { z } from 'zod';
import { dispositionKinds } from './stored-states';

const words = z.string().trim().max(300, { error: 'Use at most 300 characters.' });
const reason = words.min(1, { error: 'Enter the reason.' });
/** Signing asks for the password again. */
const password = z.string().min(1, { error: 'Enter your password.' }).max(200);

/** Boards that one signature is given for at most. */
export const mostBoardsAtOnce = 200;

/** A board and the run that the decision answers, as its signer saw it. */
const decidedBoard = z.object({ unitId: z.uuid(), runId: z.uuid() });
export type DecidedBoard = z.infer<typeof decidedBoard>;

export const dispositionSchema = z
  .object({
    boards: z
      .array(decidedBoard)
      .min(1, { error: 'Choose a board.' })
      .max(mostBoardsAtOnce, { error: `Choose at most ${mostBoardsAtOnce} boards at once.` }),
    kind: z.enum(dispositionKinds, { error: 'Choose what is to be done.' }),
    /** What was done to the boards. */
    action: words,
    /** A code that quality keeps; null: the reason stands in words alone. */
    reasonCodeId: z
      .literal('')
      .transform(() => null)
      .or(z.uuid().nullable()),
    reason: words,
    password,
  })
  .refine(({ kind, action }) => kind !== 'rework' || action.length > 0, {
    error: 'Enter what was done to the board.',
    path: ['action'],
  })
  .refine(({ reasonCodeId, reason: given }) => reasonCodeId !== null || given.length > 0, {
    error: 'Enter the reason.',
    path: ['reason'],
  });
export type DispositionForm = z.infer<typeof dispositionSchema>;

/** The second signature under a concession; `digest` is that of the first, as it was read. */
export const secondSignatureSchema = z.object({
  dispositionId: z.uuid(),
  digest: z.string().regex(/^[0-9a-f]{64}$/),
  password,
});
export type SecondSignatureForm = z.infer<typeof secondSignatureSchema>;

export const retestOrderSchema = z.object({ unitId: z.uuid(), reason, password });
export type RetestOrderForm = z.infer<typeof retestOrderSchema>;

export const printAgainSchema = z.object({ unitId: z.uuid() });
