import { z } from 'zod';
import { roles } from '../access/roles';

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .pipe(z.email({ error: 'Write a whole e-mail address, such as a.boyle@plant.example.' }));

export const signInSchema = z.object({
  email: emailSchema,
  password: z.string().min(1, { error: 'Write your password.' }).max(200),
});
export type SignInForm = z.infer<typeof signInSchema>;

/** Long rather than complicated. */
export const passwordSchema = z
  .string()
  .min(12, { error: 'Use at least 12 characters. A few words in a row do well.' })
  .max(200, { error: 'Use at most 200 characters.' })
  .refine((password) => new Set(password).size > 4, { error: 'Use more than a few different characters.' });

const runsOfDigits = '01234567890 09876543210';
export const pinSchema = z
  .string()
  .regex(/^\d{4,8}$/, { error: 'Use 4 to 8 digits.' })
  .refine((pin) => new Set(pin).size > 1 && !runsOfDigits.includes(pin), {
    error: 'Use digits that are not all the same or in a row.',
  });

export const choosePasswordSchema = z
  .object({ token: z.string().min(20).max(100), password: passwordSchema, again: z.string() })
  .refine((form) => form.password === form.again, { error: 'The two are not the same.', path: ['again'] });
export type ChoosePasswordForm = z.input<typeof choosePasswordSchema>;

const nameSchema = z.string().trim().min(2, { error: 'Write the name.' }).max(80);

export const firstAdministratorSchema = z
  .object({
    token: z.string().min(20).max(100),
    name: nameSchema,
    email: emailSchema,
    password: passwordSchema,
    again: z.string(),
  })
  .refine((form) => form.password === form.again, { error: 'The two are not the same.', path: ['again'] });
export type FirstAdministratorForm = z.input<typeof firstAdministratorSchema>;

/** Empty stands for none. */
const optional = (schema: z.ZodString) =>
  z.union([z.literal('').transform(() => null), schema.trim().toUpperCase()]).nullable();

const personFields = {
  name: nameSchema,
  /** Empty: cannot sign in at a desk. */
  email: z.union([z.literal('').transform(() => null), emailSchema]).nullable(),
  operatorNumber: optional(z.string().regex(/^[A-Za-z0-9]{1,12}$/, { error: 'Use up to 12 letters and digits.' })),
  /** What stands on the badge after our prefix. */
  badgeNumber: optional(z.string().regex(/^[A-Za-z0-9-]{2,20}$/, { error: 'Use 2 to 20 letters, digits and dashes.' })),
  roles: z.array(z.enum(roles)).min(1, { error: 'Choose at least one role.' }),
  locale: z.string().min(2).max(8),
};

export const addPersonSchema = z.object(personFields);
export type AddPersonForm = z.input<typeof addPersonSchema>;
export type AddPerson = z.infer<typeof addPersonSchema>;

const reason = z.string().trim().min(3, { error: 'Say why, in a few words.' }).max(300);

/** A change of roles asks for its reason; other changes may give one. */
export const changePersonSchema = z.object({
  ...personFields,
  accountId: z.uuid(),
  reason: z.string().trim().max(300),
});
export type ChangePersonForm = z.input<typeof changePersonSchema>;
export type ChangePerson = z.infer<typeof changePersonSchema>;

export const setPinSchema = z
  .object({ accountId: z.uuid(), pin: pinSchema, again: z.string() })
  .refine((form) => form.pin === form.again, { error: 'The two are not the same.', path: ['again'] });
export type SetPinForm = z.input<typeof setPinSchema>;

export const withReasonSchema = z.object({ accountId: z.uuid(), reason });
export type WithReasonForm = z.input<typeof withReasonSchema>;

export const accountIdSchema = z.object({ accountId: z.uuid() });
