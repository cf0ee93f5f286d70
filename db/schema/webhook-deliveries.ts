import { relations } from 'drizzle-orm';
import { index, integer, jsonb, pgEnum, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { deliveryStates } from '@/lib/contracts/stored-states';
import { id, moment, momentNow } from './columns';
import { runs } from './runs';
import { webhooks } from './webhooks';

export const deliveryStateEnum = pgEnum('delivery_state', deliveryStates);

/** One message about one finished run to one webhook. Its job is made in the transaction that closed the run. */
export const webhookDeliveries = pgTable(
  'webhook_deliveries',
  {
    id: id(),
    webhookId: uuid()
      .notNull()
      .references(() => webhooks.id),
    runId: uuid()
      .notNull()
      .references(() => runs.id),
    /** What is sent, as it was when the run closed. */
    payload: jsonb().$type<Record<string, unknown>>().notNull(),
    state: deliveryStateEnum().notNull().default('waiting'),
    tries: integer().notNull().default(0),
    /** HTTP status of the last try. Null: no answer. */
    status: integer(),
    /** What went wrong last. Null: nothing. */
    problem: text(),
    createdAt: momentNow(),
    lastTryAt: moment(),
    nextTryAt: moment(),
    deliveredAt: moment(),
  },
  (t) => [unique().on(t.webhookId, t.runId), index().on(t.webhookId, t.createdAt)],
);

export const webhookDeliveryRelations = relations(webhookDeliveries, ({ one }) => ({
  webhook: one(webhooks, { fields: [webhookDeliveries.webhookId], references: [webhooks.id] }),
}));
