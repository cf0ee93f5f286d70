import { mkdirSync } from 'node:fs';
import S3rver from 's3rver';

export interface FakeStorage {
  /** As server/environment.ts reads them. */
  variables: Record<'S3_ENDPOINT' | 'S3_BUCKET' | 'S3_ACCESS_KEY_ID' | 'S3_SECRET_ACCESS_KEY', string>;
  close(): Promise<void>;
}

const bucket = 'sillwright';

/** Object storage on a free port of this computer, its files below `folder`. For the demo and for tests. */
export async function startFakeStorage(folder: string): Promise<FakeStorage> {
  mkdirSync(folder, { recursive: true });
  const server = new S3rver({
    address: '127.0.0.1',
    port: 0,
    silent: true,
    directory: folder,
    configureBuckets: [{ name: bucket }],
  });
  const { port } = await server.run();
  return {
    variables: {
      S3_ENDPOINT: `http://127.0.0.1:${port}`,
      S3_BUCKET: bucket,
      // The two words that the fake knows.
      S3_ACCESS_KEY_ID: 'S3RVER',
      S3_SECRET_ACCESS_KEY: 'S3RVER',
    },
    close: async () => {
      const closed = server.close();
      server.httpServer.closeAllConnections();
      await closed;
    },
  };
}
