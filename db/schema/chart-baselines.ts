import { sql } from 'drizzle-orm';
import { check, doublePrecision, index, integer, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { ChartQuantity } from '@/lib/contracts/lot-review';
import { accounts } from './accounts';
import { boardTypes } from './board-types';
import { id, momentNow } from './columns';
import { lots } from './lots';

/**
 * Centre and spread that a lot's charts are drawn from, frozen: limits computed from a drifting lot would hide the drift. Of the
 * lot's own first boards, or of earlier stable lots and chosen for a board type. Only ever added to; the newest counts.
 */
export const chartBaselines = pgTable(
  'chart_baselines',
  {
    id: id(),
    quantity: text().$type<ChartQuantity>().notNull(),
    /** Null: for every lot of the board type from then on. */
    lotId: uuid().references(() => lots.id),
    boardTypeId: uuid()
      .notNull()
      .references(() => boardTypes.id),
    /** In the unit of the quantity. */
    centre: doublePrecision().notNull(),
    /** From the mean moving range, d2 = 1.128. */
    sigma: doublePrecision().notNull(),
    boards: integer().notNull(),
    /** The lots it was estimated from. Empty: the first boards of the lot itself. */
    fromLotIds: uuid().array().notNull().default([]),
    frozenAt: momentNow(),
    /** Null: frozen by itself with the thirtieth board. */
    frozenBy: uuid().references(() => accounts.id),
  },
  (t) => [
    index().on(t.boardTypeId, t.quantity, t.frozenAt),
    uniqueIndex('chart_baselines_one_of_itself')
      .on(t.lotId, t.quantity)
      .where(sql`${t.frozenBy} is null`),
    check('chart_baselines_spread', sql`${t.sigma} > 0 and ${t.boards} > 1`),
  ],
);
