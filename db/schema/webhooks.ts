import { relations } from 'drizzle-orm';
import { pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { webhookDeliveries } from './webhook-deliveries';

/** An address of another system that is told of every finished board. */
export const webhooks = pgTable('webhooks', {
  id: id(),
  name: text().notNull(),
  /** https only. */
  url: text().notNull(),
  /** Signing secret, encrypted with the server's key (AES-256-GCM: nonce, tag, text in base64url). */
  sealedSecret: text().notNull(),
  createdBy: uuid()
    .notNull()
    .references(() => accounts.id),
  createdAt: momentNow(),
  /** Null: told of nothing new. */
  pausedAt: moment(),
  /** Null: in use. */
  removedAt: moment(),
});

export const webhookRelations = relations(webhooks, ({ many }) => ({ deliveries: many(webhookDeliveries) }));
