import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import { Pool } from 'pg';
import { tables } from './tables';

export type Database = NodePgDatabase<typeof tables>;
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

export interface OpenDatabase {
  db: Database;
  pool: Pool;
}

/** A pool of connections to `url`. A connection that breaks while idle is dropped and replaced, not thrown. */
export function openDatabase(url: string, most = 10): OpenDatabase {
  const pool = new Pool({ connectionString: url, max: most, connectionTimeoutMillis: 3_000, keepAlive: true });
  pool.on('error', () => {});
  return { db: drizzle(pool, { schema: tables, casing: 'snake_case' }), pool };
}

/** The server and Next each load their own copy of this module; only `globalThis` is shared between them. */
const shared = globalThis as typeof globalThis & { sillwrightDatabases?: Map<string, OpenDatabase> };

/** The one pool of this process for `url`. */
export function sharedDatabase(url: string): OpenDatabase {
  const open = (shared.sillwrightDatabases ??= new Map<string, OpenDatabase>());
  let found = open.get(url);
  if (!found) {
    found = openDatabase(url);
    open.set(url, found);
  }
  return found;
}

/** Ends every shared pool; for shutdown. */
export async function closeSharedDatabases(): Promise<void> {
  const open = [...(shared.sillwrightDatabases?.values() ?? [])];
  shared.sillwrightDatabases = undefined;
  await Promise.all(open.map(({ pool }) => pool.end()));
}
