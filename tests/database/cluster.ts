import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { postgresCanUse, startCluster as startClusterIn } from '@/server/setup/postgres-cluster.mjs';

export interface Cluster {
  /** Address of a database of this cluster, signed in as its owner. */
  urlOf(database: string): string;
  stop(): Promise<void>;
}

/** A private PostgreSQL of the start command's kind, in a folder of its own; nothing of it is left after `stop`. */
export async function startCluster(): Promise<Cluster> {
  const parent = [tmpdir(), '/var/tmp'].find(postgresCanUse);
  if (!parent) throw new Error('Neither the temporary folder nor /var/tmp can be reached by the user postgres.');
  const folder = mkdtempSync(path.join(parent, 'sillwright-test-'));
  const cluster = await startClusterIn(folder, { fast: true });
  return {
    urlOf(database) {
      const url = new URL(cluster.url);
      url.pathname = `/${database}`;
      return url.toString();
    },
    async stop() {
      await cluster.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
