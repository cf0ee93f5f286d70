import { GetObjectCommand, PutObjectCommand, S3Client } from '@aws-sdk/client-s3';
import { environment, type Environment } from '@/server/environment';

export interface ObjectStore {
  put(key: string, bytes: Uint8Array, mediaType: string): Promise<void>;
  /** Null: nothing is stored under this key. */
  get(key: string): Promise<ReadableStream | null>;
}

type Settings = NonNullable<Environment['storage']>;

/** Files in one bucket of S3 or of anything that speaks it. */
export function openObjectStore({ endpoint, region, bucket, accessKeyId, secretAccessKey }: Settings): ObjectStore {
  // Which Node.js runs here is decided by package.json, not by a line at every start.
  process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED ??= 'true';
  const client = new S3Client({
    region,
    endpoint,
    // A bucket in the path needs no name of its own in DNS.
    forcePathStyle: endpoint !== undefined,
    credentials: { accessKeyId, secretAccessKey },
    // Stores that are not Amazon's do not all know the newer checksums.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 2,
    requestHandler: { connectionTimeout: 3_000, requestTimeout: 20_000 },
  });
  return {
    async put(key, bytes, mediaType) {
      await client.send(
        new PutObjectCommand({
          Bucket: bucket,
          Key: key,
          Body: bytes,
          ContentType: mediaType,
          ContentLength: bytes.length,
        }),
      );
    },
    async get(key) {
      try {
        const { Body } = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key }));
        return Body?.transformToWebStream() ?? null;
      } catch (error) {
        if ((error as { name?: string }).name === 'NoSuchKey') return null;
        throw error;
      }
    },
  };
}

let opened: ObjectStore | undefined;

/** The store of this process, or null where none is set up. */
export function objectStore(): ObjectStore | null {
  const { storage } = environment();
  return storage && (opened ??= openObjectStore(storage));
}
