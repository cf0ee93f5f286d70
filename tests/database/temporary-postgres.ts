import { inject } from 'vitest';
import { closeSharedDatabases, openDatabase, type OpenDatabase } from '@/db/client';

export interface TemporaryDatabase extends OpenDatabase {
  url: string;
  close(): Promise<void>;
}

/** A fresh, migrated, empty database of this test file's own, which operations use too. Close it in `afterAll`. */
export async function temporaryDatabase(): Promise<TemporaryDatabase> {
  const response = await fetch(inject('databaseMaker'));
  const url = await response.text();
  if (!response.ok) throw new Error(url);
  process.env.DATABASE_URL = url;
  process.env.NEXTAUTH_SECRET = 'a secret for tests only, 32 characters or more';
  const open = openDatabase(url);
  return {
    ...open,
    url,
    async close() {
      await closeSharedDatabases();
      await open.pool.end();
    },
  };
}
