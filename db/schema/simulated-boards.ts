import { integer, pgTable, text } from 'drizzle-orm/pg-core';
import { defectKinds } from '@/lib/contracts/bench-command';

/** What the simulated hands put on the fixture for a serial. A serial without a row is a sound board seeded by its serial. */
export const simulatedBoards = pgTable('simulated_boards', {
  serial: text().primaryKey(),
  /** Fixes the board's part values. */
  seed: integer().notNull(),
  defect: text({ enum: defectKinds }).notNull().default('none'),
});
