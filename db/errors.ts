/** SQLSTATE values that a caller may expect. SW001 and SW002 are raised by our own triggers. */
export const sqlStates = {
  uniqueViolation: '23505',
  foreignKeyViolation: '23503',
  checkViolation: '23514',
  closedRun: 'SW001',
  protectedRecord: 'SW002',
} as const;

interface PostgresError {
  code: string;
  constraint?: string;
}

/** The PostgreSQL error below a query's error, or null when there is none. Told by `code`, not by class. */
export function postgresErrorOf(error: unknown): PostgresError | null {
  for (let e = error, depth = 0; e instanceof Error && depth < 5; e = e.cause, depth++) {
    const { code, constraint } = e as Error & Partial<PostgresError>;
    if (typeof code === 'string' && /^[0-9A-Z]{5}$/.test(code)) return { code, constraint };
  }
  return null;
}

/** Whether the query failed because a row with this unique value exists; `constraint` narrows it to one rule. */
export function isUniqueViolation(error: unknown, constraint?: string): boolean {
  const found = postgresErrorOf(error);
  return found?.code === sqlStates.uniqueViolation && (constraint === undefined || found.constraint === constraint);
}
