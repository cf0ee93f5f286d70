import { createHash, randomUUID } from 'node:crypto';
import { insertFile } from '@/db/queries/files';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { FileFacts } from '@/lib/contracts/file-upload';
import { refusal, success, type Outcome, type Refusal } from '@/lib/contracts/outcome';
import type { FileKind } from '@/lib/contracts/stored-states';
import { fileRules, mostFileBytes } from '@/lib/files/file-rules';
import { recogniseType } from '@/lib/files/recognise-type';
import { encodePicture } from '@/server/files/storage/encode-picture';
import { objectStore } from '@/server/files/storage/object-store';
import { database } from '@/server/postgres';

interface GivenFile {
  name: string;
  bytes: Uint8Array;
}

/**
 * Stores a file of `kind`. Its type is told by its content, never by its name. `bytes` null: more than may be sent. Codes:
 * file-too-large, file-empty, file-type, file-broken, picture-too-large, storage-missing, storage-silent.
 */
export async function storeFile(
  actor: Actor,
  kind: FileKind,
  { name, bytes }: { name: string; bytes: Uint8Array | null },
): Promise<Outcome<FileFacts>> {
  const use = `Use ${fileRules[kind].words}.`;
  if (bytes === null || bytes.length > mostFileBytes) return refusal('file-too-large', `${name} is too large. ${use}`);
  if (bytes.length === 0) return refusal('file-empty', `${name} is empty. ${use}`);
  const prepared = await prepare(kind, { name, bytes });
  if ('ok' in prepared) return prepared;
  const store = objectStore();
  if (!store)
    return refusal('storage-missing', 'No file storage is set up here. Ask whoever runs the server to give S3_BUCKET.');
  const values = {
    kind,
    storageKey: `${kind}/${randomUUID()}`,
    sha256: createHash('sha256').update(prepared.bytes).digest('hex'),
    mediaType: prepared.mediaType,
    width: prepared.width,
    height: prepared.height,
    originalName: name,
    bytes: prepared.bytes.length,
  };
  try {
    await store.put(values.storageKey, prepared.bytes, values.mediaType);
  } catch {
    return refusal('storage-silent', `The file storage did not take ${name}. Try again in a moment.`);
  }
  return database().transaction(async (tx) => {
    const { id } = await insertFile(tx, { ...values, uploadedBy: actor.accountId });
    const { mediaType, width, height } = values;
    await insertTrail(tx, actor, { action: 'file.stored', entity: 'file', entityId: id, after: { ...values } });
    return success({ id, name, mediaType, bytes: values.bytes, width, height });
  });
}

interface Prepared {
  bytes: Uint8Array;
  mediaType: string;
  width: number | null;
  height: number | null;
}

async function prepare(kind: FileKind, { name, bytes }: GivenFile): Promise<Prepared | Refusal> {
  const { types, words } = fileRules[kind];
  const type = recogniseType(bytes);
  if (type === null || !types.includes(type))
    return refusal(
      'file-type',
      `${name} ${type ? `is ${type === 'SVG' ? 'an' : 'a'} ${type}` : 'is none of the kinds that fit here'}. Use ${words}.`,
    );
  if (type === 'PDF') {
    // A PDF that ends early is the usual broken copy: its last lines say %%EOF.
    const whole = Buffer.from(bytes.subarray(-1_024)).includes('%%EOF');
    return whole
      ? { bytes, mediaType: 'application/pdf', width: null, height: null }
      : refusal('file-broken', `${name} ends too early. Save or copy it again.`);
  }
  const picture = await encodePicture(bytes);
  if (picture === 'too-many-pixels')
    return refusal('picture-too-large', `${name} has too many pixels. Save it with at most 50 megapixels.`);
  return picture ?? refusal('file-broken', `${name} cannot be read as a ${type}. Save it again. Use ${words}.`);
}
