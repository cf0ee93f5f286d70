import { inject } from 'vitest';
import { openDatabase, type OpenDatabase } from '@/db/client';

export interface TemporaryDatabase extends OpenDatabase {
  url: string;
  close(): Promise<void>;
}

/** A fresh, migrated, empty database of this test file's own. Close it in `afterAll`. */
export async function temporaryDatabase(): Promise<TemporaryDatabase> {
  const response = await fetch(inject('databaseMaker'));
  const url = await response.text();
  if (!response.ok) throw new Error(url);
  const open = openDatabase(url);
  return { ...open, url, close: () => open.pool.end() };
}
