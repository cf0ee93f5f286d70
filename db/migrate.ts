import path from 'node:path';
import { migrate as applyMigrations } from 'drizzle-orm/node-postgres/migrator';
import { grantApplication } from './grants';
import { openDatabase } from './client';

/** Any number known to nobody else; two servers starting at once migrate one after the other. */
const migrationLock = 5_710_412;

/**
 * Brings the database to the newest schema. `ownerUrl` signs in as the owner of the tables; when `applicationUrl`
 * signs in as someone else, that role is granted what the program needs and no more.
 */
export async function migrate(ownerUrl: string, applicationUrl = ownerUrl): Promise<void> {
  const { db, pool } = openDatabase(ownerUrl, 2);
  const guard = await pool.connect();
  try {
    await guard.query('select pg_advisory_lock($1)', [migrationLock]);
    await applyMigrations(db, { migrationsFolder: path.resolve(process.cwd(), 'db/migrations') });
    const owner = new URL(ownerUrl).username;
    const application = new URL(applicationUrl).username;
    if (application && application !== owner) await grantApplication(guard, decodeURIComponent(application));
  } finally {
    guard.release(true);
    await pool.end();
  }
}
