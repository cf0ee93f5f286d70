import { findFile, type StoredFile } from '@/db/queries/files';
import { objectStore } from '@/server/files/storage/object-store';
import { database } from '@/server/postgres';

/** A stored file and its bytes as they come, or null when there is none. Throws when the storage does not answer. */
export async function readFile(id: string): Promise<{ file: StoredFile; body: ReadableStream } | null> {
  const file = await findFile(database(), id);
  const body = file && (await objectStore()?.get(file.storageKey));
  return file && body ? { file, body } : null;
}
