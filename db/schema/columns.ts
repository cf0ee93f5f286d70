import { timestamp, uuid } from 'drizzle-orm/pg-core';

/** A random id; nothing can be read from it. */
export const id = () => uuid().primaryKey().defaultRandom();

/** A moment in UTC. Named for what happened then; null means it has not happened. */
export const moment = () => timestamp({ withTimezone: true, mode: 'date' });

/** The moment the row was written, by the database's own clock. */
export const momentNow = () => moment().notNull().defaultNow();
