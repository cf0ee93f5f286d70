import type { Actor } from '@/lib/access/actor';
import type { FileFacts, FileUpload } from '@/lib/contracts/file-upload';
import type { Outcome } from '@/lib/contracts/outcome';
import { mostFileBytes } from '@/lib/files/file-rules';
import { readLimited } from '@/server/files/storage/read-limited';
import { storeFile } from './store-file';

/** Stores what a browser sends; reading stops at the limit. Codes: as of `storeFile`. */
export async function receiveFile(
  actor: Actor,
  { kind, name }: FileUpload,
  body: ReadableStream<Uint8Array> | null,
): Promise<Outcome<FileFacts>> {
  return storeFile(actor, kind, { name, bytes: await readLimited(body, mostFileBytes) });
}
