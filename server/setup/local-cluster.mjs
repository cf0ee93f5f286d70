import { createHash } from 'node:crypto';
import { resolve } from 'node:path';
import { postgresCanUse, startCluster } from './postgres-cluster.mjs';

/** The cluster of this checkout, started if it is not running. PostgreSQL may be unable to reach the checkout: then it is kept elsewhere. */
export function localCluster() {
  const root = process.cwd() + '/';
  const local = resolve('.sillwright/postgres');
  const folder = postgresCanUse(local)
    ? local
    : `/var/lib/sillwright/${createHash('sha256').update(root).digest('hex').slice(0, 12)}`;
  return startCluster(folder);
}
