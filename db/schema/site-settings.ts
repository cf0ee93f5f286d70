import { jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { momentNow } from './columns';

/** What the administrator sets for the whole site, one row a setting, checked by its schema in lib/contracts/site-settings.ts. */
export const siteSettings = pgTable('site_settings', {
  key: text().primaryKey(),
  value: jsonb().notNull(),
  /** Null: by the program at its first start. */
  changedBy: uuid().references(() => accounts.id),
  changedAt: momentNow(),
});
