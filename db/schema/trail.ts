import { bigint, index, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { momentNow } from './columns';
import { stations } from './stations';

/** Who changed what, when and why. Only ever appended: a trigger refuses everything else. */
export const trail = pgTable(
  'trail',
  {
    id: bigint({ mode: 'number' }).primaryKey().generatedAlwaysAsIdentity(),
    at: momentNow(),
    /** Null: the program itself, such as recovery at start. */
    accountId: uuid().references(() => accounts.id),
    /** Null: at a desk. */
    stationId: uuid().references(() => stations.id),
    /** What was done, such as account.disabled. */
    action: text().notNull(),
    /** Kind of thing it was done to, such as account. */
    entity: text().notNull(),
    entityId: text().notNull(),
    /** Changed fields before and after. Null: nothing was there before, or is after. Never a secret or its hash. */
    before: jsonb().$type<Record<string, unknown>>(),
    after: jsonb().$type<Record<string, unknown>>(),
    /** Null: the action asks for none. */
    reason: text(),
    /** desk, or the code of the station it happened at: each chain is sealed by itself. Given by a trigger, as the next three. */
    chain: text(),
    /** Place in its chain, from 1. */
    place: bigint({ mode: 'number' }),
    /** Hexadecimal SHA-256 over the seal before and this entry. */
    seal: text(),
  },
  (t) => [
    unique().on(t.chain, t.place),
    index().on(t.entity, t.entityId, t.at),
    index().on(t.at),
    index().on(t.accountId),
  ],
);
