// Runs a program of ours against the database: DATABASE_URL where it is given, else the local cluster, started if it is not running.
import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { localCluster } from './local-cluster.mjs';
import { giveUp } from './progress.mjs';

process.chdir(fileURLToPath(new URL('../..', import.meta.url)));
const [program, ...args] = process.argv.slice(2);

async function main() {
  const cluster = process.env.DATABASE_URL ? null : await localCluster();
  if (cluster) process.env.DATABASE_URL = cluster.url;
  const child = spawn(process.execPath, ['--import', 'tsx', program, ...args], { stdio: 'inherit' });
  const code = await new Promise((done) => child.on('exit', (status) => done(status ?? 1)));
  if (cluster?.startedHere) await cluster.stop().catch(() => undefined);
  process.exit(code);
}

main().catch((error) => giveUp(error.message));
