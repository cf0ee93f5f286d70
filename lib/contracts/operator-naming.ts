import { z } from 'zod';

/** Key of the site's setting that says whether figures name operators. */
export const operatorNamingKey = 'operator-naming';

/** `shown` false, or no such setting: operators are letters in order of appearance; true: their operator numbers. */
export const operatorNamingSchema = z.object({ shown: z.boolean() });
