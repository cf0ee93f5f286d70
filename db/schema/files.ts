import { relations } from 'drizzle-orm';
import { integer, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { fileKinds } from '@/lib/contracts/stored-states';
import { accounts } from './accounts';
import { id, momentNow } from './columns';

export const fileKindEnum = pgEnum('file_kind', fileKinds);

/** A file in object storage, as it was stored: checked by content and re-encoded. Never changed; a new one takes its place. */
export const files = pgTable('files', {
  id: id(),
  kind: fileKindEnum().notNull(),
  /** Key in the bucket. */
  storageKey: text().notNull().unique(),
  mediaType: text().notNull(),
  bytes: integer().notNull(),
  sha256: text().notNull(),
  /** Pixels. Null: not a picture. */
  width: integer(),
  height: integer(),
  /** As the person named it. */
  originalName: text().notNull(),
  uploadedBy: uuid()
    .notNull()
    .references(() => accounts.id),
  uploadedAt: momentNow(),
});

export const fileRelations = relations(files, ({ one }) => ({
  uploader: one(accounts, { fields: [files.uploadedBy], references: [accounts.id] }),
}));
